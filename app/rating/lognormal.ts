import { toNormalCdf } from './normal'

/** A lognormal by its median (kN for loads and strengths) and the standard deviation ζ of its logarithm. */
export interface Lognormal {
  median: number
  zeta: number
}

/** Parts of a strength: populations with their weights, which add up to 1. */
export type Mixture = readonly (Lognormal & { weight: number })[]

/** P(X ≤ x). */
export function toLognormalCdf({ median, zeta }: Lognormal, x: number): number {
  return x <= 0 ? 0 : toNormalCdf(Math.log(x / median) / zeta)
}

/** The mean of X to the third power: m³ exp(9ζ²/2). */
export function toMeanCube({ median, zeta }: Lognormal): number {
  return median ** 3 * Math.exp(4.5 * zeta * zeta)
}
