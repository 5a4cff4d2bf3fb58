import { createServer, type RequestListener, type ServerResponse } from 'node:http'
import type { AddressInfo, Server } from 'node:net'
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server'
import { type Letter, toLetter } from './letter'
import { toFramePage, toInboxPage, toLetterPage } from './pages'

export type { Letter } from './letter'

const host = '127.0.0.1'
const kept = 1_000

export interface FakeMail {
  /** where people read the inbox */
  url: string
  smtpUrl: string
  /** what came in, in the order it came */
  seen(): Letter[]
  reset(): void
  /** the next `times` deliveries are refused for now (451), as by a server that is busy */
  failNext(times?: number): void
  close(): Promise<void>
}

/**
 * Starts a mail server on loopback that takes every mail and shows it on an inbox page: SMTP on `smtpPort`, the page
 * and `/messages.json` on `port`; 0 is a free port. It keeps the last 1,000 mails in memory and sends none on.
 */
export async function start({ port = 0, smtpPort = 0 } = {}): Promise<FakeMail> {
  let letters: Letter[] = []
  let lastId = 0
  let failures = 0

  async function takeIn(stream: SMTPServerDataStream, session: SMTPServerSession): Promise<void> {
    const chunks: Buffer[] = []
    for await (const chunk of stream) chunks.push(chunk as Buffer)
    if (failures > 0) {
      failures--
      throw Object.assign(new Error('Busy just now, try again later'), { responseCode: 451 })
    }
    const to = session.envelope.rcptTo.map(({ address }) => address)
    const letter = await toLetter(Buffer.concat(chunks), { id: ++lastId, to, at: new Date() })
    letters = [...letters, letter].slice(-kept)
  }

  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onData(stream, session, done) {
      takeIn(stream, session).then(() => done(), done)
    },
  })
  // a sender that hangs up in the middle is its own affair
  smtp.on('error', () => {})
  const http = createServer(answer(() => letters))

  const listeningSmtp = await listening(() => smtp.listen(smtpPort, host), smtp.server)
  const listeningHttp = await listening(() => http.listen(port, host), http).catch(async error => {
    await new Promise<void>(done => smtp.close(done))
    throw error
  })
  return {
    url: `http://${host}:${listeningHttp}`,
    smtpUrl: `smtp://${host}:${listeningSmtp}`,
    seen: () => [...letters],
    reset() {
      letters = []
      failures = 0
    },
    failNext(times = 1) {
      failures = times
    },
    async close() {
      http.closeAllConnections()
      await new Promise<void>(done => http.close(() => done()))
      await new Promise<void>(done => smtp.close(done))
    },
  }
}

function listening(listen: () => void, server: Server): Promise<number> {
  return new Promise((done, failed) => {
    server.once('error', failed)
    server.once('listening', () => done((server.address() as AddressInfo).port))
    listen()
  })
}

function answer(list: () => Letter[]): RequestListener {
  return (request, response) => {
    const [path] = (request.url ?? '/').split('?')
    if (path === '/') return sendHtml(response, toInboxPage(list()))
    if (path === '/messages.json') return sendJson(response, list())
    const [, id, what, index] = path!.match(/^\/messages\/(\d+)(?:\/(html|parts)(?:\/(\d+))?)?$/) ?? []
    const letter = list().find(each => each.id === Number(id))
    if (letter === undefined) return sendNothing(response)
    if (what === undefined) return sendHtml(response, toLetterPage(letter))
    // no script of a mail may run beside the inbox, opened by itself no more than in its frame
    if (what === 'html') return sendHtml(response, toFramePage(letter), frameRules)
    const part = letter.parts[Number(index)]
    if (part === undefined) return sendNothing(response)
    // a file that is a page must not run beside the inbox
    response
      .writeHead(200, {
        'Content-Type': toMediaType(part.type),
        'Content-Security-Policy': 'sandbox',
        'X-Content-Type-Options': 'nosniff',
      })
      .end(part.bytes)
  }
}

const frameRules = { 'Content-Security-Policy': 'sandbox allow-popups allow-popups-to-escape-sandbox' }

/** What a mail calls its part, when a header can say so. */
const toMediaType = (type: string) => (/^[\w.+-]+\/[\w.+-]+$/.test(type) ? type : 'application/octet-stream')

function sendHtml(response: ServerResponse, html: string, rules: Record<string, string> = {}): void {
  response
    .writeHead(200, { 'Content-Type': 'text/html; charset=utf-8', 'Cache-Control': 'no-store', ...rules })
    .end(html)
}

function sendNothing(response: ServerResponse): void {
  response.writeHead(404, { 'Content-Type': 'text/plain; charset=utf-8' }).end('There is no such mail here.')
}

function sendJson(response: ServerResponse, letters: Letter[]): void {
  const shown = letters.map(({ parts, ...letter }) => ({
    ...letter,
    parts: parts.map(({ bytes, ...part }) => ({ ...part, size: bytes.length })),
  }))
  response
    .writeHead(200, { 'Content-Type': 'application/json; charset=utf-8', 'Cache-Control': 'no-store' })
    .end(JSON.stringify(shown))
}
