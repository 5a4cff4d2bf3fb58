import { afterAll, beforeAll, expect, test } from 'vitest'
import { refuseForeignOrigins } from '~/web/origin.server'
import { serve } from './serving'

let server: Awaited<ReturnType<typeof serve>>
beforeAll(async () => {
  server = await serve([refuseForeignOrigins({ appUrl: 'https://gear.example.org/' })])
})
afterAll(() => server.close())

const cookie = '__Host-session=x'
const post = (headers: Record<string, string>) => server.ask('/reports', { method: 'POST', headers })

test('a form from our own page is let through by either sign of it', async () => {
  expect((await post({ cookie, 'sec-fetch-site': 'same-origin' })).status).toBe(200)
  expect((await post({ cookie, origin: 'https://gear.example.org' })).status).toBe(200)
})

test.each([
  ['from another site', { 'sec-fetch-site': 'cross-site', origin: 'https://evil.example' }],
  ['from a neighbour under the same domain', { 'sec-fetch-site': 'same-site' }],
  ['without a word of where it comes from', {}],
  ['from a hidden origin', { origin: 'null' }],
  ['from an address that only begins like ours', { origin: 'https://gear.example.org.evil.example' }],
])('a form that carries our cookie %s is refused with a sentence', async (_, headers) => {
  const answer = await post({ cookie, ...headers })
  expect(answer.status).toBe(403)
  expect(await answer.text()).toContain('Nothing was changed')
})

test('a request without our cookie acts for nobody and goes on', async () => {
  expect((await post({ 'sec-fetch-site': 'cross-site', cookie: 'theme=dark' })).status).toBe(200)
})

test('reading is never refused', async () => {
  expect((await server.ask('/', { headers: { cookie, 'sec-fetch-site': 'cross-site' } })).status).toBe(200)
})

test.each(['PUT', 'PATCH', 'DELETE'])('%s is held to the same as a form', async method => {
  expect((await server.ask('/', { method, headers: { cookie } })).status).toBe(403)
})

test('an older browser that sends only a hidden origin may answer on the page of a mailed link, nowhere else', async () => {
  const send = (path: string, headers: object) =>
    server.ask(path, { method: 'POST', headers: { cookie, origin: 'null', ...headers } })
  expect((await send('/offers/s3cr3t', {})).status).toBe(200)
  expect((await send('/offers/s3cr3t', { 'sec-fetch-site': 'cross-site' })).status).toBe(403)
  expect((await send('/account', {})).status).toBe(403)
})
