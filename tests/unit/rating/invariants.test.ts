import { describe, expect, it } from 'vitest'
import { bands } from '~/rating/band'
import { groundZones } from '~/rating/consequence'
import { edgeClasses } from '~/rating/finding'
import { canonicalInputs } from '~/rating/inputs'
import { at, found, hangingFromTwo, lowerOff, part, rated, sound } from './case'

/** The same pseudo-random numbers each time (mulberry32). */
function seeded(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32
  }
}

const random = seeded(7)
const pick = <T>(list: readonly T[]) => list[Math.floor(random() * list.length)]!
const hazards = Array.from({ length: 60 }, () => {
  const bolt = 1 + Math.floor(random() * 9)
  const kind = pick(['turns_by_hand', 'nut_loose', 'spins', 'loose_in_hole', 'bent', 'rock_hollow'] as const)
  const traffic = pick(['quiet', 'steady', 'busy'] as const)
  return { bolt, kind, traffic, title: `${kind} at bolt ${bolt}, ${traffic}` }
})

const parts = (kind: (typeof hazards)[number]['kind']) => [part('bonded_eye', [found(kind)])]

describe('Every rating', () => {
  it.each(hazards)('of $title lies between its low and its high', ({ bolt, kind, traffic }) => {
    const { rate, rateLow, rateHigh, band, bandLow, bandHigh } = rated(at(bolt, parts(kind), { traffic }))
    expect(rateLow).toBeLessThanOrEqual(rate)
    expect(rate).toBeLessThanOrEqual(rateHigh)
    expect(bands.indexOf(bandHigh)).toBeLessThanOrEqual(bands.indexOf(band))
    expect(bands.indexOf(band)).toBeLessThanOrEqual(bands.indexOf(bandLow))
  })

  it.each(hazards)('of $title is no lower where more people climb', ({ bolt, kind }) => {
    const of = (traffic: 'quiet' | 'steady' | 'busy') => rated(at(bolt, parts(kind), { traffic })).rate
    expect(of('steady')).toBeGreaterThanOrEqual(of('quiet'))
    expect(of('busy')).toBeGreaterThanOrEqual(of('steady'))
  })

  it.each(hazards.filter(({ bolt }) => bolt > 1))(
    'of $title is no lower when the bolt below is worse',
    ({ bolt, kind }) => {
      const good = at(bolt, parts(kind))
      const worse = structuredClone(good)
      worse.climb.points[bolt - 2]!.state = 'severe'
      // the last digits may differ by the order of a sum
      expect(rated(worse).rate).toBeGreaterThanOrEqual(rated(good).rate * (1 - 1e-12))
    },
  )

  it('gives the same result for the same inputs, to the last digit', () => {
    const inputs = at(3, parts('turns_by_hand'))
    expect(rated(structuredClone(inputs))).toEqual(rated(inputs))
    expect(canonicalInputs(structuredClone(inputs))).toBe(canonicalInputs(inputs))
  })
})

describe('A worn ring', () => {
  const ring = (mm: number, edge: (typeof edgeClasses)[number] | null) =>
    rated(
      at(
        lowerOff,
        hangingFromTwo(
          part('ring', [found('groove', { low: mm, high: mm, unit: 'mm', edge })], { sizeMm: 10 }),
        ),
      ),
    ).rate

  it('is never less urgent when the groove is deeper', () => {
    const rates = [0.5, 1, 2, 3, 4, 6, 8].map(mm => ring(mm, 'felt'))
    for (let i = 1; i < rates.length; i++) expect(rates[i]).toBeGreaterThanOrEqual(rates[i - 1]!)
  })

  it('is never less urgent when the edge is sharper', () => {
    const rates = edgeClasses.map(edge => ring(1, edge))
    for (let i = 1; i < rates.length; i++) expect(rates[i]).toBeGreaterThan(rates[i - 1]!)
  })
})

describe('A two-point lower-off', () => {
  it('is less urgent than the same with one of its points taken away', () => {
    const two = hangingFromTwo(part('ring', sound, { ageYears: 5 }))
    const turning = two.map(one => (one.side === 'a' ? { ...one, findings: [found('turns_by_hand')] } : one))
    const both = rated(at(lowerOff, turning, { otherSide: 'looked_at' })).rate
    const single = rated(
      at(
        lowerOff,
        turning.filter(one => one.side !== 'b'),
      ),
    ).rate
    expect(both).toBeLessThan(single)
  })

  it('of which nothing is known is more urgent than one in good order', () => {
    const unknown = ['a', 'b'].map(side => part('bonded_eye', [], { side: side as 'a' | 'b', id: side }))
    const good = unknown.map(one => ({ ...one, findings: sound, ageYears: 5 }))
    expect(rated(at(lowerOff, unknown)).rate).toBeGreaterThan(rated(at(lowerOff, good)).rate)
  })
})

describe('The ground zone of a line', () => {
  const line = at(3, []).climb

  it('is hatched above the second bolt, where only the bolt below keeps a fall off the ground', () => {
    const zones = groundZones({
      ...line,
      points: [2.1, 3.9, 5.6].map(alongM => ({ kind: 'bolt', alongM, assumed: false, state: 'good' })),
    })
    expect(zones.some(zone => zone.kind === 'hatched' && zone.fromM <= 4.4 && zone.toM >= 4.6)).toBe(true)
  })

  it('is dotted below the first bolt, where a fall meets the ground anyway', () => {
    expect(groundZones(line)[0]).toMatchObject({ fromM: 0, kind: 'anyway' })
  })

  it('has nothing hatched where there is only air below', () => {
    expect(groundZones({ ...line, below: 'air' })).toEqual([])
  })
})
