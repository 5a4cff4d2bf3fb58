import type { Lognormal } from './lognormal'
import { toNormalCdf } from './normal'

/** A stream of events in a year: how many, and the load of each. */
export interface Stream {
  rate: number
  load: Lognormal
}

const step = 0.05
const from = Math.log(0.01)
/** Loads at which strengths are asked: 0.01 to 600 kN, even in the logarithm. */
export const loadGrid: Float64Array = Float64Array.from({ length: 221 }, (_, i) => Math.exp(from + step * i))

/** A chance of failure under load, asked once for every load of the grid. */
export function onGrid(failing: (x: number) => number): Float64Array {
  return Float64Array.from(loadGrid, failing)
}

/**
 * The chance of at least one failure in a year when a part of fixed strength meets loads again and again: with G(x) =
 * exp(−Σ νᵢ(1 − Fᵢ(x))) the distribution of the year's largest load, ∫ g(x) F(x) dx. Drawing the strength anew at each
 * event instead would be up to a hundred times too high. Extreme-value theory of a Poisson stream.
 */
export function failInYear(streams: readonly Stream[], failing: Float64Array): number {
  let sum = 0
  for (let i = 0; i < failing.length; i++) {
    const u = from + step * i
    let exceed = 0
    let density = 0
    for (const { rate, load } of streams) {
      const z = (u - Math.log(load.median)) / load.zeta
      if (z < -9 && rate > 0) {
        exceed += rate
        continue
      }
      exceed += rate * toNormalCdf(-z)
      density += (rate * Math.exp((-z * z) / 2)) / load.zeta
    }
    sum += density * Math.exp(-exceed) * failing[i]!
  }
  return (sum * step) / Math.sqrt(2 * Math.PI)
}
