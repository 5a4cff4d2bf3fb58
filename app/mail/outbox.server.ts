import type { Queryable } from '~/db/client.server'
import { messages } from '~/db/schema/mail'
import type { Act } from '~/record/act'
import type { Message } from './message'

/** Queues a mail in the command's transaction: it leaves if and only if the command is committed, once per key. */
export async function queueMail(tx: Queryable, act: Act, message: Message): Promise<void> {
  const id = act.newId()
  await tx
    .insert(messages)
    .ignore()
    .values({
      id,
      dedupeKey: message.dedupeKey,
      messageId: `<${id}@cragfettle>`,
      kind: message.kind,
      toEmail: message.to,
      personId: message.personId ?? null,
      thread: message.thread ?? null,
      subject: message.subject,
      text: message.text,
      html: message.html,
      parts: message.pictures ?? [],
      state: 'waiting',
      dueAt: act.now,
      createdAt: act.now,
    })
}
