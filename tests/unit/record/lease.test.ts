import { expect, test } from 'vitest'
import { mostTries, toNextTry } from '~/record/lease'

test('what failed is tried again after 1, 5, 25 minutes, 2 and 10 hours, then never', () => {
  const now = new Date('2027-03-12T12:00:00Z')
  const minutes = [1, 2, 3, 4, 5, 6].map(tries => {
    const next = toNextTry(tries, now)
    return next && (next.getTime() - now.getTime()) / 60_000
  })
  expect(minutes).toEqual([1, 5, 25, 120, 600, null])
  expect(mostTries).toBe(6)
})
