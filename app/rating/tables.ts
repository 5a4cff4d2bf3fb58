import type { Lognormal, Mixture } from './lognormal'
import { toNormalCdf } from './normal'

/** Even steps of ln x between the loads of the grid. */
export const gridStep = 0.05
const from = Math.log(0.01)
const length = 221

/** Loads at which strengths are asked: 0.01 to 600 kN, even in the logarithm. */
export const loadGrid: Float64Array = Float64Array.from({ length }, (_, i) => Math.exp(from + gridStep * i))

/** A lognormal over the grid: P(X ≤ x) and P(X > x), each with its own digits. */
interface Tails {
  below: Float64Array
  above: Float64Array
}

function toTails({ median, zeta }: Lognormal): Tails {
  const tails = { below: new Float64Array(length), above: new Float64Array(length) }
  const middle = Math.log(median)
  for (let i = 0; i < length; i++) {
    const z = (from + gridStep * i - middle) / zeta
    const tail = toNormalCdf(-Math.abs(z))
    tails.below[i] = z < 0 ? tail : 1 - tail
    tails.above[i] = z < 0 ? 1 - tail : tail
  }
  return tails
}

function toDensity({ median, zeta }: Lognormal): Float64Array {
  const density = new Float64Array(length)
  const middle = Math.log(median)
  for (let i = 0; i < length; i++) {
    const z = (from + gridStep * i - middle) / zeta
    density[i] = Math.exp((-z * z) / 2) / (zeta * Math.sqrt(2 * Math.PI))
  }
  return density
}

const mostKept = 4000

/** Keeps what was computed for a lognormal: the same few thousand serve all ratings, as populations and loads recur. */
function keep<T>(compute: (of: Lognormal) => T): (of: Lognormal) => T {
  const kept = new Map<string, T>()
  return of => {
    const key = `${of.median},${of.zeta}`
    const known = kept.get(key)
    if (known !== undefined) return known
    if (kept.size >= mostKept) kept.clear()
    const value = compute(of)
    kept.set(key, value)
    return value
  }
}

/** P(X ≤ x) and P(X > x) over the grid. */
export const tailsOf = keep(toTails)

/** The density of ln x over the grid. */
export const densityOf = keep(toDensity)

/** P(strength ≤ factor × x) of a mixture over the grid; populations add up. */
export function toMixtureTable(mixture: Mixture, factor = 1): Float64Array {
  const sum = new Float64Array(length)
  for (const { weight, median, zeta } of mixture) {
    if (weight <= 0) continue
    const { below } = tailsOf({ median: median / factor, zeta })
    for (let i = 0; i < length; i++) sum[i]! += weight * below[i]!
  }
  return sum
}
