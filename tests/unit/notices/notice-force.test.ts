import { describe, expect, it } from 'vitest'
import { isInForce, toForce } from '~/notices/notice-force'
import { forceCases } from './force-cases'

const now = new Date('2027-05-02T12:00:00.000Z')

describe('A notice', () => {
  it.each(forceCases.map(one => [one.title, one] as const))('%s', (_, { held, force }) => {
    expect(toForce(held(now), now)).toBe(force)
    expect(isInForce(held(now), now)).toBe(force === 'in_force')
  })
})
