import type { Lognormal, Mixture } from './lognormal'
import { toNormalCdf } from './normal'

/** Even steps of ln x between the loads of the grid. */
export const gridStep = 0.05
const from = Math.log(0.01)
const length = 221

/** Loads at which strengths are asked: 0.01 to 600 kN, even in the logarithm. */
export const loadGrid: Float64Array = Float64Array.from({ length }, (_, i) => Math.exp(from + gridStep * i))

/** A lognormal over the grid: P(X ≤ x), P(X > x), and the density of ln x. */
export interface Table {
  below: Float64Array
  above: Float64Array
  density: Float64Array
}

const kept = new Map<string, Table>()
const mostKept = 4000

function toTable({ median, zeta }: Lognormal): Table {
  const table = {
    below: new Float64Array(length),
    above: new Float64Array(length),
    density: new Float64Array(length),
  }
  const middle = Math.log(median)
  for (let i = 0; i < length; i++) {
    const z = (from + gridStep * i - middle) / zeta
    // whichever side is the tail keeps its digits
    const tail = toNormalCdf(-Math.abs(z))
    table.below[i] = z < 0 ? tail : 1 - tail
    table.above[i] = z < 0 ? 1 - tail : tail
    table.density[i] = Math.exp((-z * z) / 2) / (zeta * Math.sqrt(2 * Math.PI))
  }
  return table
}

/** The table of a lognormal; the same few thousand serve all ratings, since populations and loads recur. */
export function tableOf(of: Lognormal): Table {
  const key = `${of.median},${of.zeta}`
  let table = kept.get(key)
  if (table === undefined) {
    if (kept.size >= mostKept) kept.clear()
    table = toTable(of)
    kept.set(key, table)
  }
  return table
}

/** P(strength ≤ factor × x) of a mixture over the grid; populations add up. */
export function toMixtureTable(mixture: Mixture, factor = 1): Float64Array {
  const sum = new Float64Array(length)
  for (const { weight, median, zeta } of mixture) {
    if (weight <= 0) continue
    const { below } = tableOf({ median: median / factor, zeta })
    for (let i = 0; i < length; i++) sum[i]! += weight * below[i]!
  }
  return sum
}
