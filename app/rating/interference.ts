import type { Lognormal, Mixture } from './lognormal'
import { toNormalCdf } from './normal'

/** P(strength < load) of two normals: β = (μ_S − μ_L)/√(σ_S² + σ_L²), P = Φ(−β). Kapur and Lamberson 1977. */
export function failNormal(
  load: { mean: number; sd: number },
  strength: { mean: number; sd: number },
): number {
  return toNormalCdf((load.mean - strength.mean) / Math.hypot(load.sd, strength.sd))
}

/** P(strength < load) of two lognormals, closed form. */
export function failLognormal(load: Lognormal, strength: Lognormal): number {
  return toNormalCdf(-Math.log(strength.median / load.median) / Math.hypot(load.zeta, strength.zeta))
}

/** P(strength < load) of a mixture: the populations add up. */
export function failMixture(load: Lognormal, mixture: Mixture): number {
  return mixture.reduce((sum, part) => sum + part.weight * failLognormal(load, part), 0)
}

/** P(strength < load) of two exponentials by their means. */
export function failExponential(loadMean: number, strengthMean: number): number {
  return loadMean / (strengthMean + loadMean)
}

/** P(strength < load) of two Weibulls of one shape, by their scales. */
export function failWeibull(loadScale: number, strengthScale: number, shape: number): number {
  return 1 - 1 / (1 + (loadScale / strengthScale) ** shape)
}

/** P(strength < load) of a normal strength under an exponential load. */
export function failUnderExponential(loadMean: number, strength: { mean: number; sd: number }): number {
  const rate = 1 / loadMean
  const { mean, sd } = strength
  const survives =
    toNormalCdf(mean / sd) -
    Math.exp(-rate * mean + (rate * sd) ** 2 / 2) * toNormalCdf((mean - rate * sd * sd) / sd)
  return 1 - survives
}

/** Parts in series under one load: F ← F + q − Fq. They are not independent over loads, so this stands inside the integral. */
export function inSeries(failing: readonly number[]): number {
  return failing.reduce((all, one) => all + one - all * one, 0)
}

/**
 * ∫ f_L(x) F(x) dx for a load and any chance of failure under x that is built of lognormals: the plain trapezoid in the
 * standardised logarithm of the load, which converges faster than any power for such smooth tails. `strengths` give
 * step and reach (each with the factor its load carries, 1 when left out).
 */
export function interfere(
  load: Lognormal,
  strengths: readonly (Lognormal & { factor?: number })[],
  failing: (x: number) => number,
): number {
  const shape = strengths.map(({ median, zeta, factor = 1 }) => {
    const b = load.zeta / zeta
    const a = Math.log(median / factor / load.median) / zeta
    return { b, peak: (a * b) / (1 + b * b), spread: 1 / Math.sqrt(1 + b * b) }
  })
  const steepest = Math.max(...shape.map(({ b }) => b))
  const step = 0.8 / Math.sqrt(1 + steepest * steepest)
  const from = Math.min(0, ...shape.map(({ peak, spread }) => peak - 7 * spread)) - 2
  const past = Math.max(0, ...shape.map(({ peak }) => peak))
  let sum = 0
  for (let z = from; ; z += step) {
    const term = Math.exp((-z * z) / 2) * failing(load.median * Math.exp(load.zeta * z))
    sum += term
    if (z > past && term < 1e-13 * sum) break
    if (z > 40) break
  }
  return (sum * step) / Math.sqrt(2 * Math.PI)
}
