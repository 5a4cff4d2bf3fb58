import { once } from 'node:events'
import { get } from 'node:http'
import { createTransport } from 'nodemailer'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { type FakeMail, start } from '../../../../fakes/mail/server'

let mail: FakeMail
beforeEach(async () => {
  mail = await start()
})
afterEach(() => mail.close())

const send = (more: object = {}) =>
  createTransport(mail.smtpUrl).sendMail({
    from: 'Cragfettle <gear@skerrow.example>',
    to: 'mara@example.org',
    subject: 'Grüße vom Fels',
    text: 'Your code is 1234.\nOpen http://127.0.0.1:3000/a?b=1&c=2. Thank you.',
    ...more,
  })
const read = async (path: string) => (await fetch(`${mail.url}${path}`)).text()

test('a mail handed over is kept decoded, with its links without the full stop behind them', async () => {
  await send()
  expect(mail.seen()).toMatchObject([
    {
      to: ['mara@example.org'],
      from: 'Cragfettle <gear@skerrow.example>',
      subject: 'Grüße vom Fels',
      links: ['http://127.0.0.1:3000/a?b=1&c=2'],
    },
  ])
})

test('a link that stands in text and html is listed once, one of the html alone behind it', async () => {
  await send({
    html: '<a href="http://127.0.0.1:3000/a?b=1&amp;c=2">a</a> <a href="http://127.0.0.1:3000/z">z</a>',
  })
  expect(mail.seen()[0]?.links).toEqual(['http://127.0.0.1:3000/a?b=1&c=2', 'http://127.0.0.1:3000/z'])
})

test('the inbox page lists the newest mail first and shows markup of a subject as text', async () => {
  await send({ subject: 'First' })
  await send({ subject: '<b>Second</b>' })
  const page = await read('/')
  expect(page).toContain('&lt;b&gt;Second&lt;/b&gt;')
  expect(page.indexOf('Second')).toBeLessThan(page.indexOf('First'))
})

test('messages.json gives the mails in the order they came', async () => {
  await send({ subject: 'First' })
  await send({ subject: 'Second' })
  const messages = JSON.parse(await read('/messages.json'))
  expect(messages.map((each: { subject: string }) => each.subject)).toEqual(['First', 'Second'])
})

test('a picture inside a mail is shown in its frame and served as it was sent', async () => {
  const content = Buffer.from([137, 80, 78, 71, 0, 255])
  await send({
    html: '<p>See</p><img src="cid:ring@skerrow">',
    attachments: [{ filename: 'ring.png', content, cid: 'ring@skerrow', contentType: 'image/png' }],
  })
  const { id } = mail.seen()[0]!
  expect(await read(`/messages/${id}/html`)).toContain(`<img src="/messages/${id}/parts/0">`)
  const part = await fetch(`${mail.url}/messages/${id}/parts/0`)
  expect(part.headers.get('content-type')).toBe('image/png')
  expect(Buffer.from(await part.arrayBuffer())).toEqual(content)
})

test('the page of a mail frames its html without scripts, with links that open in a new tab', async () => {
  await send({
    html: '<html><head><title>x</title></head><body><a href="http://x.example/">x</a></body></html>',
  })
  const { id } = mail.seen()[0]!
  const frame = (await read(`/messages/${id}`)).match(/<iframe[^>]*sandbox="([^"]*)"/)?.[1]
  expect(frame).toBe('allow-popups allow-popups-to-escape-sandbox')
  expect(await read(`/messages/${id}/html`)).toContain('<head><base target="_blank">')
})

test('a delivery that was told to fail is refused for now, and the one after it is taken', async () => {
  mail.failNext()
  await expect(send()).rejects.toMatchObject({ responseCode: 451 })
  await send()
  expect(mail.seen()).toHaveLength(1)
})

test('a mail nobody sent answers 404', async () => {
  expect((await fetch(`${mail.url}/messages/7`)).status).toBe(404)
})

/** Asks for a path as it stands, which `fetch` would tidy up first. */
async function askRaw(path: string): Promise<number | undefined> {
  const [response] = await once(get(mail.url, { path }), 'response')
  response.resume()
  return response.statusCode
}

test.each(['//', '/messages/1/html', 'http://[/', '/%zz'])(
  'an address that cannot be, such as %s, answers 404 and the inbox stays up',
  async path => {
    expect(await askRaw(path)).toBe(404)
    expect((await fetch(mail.url)).status).toBe(200)
  },
)

test('a mail with a broken picture address and a broken kind of file is shown all the same', async () => {
  const raw = [
    'Subject: Broken',
    'Content-Type: multipart/mixed; boundary=q',
    '',
    '--q',
    'Content-Type: text/html',
    '',
    '<img src="cid:%zz">',
    '--q',
    'Content-Type: ima\u0001ge/p\u00e9ng',
    'Content-Disposition: attachment; filename=ring',
    '',
    'ring',
    '--q--',
    '',
  ].join('\r\n')
  await createTransport(mail.smtpUrl).sendMail({
    envelope: { from: 'gear@skerrow.example', to: 'mara@example.org' },
    raw,
  })
  const { id } = mail.seen()[0]!
  expect(await read(`/messages/${id}/html`)).toContain('cid:%zz')
  const part = await fetch(`${mail.url}/messages/${id}/parts/0`)
  expect([part.status, part.headers.get('content-type')]).toEqual([200, 'application/octet-stream'])
})

test('the html of a mail opened by itself may run no script', async () => {
  await send({ html: '<script>document.title = "ran"</script>' })
  const page = await fetch(`${mail.url}/messages/${mail.seen()[0]!.id}/html`)
  const rules = page.headers.get('content-security-policy')
  expect(rules).toMatch(/^sandbox/)
  expect(rules).not.toContain('allow-scripts')
})

test('all mails are gone after a reset, and numbers of mails are not used again', async () => {
  await send()
  const [first] = mail.seen()
  mail.reset()
  expect(mail.seen()).toEqual([])
  await send()
  expect(mail.seen()[0]!.id).not.toBe(first!.id)
})
