import { randomUUID } from 'node:crypto'
import type { Database } from '~/db/client.server'
import { messages } from '~/db/schema/mail'
import { failLease, finishLease, releaseLease, renewLease, takeLeases } from '~/record/leases.server'
import type { Step } from '~/record/worker.server'
import type { Sender } from './sender.server'

type Queued = typeof messages.$inferSelect

/** Kinds of mail whose text is a secret: it is forgotten once the mail has left. */
const secretKinds = new Set(['sign-in-code'])

/** How long nothing is tried after the server was away, so that one outage does not use up the tries of every mail. */
const restMilliseconds = 15_000

/**
 * The worker's step that empties the outbox. Each mail leaves once under its Message-ID; the lease is renewed before
 * each, so that a slow server never lets another worker send the same. When the server is away the rest goes back
 * untried. `onFailure` hears of each mail that could not leave.
 */
export function mailStep(sender: Sender, onFailure: (failure: { id: string; error: string }) => void): Step {
  let restUntil = 0
  return {
    name: 'mail',
    async run({ db, clock, stopping }) {
      if (clock().getTime() < restUntil) return 0
      const token = randomUUID()
      const taken = await takeLeases(db, messages, { token, now: clock() })
      let away = false
      for (const message of taken) {
        const hold = { token, now: clock() }
        if (away || stopping()) await releaseLease(db, messages, message.id, hold)
        else if (await renewLease(db, messages, message.id, hold))
          away = await deliver(db, sender, message, token, clock, onFailure)
      }
      if (away) restUntil = clock().getTime() + restMilliseconds
      return away ? 0 : taken.length
    },
  }
}

/** Sends one mail and writes down how it went; gives whether the server was away. */
async function deliver(
  db: Database,
  sender: Sender,
  message: Queued,
  token: string,
  clock: () => Date,
  onFailure: (failure: { id: string; error: string }) => void,
): Promise<boolean> {
  const sent = await sender.send(message)
  const hold = { token, now: clock() }
  if (sent.ok) {
    const forgotten = secretKinds.has(message.kind) ? { text: null, html: null } : {}
    await finishLease(db, messages, message.id, hold, { sentAt: hold.now, ...forgotten })
    return false
  }
  onFailure({ id: message.id, error: sent.error })
  await failLease(db, messages, message, hold, sent)
  return sent.away
}
