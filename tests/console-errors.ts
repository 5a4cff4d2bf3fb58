import { afterEach, beforeEach, expect, vi } from 'vitest'

/** What is said on `console.error` fails the test that caused it, unless the test has put its own in its place. */
beforeEach(() => {
  vi.spyOn(console, 'error')
})

afterEach(() => {
  const said = vi.isMockFunction(console.error) ? vi.mocked(console.error).mock.calls : []
  vi.restoreAllMocks()
  expect(said, 'what was said on console.error').toEqual([])
})
