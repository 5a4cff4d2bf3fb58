import type { Lognormal } from './lognormal'
import { densityOf, gridStep, loadGrid, tailsOf } from './tables'

/** A stream of events in a year: how many, and the load of each (kN). */
export interface Stream {
  rate: number
  load: Lognormal
}

/**
 * The distribution of the year's largest load over the grid, as weights to multiply chances of failure by: with
 * G(x) = exp(−Σ νᵢ(1 − Fᵢ(x))), weight = Σ νᵢ fᵢ(x) G(x) dx. Extreme-value theory of a Poisson stream.
 */
export function toYearlyLargest(streams: readonly Stream[]): Float64Array {
  const weights = new Float64Array(loadGrid.length)
  const tables = streams.map(({ rate, load }) => ({
    rate,
    above: tailsOf(load).above,
    dense: densityOf(load),
  }))
  for (let i = 0; i < weights.length; i++) {
    let exceed = 0
    let density = 0
    for (const { rate, above, dense } of tables) {
      exceed += rate * above[i]!
      density += rate * dense[i]!
    }
    weights[i] = density === 0 ? 0 : density * Math.exp(-exceed) * gridStep
  }
  return weights
}

/**
 * The chance of at least one failure in a year, ∫ g(x) F(x) dx. A part's strength is fixed while loads repeat: rate × P
 * would draw the strength anew at each event and be up to a hundred times too high.
 */
export function failInYear(largest: Float64Array, failing: Float64Array): number {
  let sum = 0
  for (let i = 0; i < largest.length; i++) sum += largest[i]! * failing[i]!
  return sum
}
