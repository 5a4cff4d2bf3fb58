import type { AddressInfo } from 'node:net'
import { asc } from 'drizzle-orm'
import PostalMime, { type Email } from 'postal-mime'
import { SMTPServer } from 'smtp-server'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { messages } from '~/db/schema/mail'
import { mailStep } from '~/mail/deliveries.server'
import type { Message } from '~/mail/message'
import { queueMail } from '~/mail/outbox.server'
import { createSender, type Sender } from '~/mail/sender.server'
import { toAct } from '~/record/acts.server'
import { testDatabase } from '../database'

const { db, empty } = await testDatabase()
const noon = new Date('2027-03-12T12:00:00.000Z')
const later = (minutes: number) => new Date(noon.getTime() + minutes * 60_000)
const act = toAct(noon, { kind: 'system', personId: null })

interface Received extends Email {
  envelopeTo: string[]
}
let received: Received[]
let refusal: (Error & { responseCode: number }) | null
let server: SMTPServer
let sender: Sender
let failures: { id: string; error: string }[]

function startServer(port = 0): Promise<number> {
  server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onRcptTo: (_, __, done) => done(refusal),
    onData(stream, session, done) {
      const chunks: Buffer[] = []
      stream.on('data', chunk => chunks.push(chunk))
      stream.on('end', async () => {
        const mail = await PostalMime.parse(Buffer.concat(chunks))
        received.push({ ...mail, envelopeTo: session.envelope.rcptTo.map(({ address }) => address) })
        done()
      })
    },
  })
  server.on('error', () => {})
  return new Promise(resolve => {
    const listening = server.listen(port, '127.0.0.1', () =>
      resolve((listening.address() as AddressInfo).port),
    )
  })
}

const stopServer = () => new Promise<void>(resolve => server.close(() => resolve()))
const readPicture = async (key: string) => {
  if (key === 'gone') throw new Error('no such file')
  return Buffer.from(`picture ${key}`)
}
const toSender = (port: number) =>
  createSender({
    smtpUrl: `smtp://127.0.0.1:${port}`,
    mailFrom: 'Cragfettle <gear@skerrow.example>',
    readPicture,
  })

beforeEach(async () => {
  await empty()
  received = []
  refusal = null
  failures = []
  sender = toSender(await startServer())
})
afterEach(async () => {
  sender.close()
  await stopServer()
})

const mail: Message = {
  kind: 'order-offered',
  dedupeKey: 'offer:1',
  to: 'mara@example.org',
  thread: 'order:1',
  subject: 'A job at Gannet Wall: Grüße',
  text: 'Will you mend it?',
  html: '<p>Will you mend it?</p><img src="cid:ring">',
  pictures: [
    { storageKey: 'abc', contentId: 'ring', name: 'ring.jpg' },
    { storageKey: 'gone', contentId: 'lost', name: 'lost.jpg' },
  ],
}
const queue = (changes: Partial<Message> = {}) => queueMail(db, act, { ...mail, ...changes })
const toStep = (by: Sender = sender) => mailStep(by, failure => failures.push(failure))
const run = (now = noon, step = toStep(), stopping = false) =>
  step.run({ db, clock: () => now, stopping: () => stopping })
const read = () => db.select().from(messages).orderBy(asc(messages.dedupeKey))
const refuse = (code: number, words: string) => {
  refusal = Object.assign(new Error(words), { responseCode: code })
}

test('a mail leaves with both parts, its pictures, its fixed id and its thread', async () => {
  await queue()
  expect(await run()).toBe(1)
  const [queued] = await read()
  expect(queued).toMatchObject({ state: 'done', sentAt: noon, text: mail.text })
  expect(received).toHaveLength(1)
  const [got] = received
  expect(got).toMatchObject({
    subject: mail.subject,
    messageId: queued!.messageId,
    envelopeTo: ['mara@example.org'],
  })
  expect(got!.text!.trim()).toBe(mail.text)
  expect(got!.html).toContain('cid:ring')
  expect(got).toMatchObject({
    inReplyTo: '<thread.order.1@cragfettle>',
    references: '<thread.order.1@cragfettle>',
  })
  expect(got!.attachments).toMatchObject([
    { filename: 'ring.jpg', contentId: '<ring>', disposition: 'inline' },
  ])
  const headers = Object.fromEntries(got!.headers.map(({ key, value }) => [key, value]))
  expect(headers).toMatchObject({
    'auto-submitted': 'auto-generated',
    'list-id': expect.stringContaining('<mail.skerrow.example>'),
  })
})

test('a mail leaves once, however often the worker comes round and whoever runs it', async () => {
  for (let i = 0; i < 10; i++) await queue({ dedupeKey: `offer:${i}`, pictures: [] })
  await queue({ pictures: [] })
  await Promise.all([run(), run(), run()])
  await run(later(60))
  expect(received).toHaveLength(10)
})

test('a mail the other side will never take is given up at once, and its address is not told', async () => {
  refuse(550, '<mara@example.org> is unknown here')
  await queue()
  await run()
  expect(await read()).toMatchObject([{ state: 'dead', tries: 1 }])
  expect(failures).toHaveLength(1)
  expect(failures[0]!.error).not.toContain('mara')
})

test('a mail the other side will take later is tried again', async () => {
  refuse(451, 'come back later')
  await queue()
  await run()
  expect(await read()).toMatchObject([{ state: 'waiting', dueAt: later(1) }])
  refusal = null
  await run(later(1))
  expect(await read()).toMatchObject([{ state: 'done', tries: 2 }])
  expect(received).toHaveLength(1)
})

test('with the mail server away nothing is lost, the rest goes back untried, and all leave when it is back', async () => {
  for (const key of ['a', 'b', 'c']) await queue({ dedupeKey: key, pictures: [] })
  const { port } = server.server.address() as AddressInfo
  await stopServer()
  const step = toStep()
  expect(await run(noon, step)).toBe(0)
  expect((await read()).map(({ tries }) => tries).sort()).toEqual([0, 0, 1])
  await startServer(port)
  expect(await run(later(0.1), step)).toBe(0)
  await run(later(1), step)
  expect(received).toHaveLength(3)
})

test('the text of a code is forgotten once it has left', async () => {
  await queue({ kind: 'sign-in-code', text: '4821 9306' })
  await run()
  expect(received[0]!.text).toContain('4821 9306')
  expect(await read()).toMatchObject([{ text: null, html: null }])
})

test('a worker told to stop gives back what it has not begun to send', async () => {
  await queue()
  await run(noon, toStep(), true)
  expect(received).toEqual([])
  expect(await read()).toMatchObject([{ state: 'waiting', tries: 0, leaseBy: null }])
})

test('nothing in a subject or an address can add a receiver', async () => {
  await queue({
    subject: 'Hello\r\nBcc: spy@example.org',
    to: 'mara@example.org, spy@example.org',
    pictures: [],
  })
  await run()
  for (const { envelopeTo, headers } of received) {
    expect(envelopeTo).not.toContain('spy@example.org')
    expect(headers.some(({ key }) => key === 'bcc')).toBe(false)
  }
})

test('a mail another worker has by now is left to that one', async () => {
  await queue({ dedupeKey: 'a', pictures: [] })
  await queue({ dedupeKey: 'b', pictures: [] })
  let sent = 0
  const slow: Sender = {
    close: () => {},
    async send() {
      sent++
      await db.update(messages).set({ leaseBy: 'another' })
      return { ok: true }
    },
  }
  await run(noon, toStep(slow))
  expect(sent).toBe(1)
  expect(await read()).toMatchObject([
    { state: 'waiting', leaseBy: 'another' },
    { state: 'waiting', leaseBy: 'another' },
  ])
})
