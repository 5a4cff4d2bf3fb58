import type { AnchorKind } from '~/crags/anchor'
import { conditionStates } from '~/crags/condition-state'
import { materials, type PartKind, partKinds, type Side } from '~/crags/part'
import { edgeClasses, type FindingKind, findingKinds } from '~/rating/finding'
import type { FindingInput, PartInput, RatingInputs } from '~/rating/inputs'

/** The same pseudo-random numbers each time (mulberry32). */
export function seeded(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32
  }
}

const stationKinds = ['lower_off', 'abseil_station', 'stance', 'belay_stake'] as const

/** Hazards of every kind, mostly with little known of them, from one stream of random numbers. */
export function createHazards(seed: number) {
  const random = seeded(seed)
  const between = (low: number, high: number) => low + random() * (high - low)
  const chance = (share: number) => random() < share
  const pick = <T>(list: readonly T[]) => list[Math.floor(random() * list.length)]!

  function finding(kind: FindingKind = pick(findingKinds)): FindingInput {
    const grade = Math.floor(between(0, 6))
    const measured =
      kind === 'rust'
        ? ({ low: grade, high: grade, unit: 'grade' } as const)
        : kind === 'groove' && chance(0.3)
          ? ({ low: between(0, 2), high: between(2, 4), unit: 'mm' } as const)
          : ({ low: null, high: null, unit: null } as const)
    return { kind, ...measured, edge: chance(0.3) ? pick(edgeClasses) : null, triedByHand: null }
  }

  const part = (id: string, side: Side | null, kind: PartKind = pick(partKinds)): PartInput => ({
    id,
    kind,
    material: chance(0.2) ? pick(materials) : 'unknown',
    sizeMm: chance(0.1) ? between(6, 14) : null,
    ageYears: chance(0.3) ? between(0, 40) : null,
    side,
    findings: Array.from({ length: Math.floor(between(0, 3)) }, () => finding()),
  })

  function line(): RatingInputs['climb'] {
    const bolts = 1 + Math.floor(between(1, 12))
    let height = between(1.5, 4)
    const points = Array.from({ length: bolts + 1 }, (_, i) => {
      const alongM = height
      height += between(0.8, 4)
      const kind: AnchorKind =
        i === bolts ? pick(stationKinds) : chance(0.9) ? 'bolt' : pick(['peg', 'thread'])
      return { kind, alongM, assumed: chance(0.8), state: pick(conditionStates) }
    })
    return {
      lengthM: points.at(-1)!.alongM,
      traffic: pick(['quiet', 'steady', 'busy', 'groups']),
      ascentsPerYear: chance(0.1) ? between(5, 3000) : null,
      start: chance(0.8) ? 'ground' : 'stance',
      below: pick(['ground', 'ground', 'ground', 'ledge', 'stance', 'sea', 'air']),
      ledges: chance(0.2) ? [{ atM: between(1, 15) }] : [],
      points,
    }
  }

  function hazard(where: 'bolt' | 'station' | 'anywhere' = 'anywhere'): RatingInputs {
    const climb = line()
    const top = climb.points.length - 1
    const at =
      where === 'station' || (where === 'anywhere' && chance(0.3)) ? top : Math.floor(between(0, top))
    const parts =
      at === top
        ? [part('a', 'a'), part('b', 'b'), ...(chance(0.5) ? [part('shared', null)] : [])]
        : [part('one', null), ...(chance(0.5) ? [part('two', null)] : [])]
    return {
      climb,
      at,
      crux: pick(['ordinary', 'ordinary', 'crux', 'much_fallen_on']),
      parts,
      place: {
        seaKm: chance(0.5) ? between(0, 30) : null,
        warmSea: chance(0.3),
        corrosivity: chance(0.2) ? pick(['C1', 'C2', 'C3', 'C4', 'C5', 'CX']) : null,
      },
      otherSide: at === top ? pick(['looked_at', 'not_looked_at', 'both_bad', null]) : null,
      usedFor: { lowering: chance(0.6), abseil: chance(0.3), toprope: chance(0.6) },
    }
  }
  return { hazard, finding, pick }
}
