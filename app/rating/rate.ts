import type { PartKind } from '~/crags/part'
import { type Band, bandOf, moreUrgent } from './band'
import { type ConsequenceClass, consequenceClasses, consequenceWeights } from './consequence'
import { type Evaluation, evaluate, toRate, type Way, ways } from './evaluate'
import { listFloors } from './floors'
import type { RatingInputs } from './inputs'
import type { RatingModel } from './model'
import { createPicker } from './picker'
import { toReason } from './words'

/** Changes whenever the same inputs and model may give another result. */
export const engineVersion = '1.0'

/** How urgent a fixed point with its findings is on one climb, how sure, and why. */
export interface Rating {
  band: Band
  /** with the one unknown that matters most at its milder, or its worse end */
  bandLow: Band
  bandHigh: Band
  /** R a year: chances weighed by what a climber would hit */
  rate: number
  rateLow: number
  rateHigh: number
  /** R of the same point in ordinary service (only minor faults); `times` is danger against that */
  usual: number
  times: number
  timesLow: number
  timesHigh: number
  /** the class that carries most of R */
  worst: ConsequenceClass
  byClass: Record<ConsequenceClass, number>
  deciding: Way
  /** the three unknowns that move R most, in words, with R at the worse end over R at the milder */
  reasons: { name: string; words: string; times: number }[]
  lookNext: string | null
  floors: string[]
  load: { medianKn: number; zeta: number } | null
  strength: { weight: number; medianKn: number; zeta: number }[]
}

interface Moved {
  name: string
  low: number
  high: number
}

/** R with each ranged number in turn at its two ends, all others central. */
function moveEach(inputs: RatingInputs, model: RatingModel, names: string[]): Moved[] {
  const at = (name: string, end: 'low' | 'high') => evaluate(inputs, createPicker(model, { name, end })).rate
  return names.map(name => {
    const ends = [at(name, 'low'), at(name, 'high')]
    return { name, low: Math.min(...ends), high: Math.max(...ends) }
  })
}

/** A usual one of its kind: the same place with the same kinds of part, in ordinary service, nothing found on them. */
function toUsual(inputs: RatingInputs): RatingInputs {
  const parts = inputs.parts.map(part => ({ ...part, kind: usualKind[part.kind] ?? part.kind, findings: [] }))
  const otherSide = inputs.otherSide === null ? null : ('looked_at' as const)
  return { ...inputs, parts, otherSide, place: { ...inputs.place, warmSea: false } }
}

const usualKind: Partial<Record<PartKind, PartKind>> = { self_drilled: 'wedge_bolt', drive_in: 'wedge_bolt' }

const byClassOf = ({ byWay }: Evaluation) =>
  Object.fromEntries(
    consequenceClasses.map(of => [of, ways.reduce((sum, way) => sum + byWay[way][of], 0)]),
  ) as Record<ConsequenceClass, number>

/** The largest by a measure. */
function most<T>(items: readonly T[], measure: (item: T) => number): T {
  return items.reduce((best, next) => (measure(next) > measure(best) ? next : best))
}

/** Numbers that say the same in words are one reason: the strongest of them. */
function toReasons(moved: Moved[], inputs: RatingInputs) {
  const { kind } = inputs.climb.points[inputs.at]!
  const strongest = [...moved].sort((a, b) => b.high / b.low - a.high / a.low)
  const said = new Map<string, { name: string; words: string; times: number; look?: string }>()
  for (const { name, low, high } of strongest) {
    const { words, look } = toReason(name, kind)
    if (!said.has(words)) said.set(words, { name, words, times: high / low, look })
  }
  return [...said.values()]
}

const atLeast = (band: Band, floors: string[]) => (floors.length > 0 ? moreUrgent(band, 'turn') : band)

/**
 * The urgency of a fixed point: R with every number central; low and high as the lowest and highest R with one number
 * at an end of its range; bands, floors, reasons and the next best look. Never throws for scant inputs.
 */
export function rate(inputs: RatingInputs, model: RatingModel): Rating {
  const picker = createPicker(model, null)
  const central = evaluate(inputs, picker)
  const moved = moveEach(inputs, model, picker.ranged()).filter(({ low }) => low > 0)
  const rateLow = Math.min(central.rate, ...moved.map(({ low }) => low))
  const rateHigh = Math.max(central.rate, ...moved.map(({ high }) => high))
  const usual = evaluate(toUsual(inputs), createPicker(model, null), 'fair').rate
  const floors = listFloors(inputs)
  const byClass = byClassOf(central)
  const reasons = toReasons(moved, inputs)
  return {
    band: atLeast(bandOf(central.rate), floors),
    bandLow: atLeast(bandOf(rateLow), floors),
    bandHigh: atLeast(bandOf(rateHigh), floors),
    rate: central.rate,
    rateLow,
    rateHigh,
    usual,
    times: central.rate / usual,
    timesLow: rateLow / usual,
    timesHigh: rateHigh / usual,
    worst: most(consequenceClasses, of => consequenceWeights[of] * byClass[of]),
    byClass,
    deciding: most(ways, way => toRate(central.byWay[way])),
    reasons: reasons.slice(0, 3).map(({ name, words, times }) => ({ name, words, times })),
    lookNext: reasons.find(({ look }) => look !== undefined)?.look ?? null,
    floors,
    load: central.load && { medianKn: central.load.median, zeta: central.load.zeta },
    strength: central.strength.map(({ weight, median, zeta }) => ({ weight, medianKn: median, zeta })),
  }
}
