import { type ConsequenceClass, consequenceClasses, consequenceWeights } from './consequence'
import { toCuts } from './cuts'
import { toAvoidedEvents, toYearlyEvents } from './events'
import type { PartInput, RatingInputs } from './inputs'
import type { Picker } from './picker'
import { isGone, toPointFailing } from './point'
import { toReleases } from './releases'
import { loadGrid } from './tables'
import { failInYear, toYearlyLargest } from './yearly'

export type ByClass = Record<ConsequenceClass, number>

/** The chance a year of each consequence, by the way it comes about. */
export interface Evaluation {
  breaks: ByClass
  cuts: ByClass
  releases: ByClass
  /** the one figure */
  rate: number
}

/** The one figure: every class by its weight. */
export function toRate(byClass: ByClass): number {
  return consequenceClasses.reduce((sum, of) => sum + consequenceWeights[of] * byClass[of], 0)
}

/** The sum of all ways by class, a year. */
export function toByClass({ breaks, cuts, releases }: Evaluation): ByClass {
  const of = (name: ConsequenceClass) => breaks[name] + cuts[name] + releases[name]
  return { short: of('short'), long: of('long'), low: of('low'), ground: of('ground') }
}

/** Load against strength: the year's largest load of each class against the point as it is now. */
function toBreaks(inputs: RatingInputs, picker: Picker, counts?: (part: PartInput) => boolean): ByClass {
  const isAll = counts === undefined
  const gone = isGone(inputs)
  const largest = picker.step('largest', () => {
    const met = gone ? toAvoidedEvents(inputs, picker) : toYearlyEvents(inputs, picker)
    return Object.fromEntries(
      consequenceClasses.map(of => [of, met[of].length === 0 ? null : toYearlyLargest(met[of])]),
    ) as Record<ConsequenceClass, Float64Array | null>
  })
  const compute = () => (gone ? loadGrid.map(() => 1) : toPointFailing(inputs, picker, counts))
  const failing = isAll ? picker.step('failing', compute) : compute()
  const of = (name: ConsequenceClass) => {
    const weights = largest[name]
    return weights === null ? 0 : failInYear(weights, failing)
  }
  return { short: of('short'), long: of('long'), low: of('low'), ground: of('ground') }
}

/** R of load against strength alone when only some of the parts could fail, for saying which of them decide. */
export function toBreakRate(
  inputs: RatingInputs,
  picker: Picker,
  counts: (part: PartInput) => boolean,
): number {
  return toRate(toBreaks(inputs, picker, counts))
}

/** One run with the picker's numbers: loads against strength, edges, and openings, by what a failure leads to. */
export function evaluate(inputs: RatingInputs, picker: Picker): Evaluation {
  const breaks = picker.step('breaks', () => toBreaks(inputs, picker))
  const cuts = picker.step('cuts', () => toCuts(inputs, picker))
  const releases = picker.step('releases', () => toReleases(inputs, picker))
  return { breaks, cuts, releases, rate: toRate(breaks) + toRate(cuts) + toRate(releases) }
}
