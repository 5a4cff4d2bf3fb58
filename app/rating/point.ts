import type { PartInput, RatingInputs } from './inputs'
import type { Lognormal, Mixture } from './lognormal'
import type { Picker } from './picker'
import { failStation } from './station'
import { toCap, toStrength } from './strength'
import { loadGrid, toMixtureTable } from './tables'

const isMissing = (part: PartInput) => part.findings.some(found => found.kind === 'missing')

const bonded: readonly PartInput['kind'][] = ['bonded_eye', 'bonded_staple', 'bonded_stud']

/** Parts that carry: faults of the resin count to the glued bolt it holds; resin without one stands for it. */
function listCarrying(parts: readonly PartInput[]): PartInput[] {
  const isHeld = (resin: PartInput) =>
    parts.some(part => part.side === resin.side && bonded.includes(part.kind))
  return parts
    .filter(part => part.kind !== 'resin' || !isHeld(part))
    .map(part => {
      if (!bonded.includes(part.kind)) return part
      const resin = parts.filter(({ kind, side }) => kind === 'resin' && side === part.side)
      const faults = resin.flatMap(({ findings }) => findings.filter(({ kind }) => kind !== 'no_fault'))
      return faults.length === 0 ? part : { ...part, findings: [...part.findings, ...faults] }
    })
}

interface PartStrength {
  part: PartInput
  strength: Mixture
  /** a weaker way to be loaded, in series with the strength along the axis */
  cap: Lognormal | null
}

/** The strength of each part as it is now, kN. */
export function listStrengths(inputs: RatingInputs, picker: Picker): PartStrength[] {
  return listCarrying(inputs.parts).map((part, i) =>
    picker.step(`strength ${i}`, () => ({
      part,
      strength: toStrength(part, inputs.place, picker),
      cap: toCap(part, picker),
    })),
  )
}

/** Puts one more part in series over the grid: F ← F + q − Fq. */
function joinInSeries(all: Float64Array, one: Float64Array): void {
  for (let i = 0; i < all.length; i++) all[i]! += one[i]! - all[i]! * one[i]!
}

/** Parts in series under one load: the chance that the first of them has failed at factor × x, for each x of the grid. */
function toSeries(strengths: readonly PartStrength[], factor: number): Float64Array {
  const all = new Float64Array(loadGrid.length)
  for (const { part, strength, cap } of strengths) {
    if (isMissing(part)) return all.fill(1)
    joinInSeries(all, toMixtureTable(strength, factor))
    if (cap !== null) joinInSeries(all, toMixtureTable([{ weight: 1, ...cap }], factor))
  }
  return all
}

function toTwoSides(
  a: readonly PartStrength[],
  b: readonly PartStrength[],
  inputs: RatingInputs,
  picker: Picker,
): Float64Array {
  const k = picker.pick('shock')
  // a side that nobody spoke of was not looked at
  const c = picker.pick(`common.${inputs.otherSide ?? 'not_looked_at'}`)
  const [aHalf, aShocked, aWhole] = [toSeries(a, 1 / 2), toSeries(a, k), toSeries(a, 1)]
  const [bHalf, bShocked, bWhole] = [toSeries(b, 1 / 2), toSeries(b, k), toSeries(b, 1)]
  return loadGrid.map((_, i) =>
    failStation(
      { half: aHalf[i]!, shocked: aShocked[i]!, whole: aWhole[i]! },
      { half: bHalf[i]!, shocked: bShocked[i]!, whole: bWhole[i]! },
      c,
    ),
  )
}

/**
 * The chance that the whole point lets go, for each load of the grid: two sides of a station share the load, what both
 * hang from is in series with them. `counts` leaves parts out. 0 everywhere when nothing is left.
 */
export function toPointFailing(
  inputs: RatingInputs,
  picker: Picker,
  counts: (part: PartInput) => boolean = () => true,
): Float64Array {
  const strengths = listStrengths(inputs, picker).filter(({ part }) => counts(part))
  const on = (side: PartInput['side']) => strengths.filter(({ part }) => part.side === side)
  const [a, b, shared] = [on('a'), on('b'), on(null)]
  if (a.length === 0 || b.length === 0) return toSeries([...a, ...b, ...shared], 1)
  const all = toTwoSides(a, b, inputs, picker)
  joinInSeries(all, toSeries(shared, 1))
  return all
}

/** Whether nothing is left to hold: something is missing on every side, or from what all hangs from. */
export function isGone(inputs: RatingInputs): boolean {
  const gone = (side: PartInput['side']) => inputs.parts.some(part => part.side === side && isMissing(part))
  const has = (side: PartInput['side']) => inputs.parts.some(part => part.side === side)
  return gone(null) || ((gone('a') || !has('a')) && (gone('b') || !has('b')) && (gone('a') || gone('b')))
}
