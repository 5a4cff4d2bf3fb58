import { expect, test } from 'vitest'
import { redactPath } from '~/web/link-paths'
import { logRequests } from '~/web/log.server'
import { serve } from './serving'

test('a request leaves one line without its query and without the secret of a mailed link', async () => {
  const lines: Record<string, unknown>[] = []
  const server = await serve([logRequests(line => lines.push(line))])
  const answer = await server.ask('/offers/s3cr3t?email=mara@example.org', { method: 'POST' })
  await answer.text()
  await expect.poll(() => lines).toHaveLength(1)
  await server.close()
  expect(lines[0]).toMatchObject({ method: 'POST', path: '/offers/…', status: 200 })
  expect(lines[0]!.id).toBe(answer.headers.get('x-request-id'))
  expect(JSON.stringify(lines)).not.toMatch(/s3cr3t|mara/)
})

test("the framework's own request for a link page is redacted too", () => {
  expect(redactPath('/status/s3cr3t.data')).toBe('/status/…')
  expect(redactPath('/crags/gannet-wall-KC7FQ2X')).toBe('/crags/gannet-wall-KC7FQ2X')
})
