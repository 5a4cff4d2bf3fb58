import { type Band, bandOf, bands } from '~/rating/band'
import type { Rating } from '~/rating/rate'

/** A rating over all the climbs that pass a fixed point: rates added, bands by the sum, reasons of the worst climb. */
export interface Judgement extends Rating {
  perClimb: { climbCode: string; band: Band; rate: number }[]
}

const moreUrgent = (a: Band, b: Band): Band => (bands.indexOf(a) <= bands.indexOf(b) ? a : b)

const sum = (numbers: number[]) => numbers.reduce((total, number) => total + number, 0)

/** Adds what one fixed point means on each of its climbs. At least one rating; floors of any climb hold for the sum. */
export function addJudgements(each: { climbCode: string; rating: Rating }[]): Judgement {
  const worst = each.reduce((most, next) => (next.rating.rate > most.rating.rate ? next : most)).rating
  const all = each.map(one => one.rating)
  const rate = sum(all.map(one => one.rate))
  const rateLow = sum(all.map(one => one.rateLow))
  const rateHigh = sum(all.map(one => one.rateHigh))
  const usual = sum(all.map(one => one.usual))
  return {
    ...worst,
    rate,
    rateLow,
    rateHigh,
    usual,
    times: rate / usual,
    timesLow: rateLow / usual,
    timesHigh: rateHigh / usual,
    band: all.map(one => one.band).reduce(moreUrgent, bandOf(rate)),
    bandLow: all.map(one => one.bandLow).reduce(moreUrgent, bandOf(rateLow)),
    bandHigh: all.map(one => one.bandHigh).reduce(moreUrgent, bandOf(rateHigh)),
    floors: [...new Set(all.flatMap(one => one.floors))],
    perClimb: each.map(({ climbCode, rating }) => ({ climbCode, band: rating.band, rate: rating.rate })),
  }
}

/** The list's order as one number, higher first: central band, then rate. */
export function toUrgencySort(band: Band, rate: number): number {
  const decades = Math.log10(Math.max(rate, 1e-30)) + 30
  return (bands.length - bands.indexOf(band)) * 100 + decades
}
