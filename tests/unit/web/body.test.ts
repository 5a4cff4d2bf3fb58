import { afterAll, beforeAll, expect, test } from 'vitest'
import { capBodies } from '~/web/body.server'
import { serve } from './serving'

let server: Awaited<ReturnType<typeof serve>>
beforeAll(async () => {
  server = await serve([capBodies({ bytes: 1024, isExempt: path => path === '/photos' })])
})
afterAll(() => server.close())

const send = (path: string, size: number) => server.ask(path, { method: 'POST', body: 'x'.repeat(size) })

test('a form of the size allowed goes on', async () => {
  expect((await send('/reports', 1024)).status).toBe(200)
})

test('a form that is larger is refused before it is read, in a sentence with the size', async () => {
  const answer = await send('/reports', 1025)
  expect(answer.status).toBe(413)
  expect(await answer.text()).toContain('1 kB')
})

test('an upload has its own limit elsewhere', async () => {
  expect((await send('/photos', 5000)).status).toBe(200)
})

test('a body of unknown length is refused', async () => {
  const body = new Blob(['x'.repeat(9)]).stream()
  const init = { method: 'POST', body, duplex: 'half' } as RequestInit
  expect((await server.ask('/reports', init)).status).toBe(411)
})
