import type { PartInput, RatingInputs } from './inputs'
import type { Mixture } from './lognormal'
import type { Picker } from './picker'
import { failStation } from './station'
import { toStrength } from './strength'
import { loadGrid, toMixtureTable } from './tables'

const isMissing = (part: PartInput) => part.findings.some(found => found.kind === 'missing')

/** Parts that carry: resin holds by its bolt, and counts by itself only where something was found on it. */
function listCarrying(parts: readonly PartInput[]): PartInput[] {
  return parts.filter(part => part.kind !== 'resin' || part.findings.some(found => found.kind !== 'no_fault'))
}

/** The strength of each part as it is now, in the order of the inputs. */
export function listStrengths(
  inputs: RatingInputs,
  picker: Picker,
): { part: PartInput; strength: Mixture }[] {
  return listCarrying(inputs.parts).map((part, i) => ({
    part,
    strength: picker.step(`strength ${i}`, () => toStrength(part, inputs.place, picker)),
  }))
}

type Strengths = ReturnType<typeof listStrengths>

/** Puts one more part in series over the grid: F ← F + q − Fq. */
function joinInSeries(all: Float64Array, one: Float64Array): void {
  for (let i = 0; i < all.length; i++) all[i]! += one[i]! - all[i]! * one[i]!
}

/** Parts in series under one load: the chance that the first of them has failed at factor × x, for each x of the grid. */
function toSeries(strengths: Strengths, factor: number): Float64Array {
  const all = new Float64Array(loadGrid.length)
  for (const { part, strength } of strengths) {
    if (isMissing(part)) return all.fill(1)
    joinInSeries(all, toMixtureTable(strength, factor))
  }
  return all
}

function toTwoSides(a: Strengths, b: Strengths, inputs: RatingInputs, picker: Picker): Float64Array {
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
