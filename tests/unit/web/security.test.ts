import { afterEach, expect, test } from 'vitest'
import { findNonce, securityHeaders } from '~/web/security.server'
import { serve } from './serving'

let server: Awaited<ReturnType<typeof serve>>
afterEach(() => server.close())

async function ask(path: string, settings: { appUrl: string; production: boolean }) {
  const nonces: (string | undefined)[] = []
  server = await serve([
    securityHeaders(settings),
    (_, response, next) => {
      nonces.push(findNonce(response))
      next()
    },
  ])
  const answer = await server.ask(path)
  return { headers: answer.headers, nonce: nonces[0] }
}

const here = { appUrl: 'http://127.0.0.1:3000', production: true }

test('in production only our own scripts and those with the nonce of this very answer run', async () => {
  const { headers, nonce } = await ask('/', here)
  expect(nonce).toMatch(/^[\w-]{24}$/)
  const policy = headers.get('content-security-policy')!.split(';')
  expect(policy).toContain(`script-src 'self' 'nonce-${nonce}'`)
  expect(policy).toContain(`style-src 'self' 'nonce-${nonce}'`)
  expect(policy).toContain("frame-ancestors 'none'")
  expect(policy).toContain("worker-src 'self' blob:")
  expect(policy).toContain("img-src 'self' data: blob:")
  expect(policy.join()).not.toMatch(/unsafe|upgrade-insecure/)
})

test('strict transport is asked for where the address is https, and only there', async () => {
  expect((await ask('/', here)).headers.has('strict-transport-security')).toBe(false)
  await server.close()
  const secure = await ask('/', { ...here, appUrl: 'https://gear.example.org' })
  expect(secure.headers.get('strict-transport-security')).toContain('max-age=31536000')
})

test.each(['/status/abc', '/offers/abc', '/sheet/abc'])(
  'the page %s behind a mailed link sends no referrer',
  async path => {
    expect((await ask(path, here)).headers.get('referrer-policy')).toBe('no-referrer')
  },
)

test('other pages tell where one came from to this house only, and say nothing of what serves them', async () => {
  const { headers } = await ask('/crags', here)
  expect(headers.get('referrer-policy')).toBe('same-origin')
  expect(headers.get('x-content-type-options')).toBe('nosniff')
  expect(headers.get('cross-origin-opener-policy')).toBe('same-origin')
  expect(headers.get('permissions-policy')).toContain('camera=()')
})
