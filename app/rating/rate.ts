import { type Band, bandOf, moreUrgent } from './band'
import { type ConsequenceClass, consequenceClasses, consequenceWeights } from './consequence'
import { toDrawnLoad, toDrawnStrength } from './drawing'
import { type Evaluation, evaluate, toBreakRate, toByClass, toRate } from './evaluate'
import { listFloors } from './floors'
import type { PartInput, RatingInputs } from './inputs'
import type { RatingModel } from './model'
import { createPicker, type Picker } from './picker'
import { moveEach, toLookNext, toReasons } from './reasons'
import { toUsual, withSomePart } from './usual'
import { inRock } from './weights'

/** Changes whenever the same inputs and model may give another result. */
export const engineVersion = '1.1'

/** The ways a point lets a climber fall. */
const ways = ['pulls_out', 'breaks', 'cuts_rope', 'releases_rope'] as const
type Way = (typeof ways)[number]

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
  /** R of a usual one of its kind in the same place, in ordinary service; `times` is danger against that */
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

/** The largest by a measure. */
function most<T>(items: readonly T[], measure: (item: T) => number): T {
  return items.reduce((best, next) => (measure(next) > measure(best) ? next : best))
}

/** The way that carries most of R; of load against strength, whether what sits in the rock or what hangs on it. */
function toDeciding(inputs: RatingInputs, { breaks, cuts, releases }: Evaluation, picker: Picker): Way {
  const isInRock = (part: PartInput) => inRock.includes(part.kind)
  const pullsOut = toBreakRate(inputs, picker, isInRock)
  const hanging = toBreakRate(inputs, picker, part => !isInRock(part))
  const share = pullsOut + hanging === 0 ? 0 : pullsOut / (pullsOut + hanging)
  const rates: Record<Way, number> = {
    pulls_out: toRate(breaks) * share,
    breaks: toRate(breaks) * (1 - share),
    cuts_rope: toRate(cuts),
    releases_rope: toRate(releases),
  }
  return most(ways, way => rates[way])
}

const atLeast = (band: Band, floors: string[]) => (floors.length > 0 ? moreUrgent(band, 'turn') : band)

/** Danger against a usual one; 1 where neither can happen. */
const timesOf = (rate: number, usual: number) => (usual > 0 ? rate / usual : rate > 0 ? 1e9 : 1)

/**
 * The urgency of a fixed point: R with every number central; low and high as the lowest and highest R with one number
 * at an end of its range; bands, floors, reasons and the next best look. Never throws for scant inputs.
 */
export function rate(given: RatingInputs, model: RatingModel): Rating {
  const inputs = withSomePart(given)
  const picker = createPicker(model)
  const central = evaluate(inputs, picker)
  const moved = moveEach(inputs, picker)
  const rateLow = Math.min(central.rate, ...moved.map(({ low }) => low))
  const rateHigh = Math.max(central.rate, ...moved.map(({ high }) => high))
  const usual = evaluate(toUsual(inputs), createPicker(model)).rate
  const floors = listFloors(inputs)
  const byClass = toByClass(central)
  const reasons = toReasons(moved, inputs)
  const load = toDrawnLoad(inputs, picker)
  return {
    band: atLeast(bandOf(central.rate), floors),
    bandLow: atLeast(bandOf(rateLow), floors),
    bandHigh: atLeast(bandOf(rateHigh), floors),
    rate: central.rate,
    rateLow,
    rateHigh,
    usual,
    times: timesOf(central.rate, usual),
    timesLow: timesOf(rateLow, usual),
    timesHigh: timesOf(rateHigh, usual),
    worst: most(consequenceClasses, of => consequenceWeights[of] * byClass[of]),
    byClass,
    deciding: toDeciding(inputs, central, picker),
    reasons: reasons.slice(0, 3).map(({ name, words, times }) => ({ name, words, times })),
    lookNext: toLookNext(reasons),
    floors,
    load: load && { medianKn: load.median, zeta: load.zeta },
    strength: toDrawnStrength(inputs, picker).map(({ weight, median, zeta }) => ({
      weight,
      medianKn: median,
      zeta,
    })),
  }
}
