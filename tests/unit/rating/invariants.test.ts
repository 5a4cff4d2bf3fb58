import { describe, expect, it } from 'vitest'
import { bands } from '~/rating/band'
import { edgeClasses, findingKinds } from '~/rating/finding'
import { canonicalInputs, type FindingInput, type PartInput, type RatingInputs } from '~/rating/inputs'
import { at, centralRate, found, hangingFromTwo, lowerOff, part, rated, sound } from './case'
import { createHazards } from './random-hazard'

const { hazard, finding, pick } = createHazards(7)
const make = (count: number, where?: 'bolt' | 'station') => Array.from({ length: count }, () => hazard(where))

/** Expects R not to fall; the last digits may differ by the order of a sum. */
function expectNoLower(worse: RatingInputs, than: RatingInputs): void {
  const [high, low] = [centralRate(worse), centralRate(than)]
  expect(high, canonicalInputs(worse)).toBeGreaterThanOrEqual(low * (1 - 1e-9))
}

const withFinding = (inputs: RatingInputs, more: FindingInput): RatingInputs => ({
  ...inputs,
  parts: inputs.parts.map((one, i) => (i === 0 ? { ...one, findings: [...one.findings, more] } : one)),
})

describe('Every rating', () => {
  it('is a number with its low below and its high above, and bands to match', () => {
    for (const inputs of make(200)) {
      const got = rated(inputs)
      const title = canonicalInputs(inputs)
      expect(Number.isFinite(got.rate) && got.rate >= 0, title).toBe(true)
      expect(got.rateLow, title).toBeLessThanOrEqual(got.rate)
      expect(got.rate, title).toBeLessThanOrEqual(got.rateHigh)
      expect(bands.indexOf(got.bandHigh), title).toBeLessThanOrEqual(bands.indexOf(got.band))
      expect(bands.indexOf(got.band), title).toBeLessThanOrEqual(bands.indexOf(got.bandLow))
      expect(Number.isFinite(got.timesHigh) && got.timesLow <= got.timesHigh, title).toBe(true)
      expect(got.reasons.length, title).toBeLessThanOrEqual(3)
      for (const { times } of got.reasons) expect(times, title).toBeGreaterThan(1)
    }
  })

  it('is no lower where more people climb', () => {
    for (const inputs of make(150)) {
      const of = (traffic: RatingInputs['climb']['traffic']) => ({
        ...inputs,
        climb: { ...inputs.climb, traffic, ascentsPerYear: null },
      })
      expectNoLower(of('steady'), of('quiet'))
      expectNoLower(of('busy'), of('steady'))
      expectNoLower(of('groups'), of('busy'))
    }
  })

  it('is no lower when the point below is worse', () => {
    const states = ['good', 'fair', 'poor', 'severe'] as const
    for (const inputs of make(150, 'bolt').filter(({ at }) => at > 0)) {
      const of = (state: (typeof states)[number]) => ({
        ...inputs,
        climb: {
          ...inputs.climb,
          points: inputs.climb.points.map((point, i) => (i === inputs.at - 1 ? { ...point, state } : point)),
        },
      })
      for (let i = 1; i < states.length; i++) expectNoLower(of(states[i]!), of(states[i - 1]!))
    }
  })

  it('is no lower when one more fault is found', () => {
    const faults = findingKinds.filter(kind => kind !== 'no_fault' && kind !== 'missing')
    for (const inputs of make(500)) expectNoLower(withFinding(inputs, finding(pick(faults))), inputs)
  })

  it('is no lower when a groove is deeper, rust is worse or an edge sharper', () => {
    for (const inputs of make(150)) {
      const groove = (mm: number) =>
        withFinding(inputs, found('groove', { low: mm, high: mm, unit: 'mm', edge: 'felt' }))
      expectNoLower(groove(3), groove(1))
      expectNoLower(groove(6), groove(3))
      const rust = (grade: number) =>
        withFinding(inputs, found('rust', { low: grade, high: grade, unit: 'grade' }))
      for (let grade = 1; grade <= 5; grade++) expectNoLower(rust(grade), rust(grade - 1))
      const edge = (i: number) => withFinding(inputs, found('groove', { edge: edgeClasses[i]! }))
      for (let i = 1; i < edgeClasses.length; i++) expectNoLower(edge(i), edge(i - 1))
    }
  })

  it('is no lower for a two-point station when one of its like points is taken away', () => {
    for (const inputs of make(150, 'station')) {
      const [a] = inputs.parts
      if (a!.findings.some(({ kind }) => kind === 'missing')) continue
      const shared = inputs.parts.filter(({ side }) => side === null)
      const like: PartInput = {
        ...a!,
        id: 'b',
        side: 'b',
        findings: a!.findings.filter(({ kind }) => kind === 'no_fault'),
      }
      expectNoLower({ ...inputs, parts: [a!, ...shared] }, { ...inputs, parts: [a!, like, ...shared] })
    }
  })

  it('is no lower for a point of which nothing is known than for a good one', () => {
    for (const inputs of make(150)) {
      const of = (findings: FindingInput[]) => ({
        ...inputs,
        parts: inputs.parts.map(one => ({ ...one, ageYears: null, material: 'unknown' as const, findings })),
      })
      expectNoLower(of([]), of(sound))
    }
  })

  it('gives the same result for the same inputs, to the last digit', () => {
    for (const inputs of make(20)) {
      expect(rated(structuredClone(inputs))).toEqual(rated(inputs))
      expect(canonicalInputs(structuredClone(inputs))).toBe(canonicalInputs(inputs))
    }
  })
})

describe('A fault on a line', () => {
  it('is more urgent the lower it sits, from bolt 2 up, where falls are as many', () => {
    for (const kind of ['turns_by_hand', 'nut_loose', 'bent'] as const)
      for (let bolt = 3; bolt <= 9; bolt++) {
        const of = (n: number) => at(n, [part('wedge_bolt', [found(kind)])], { crux: 'crux' })
        expectNoLower(of(bolt - 1), of(bolt))
      }
  })
})

describe('A worn ring', () => {
  const ring = (mm: number, edge: (typeof edgeClasses)[number] | null, findings: FindingInput[] = []) =>
    rated(
      at(
        lowerOff,
        hangingFromTwo(
          part('ring', [found('groove', { low: mm, high: mm, unit: 'mm', edge }), ...findings], {
            sizeMm: 10,
            ageYears: 8,
          }),
        ),
      ),
    )

  it('is more urgent with every sharper edge', () => {
    const rates = edgeClasses.map(edge => ring(1, edge).rate)
    for (let i = 1; i < rates.length; i++) expect(rates[i]).toBeGreaterThan(rates[i - 1]!)
  })

  it('could be as urgent as a sharp one while nobody has felt the edge', () => {
    expect(ring(2, null).rateHigh).toBeGreaterThanOrEqual(ring(2, 'sharp').rate)
    expect(ring(2, null).lookNext).toBe('run a fingernail over the edge, and photograph it close')
  })
})
