import { expect, test } from 'vitest'
import {
  findCookie,
  guestCookie,
  hasOurCookie,
  sessionCookie,
  toClearCookie,
  toSetCookie,
} from '~/web/cookies'

const secret = 'a'.repeat(43)

test('a cookie is found between others and under its own name only', () => {
  const header = `theme=dark; __Host-session=${secret}; other=${secret}`
  expect(findCookie(header, sessionCookie)).toBe(secret)
  expect(findCookie(header, guestCookie)).toBeNull()
})

test('a value that no secret of ours can have is no secret', () => {
  expect(findCookie('__Host-session=short', sessionCookie)).toBeNull()
  expect(findCookie(`__Host-session=${'a'.repeat(42)};`, sessionCookie)).toBeNull()
  expect(findCookie(undefined, sessionCookie)).toBeNull()
})

test('a request with any value under our name counts as carrying our cookie', () => {
  expect(hasOurCookie('a=1; __Host-guest=x')).toBe(true)
  expect(hasOurCookie('__Host-session')).toBe(true)
  expect(hasOurCookie('x__Host-session=1')).toBe(false)
  expect(hasOurCookie(undefined)).toBe(false)
})

test('a cookie is kept to this host, out of reach of scripts and of requests from other pages', () => {
  for (const line of [toSetCookie(sessionCookie, secret), toClearCookie(sessionCookie)]) {
    expect(line).toMatch(/^__Host-session=/)
    for (const attribute of ['Path=/', 'Secure', 'HttpOnly', 'SameSite=Lax'])
      expect(line.split('; ')).toContain(attribute)
    expect(line).not.toMatch(/Domain/i)
  }
  expect(toClearCookie(sessionCookie)).toMatch(/=;.*Max-Age=0$/)
})
