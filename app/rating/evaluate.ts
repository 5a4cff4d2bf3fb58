import { type ConsequenceClass, consequenceClasses, consequenceWeights } from './consequence'
import { chooseEdge, toCutPerFall, toCutPerLowering } from './edges'
import { countEvents, isStation, toStationShares, toYearlyEvents, type YearlyEvents } from './events'
import { type ClassedLoad, toHangConsequences, toUncaughtLoads } from './falls'
import type { EdgeClass } from './finding'
import { edgeClasses } from './finding'
import type { RatingInputs } from './inputs'
import { inSeries } from './interference'
import { type Lognormal, type Mixture, toMixtureCdf } from './lognormal'
import type { Picker } from './picker'
import { failStation } from './station'
import { toStrength } from './strength'
import { failInYear, onGrid } from './yearly'

export const ways = ['breaks', 'cuts_rope', 'releases_rope'] as const
export type Way = (typeof ways)[number]

/** The chance a year of each consequence, by the way it comes about, and what was weighed against what. */
export interface Evaluation {
  byWay: Record<Way, Record<ConsequenceClass, number>>
  rate: number
  load: Lognormal | null
  strength: Mixture
}

const none = (): Record<ConsequenceClass, number> => ({ short: 0, long: 0, low: 0, ground: 0 })

/** The one figure: every class by its weight. */
export function toRate(byClass: Record<ConsequenceClass, number>): number {
  return consequenceClasses.reduce((sum, of) => sum + consequenceWeights[of] * byClass[of], 0)
}

const atLeastOnce = (expected: number) => 1 - Math.exp(-expected)

/** The chance that the whole point lets go under a load: sides of a station share it, the rest is in series. */
function toPointFailure(inputs: RatingInputs, strengths: Map<string, Mixture>, picker: Picker) {
  const cdfs = (side: 'a' | 'b' | null) =>
    inputs.parts
      .filter(part => part.side === side && part.kind !== 'resin')
      .map(part => (x: number) => toMixtureCdf(strengths.get(part.id)!, x))
  const series = (list: ((x: number) => number)[]) => (x: number) => inSeries(list.map(cdf => cdf(x)))
  const [a, b, shared] = [cdfs('a'), cdfs('b'), series(cdfs(null))]
  if (a.length === 0 || b.length === 0) {
    const one = series([...a, ...b])
    return (x: number) => inSeries([one(x), shared(x)])
  }
  const c = picker.pick(`common.${inputs.otherSide ?? 'looked_at'}`)
  const both = failStation(series(a), series(b), { k: picker.pick('shock'), c })
  return (x: number) => inSeries([both(x), shared(x)])
}

function breaks(events: YearlyEvents, failing: (x: number) => number): Record<ConsequenceClass, number> {
  const grid = onGrid(failing)
  const all = none()
  for (const of of consequenceClasses) all[of] = events[of].length === 0 ? 0 : failInYear(events[of], grid)
  return all
}

/** The sharpest edge the rope runs over at the point, or null. At a bolt only what is left hanging there counts. */
function findEdge(inputs: RatingInputs): EdgeClass | null {
  const hanging = [
    'connector',
    'fixed_draw',
    'quick_link',
    'ring',
    'sling',
    'cord',
    'swivel',
    'chain',
    'lower_off_hook',
    'cold_shut',
  ]
  const parts = isStation(inputs) ? inputs.parts : inputs.parts.filter(part => hanging.includes(part.kind))
  const edges = parts.flatMap(part => {
    const loose = part.findings.some(found => found.kind === 'rope_over_edge')
    const over = isStation(inputs) && part.kind === 'hanger' && !loose && !inputs.usedFor.abseil
    return over ? [] : (chooseEdge(part) ?? [])
  })
  return edgeClasses.findLast(edge => edges.includes(edge)) ?? null
}

function cuts(inputs: RatingInputs, picker: Picker): Record<ConsequenceClass, number> {
  const edge = findEdge(inputs)
  const all = none()
  if (edge === null) return all
  const counts = countEvents(inputs, picker)
  if (isStation(inputs)) {
    const cut = atLeastOnce(counts.hangs * toCutPerLowering(edge, picker))
    for (const { consequence, share } of toStationShares(inputs)) all[consequence] += cut * share
    return all
  }
  const hang = { median: picker.pick('load.lowering'), zeta: picker.pick('load.lowering.zeta') }
  for (const { consequence, share, load } of toUncaughtLoads(inputs, picker)) {
    const expected =
      counts.falls * toCutPerFall(edge, load, picker) + counts.hangs * toCutPerFall(edge, hang, picker)
    all[consequence] += atLeastOnce(expected) * share
  }
  return all
}

/** Ways a part may let the rope out, by what was found on it. */
function listReleases(inputs: RatingInputs): string[] {
  const kinds = inputs.parts.flatMap(part => part.findings.map(found => found.kind))
  const names: string[] = []
  if (kinds.includes('gate_stuck')) names.push('gate')
  if (kinds.includes('link_unscrewed')) names.push('unscrewed')
  if (kinds.includes('nose_hooked')) names.push('nose')
  if (kinds.includes('keeper_gone')) names.push('open_hook')
  if (kinds.includes('hook_worn')) names.push('worn_hook')
  if (kinds.includes('badly_placed')) names.push('rotation')
  return names
}

function releases(
  inputs: RatingInputs,
  picker: Picker,
  falls: ClassedLoad[],
): Record<ConsequenceClass, number> {
  const all = none()
  const counts = countEvents(inputs, picker)
  for (const name of listReleases(inputs)) {
    const of = (event: string) => picker.pick(`release.${name}.${event}`)
    const still = counts.handling * of('handling') + counts.hangs * of('hang')
    if (isStation(inputs)) {
      const chance = atLeastOnce(still + counts.falls * of('fall'))
      for (const { consequence, share } of toStationShares(inputs)) all[consequence] += chance * share
      continue
    }
    for (const { consequence, share } of falls)
      all[consequence] += atLeastOnce(counts.falls * share * of('fall'))
    for (const { consequence, share } of toHangConsequences(inputs, picker))
      all[consequence] += atLeastOnce(still * share)
  }
  return all
}

/** A missing hanger holds nothing and nobody hangs on it, but it is seen: only the share that goes on all the same falls there. */
function isMissing(inputs: RatingInputs): boolean {
  return inputs.parts.some(part => part.findings.some(found => found.kind === 'missing'))
}

function toFallsAlone(falls: ClassedLoad[], rate: number): YearlyEvents {
  const events: YearlyEvents = { short: [], long: [], low: [], ground: [] }
  for (const { consequence, share, load } of falls) events[consequence].push({ load, rate: rate * share })
  return events
}

/** One evaluation with the picker's numbers: loads against strength, edges, and openings, by what a failure leads to. */
export function evaluate(inputs: RatingInputs, picker: Picker, prior?: string): Evaluation {
  const { events, falls } = toYearlyEvents(inputs, picker)
  const strengths = new Map(
    inputs.parts.map(part => [part.id, toStrength(part, inputs.place, picker, prior)]),
  )
  const missing = isMissing(inputs)
  const byWay = {
    breaks: missing
      ? breaks(toFallsAlone(falls, countEvents(inputs, picker).falls * picker.pick('avoided')), () => 1)
      : breaks(events, toPointFailure(inputs, strengths, picker)),
    cuts_rope: cuts(inputs, picker),
    releases_rope: releases(inputs, picker, falls),
  }
  const rate = toRate(byWay.breaks) + toRate(byWay.cuts_rope) + toRate(byWay.releases_rope)
  return { byWay, rate, load: toShownLoad(falls, events), strength: toShownStrength(inputs, strengths) }
}

/** The load drawn: all falls of a bolt as one, the commonest stream of a station. */
function toShownLoad(falls: ClassedLoad[], events: YearlyEvents): Lognormal | null {
  if (falls.length === 0)
    return (
      events.ground.reduce<{ rate: number; load: Lognormal } | null>(
        (most, next) => (most === null || next.rate > most.rate ? next : most),
        null,
      )?.load ?? null
    )
  const mean = falls.reduce((sum, { share, load }) => sum + share * Math.log(load.median), 0)
  const square = falls.reduce(
    (sum, { share, load }) => sum + share * (load.zeta ** 2 + Math.log(load.median) ** 2),
    0,
  )
  return { median: Math.exp(mean), zeta: Math.sqrt(Math.max(1e-3, square - mean * mean)) }
}

/** The strength drawn: of the part with the most bad of its kind. */
function toShownStrength(inputs: RatingInputs, strengths: Map<string, Mixture>): Mixture {
  const bad = (id: string) => strengths.get(id)?.[2]?.weight ?? 0
  const worst = [...inputs.parts].sort((a, b) => bad(b.id) - bad(a.id))[0]
  return worst === undefined ? [] : strengths.get(worst.id)!
}
