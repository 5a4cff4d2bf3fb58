import { createTransport, type SendMailOptions } from 'nodemailer'
import type { messages } from '~/db/schema/mail'
import { toThreadId } from './thread'

type Queued = typeof messages.$inferSelect

/** How a try to hand a mail over ended: `permanent` when the other side will never take it, `away` when nobody answered. */
export type Sent = { ok: true } | { ok: false; permanent: boolean; away: boolean; error: string }

export interface Sender {
  send(message: Queued): Promise<Sent>
  close(): void
}

const patience = 60_000

/** Hands mails to the server at `smtpUrl`; pictures come from `readPicture`, and one that is gone is left out. */
export function createSender({
  smtpUrl,
  mailFrom,
  readPicture,
}: {
  smtpUrl: string
  mailFrom: string
  readPicture: (storageKey: string) => Promise<Buffer>
}): Sender {
  const transport = createTransport({
    url: smtpUrl,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  })
  return {
    async send(message) {
      try {
        const mail = await toMail(message, mailFrom, readPicture)
        await inTime(transport.sendMail(mail))
        return { ok: true }
      } catch (error) {
        return toFailure(error)
      }
    },
    close: () => transport.close(),
  }
}

async function inTime<T>(sending: Promise<T>): Promise<T> {
  let timer: NodeJS.Timeout | undefined
  const late = new Promise<never>((_, reject) => {
    const error = Object.assign(new Error('The mail server took too long.'), { code: 'ETIMEDOUT' })
    timer = setTimeout(reject, patience, error)
  })
  return await Promise.race([sending, late]).finally(() => clearTimeout(timer))
}

/** What nodemailer is given: fixed Message-ID, the thread, signs that no person wrote it, both parts and pictures. */
export async function toMail(
  message: Queued,
  mailFrom: string,
  readPicture: (storageKey: string) => Promise<Buffer>,
): Promise<SendMailOptions> {
  const thread = message.thread === null ? null : toThreadId(message.thread)
  return {
    from: mailFrom,
    // as an object the address stays one address, whatever stands in it
    to: { name: '', address: oneLine(message.toEmail) },
    messageId: message.messageId,
    ...(thread && { inReplyTo: thread, references: [thread] }),
    subject: oneLine(message.subject),
    text: message.text ?? '',
    html: message.html ?? undefined,
    list: { id: { url: `mail.${toDomain(mailFrom)}`, comment: 'Cragfettle' } },
    headers: { 'Auto-Submitted': 'auto-generated', 'X-Auto-Response-Suppress': 'All' },
    attachments: await toAttachments(message, readPicture),
  }
}

const oneLine = (text: string) => text.replace(/[\r\n]+/g, ' ')

function toDomain(mailFrom: string): string {
  return /@([a-z0-9.-]+)/i.exec(mailFrom)?.[1] ?? 'localhost'
}

async function toAttachments(
  { parts }: Queued,
  readPicture: (storageKey: string) => Promise<Buffer>,
): Promise<SendMailOptions['attachments']> {
  const read = parts.map(async ({ storageKey, contentId, name }) => {
    const content = await readPicture(storageKey).catch(() => null)
    return content && { cid: contentId, filename: name, content, contentDisposition: 'inline' as const }
  })
  return (await Promise.all(read)).filter(attachment => attachment !== null)
}

const awayCodes = new Set([
  'ECONNECTION',
  'ECONNREFUSED',
  'ECONNRESET',
  'ETIMEDOUT',
  'ESOCKET',
  'EDNS',
  'ETLS',
  'EAUTH',
])

/** A 5xx is final, unless it is about our own sign-in to the server: that is mended in the settings, not in the mail. */
function toFailure(error: unknown): Sent {
  const { code, responseCode } = error as { code?: string; responseCode?: number }
  const away = awayCodes.has(code ?? '')
  const permanent = !away && (responseCode ?? 0) >= 500
  // servers like to repeat the address, which belongs in no log
  return { ok: false, permanent, away, error: String(error).replace(/\S+@\S+/g, '…') }
}
