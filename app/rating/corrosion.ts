/** Metals of ISO 9224 with the exponent b of its table 3 (B1). */
export const corrosionExponents = { steel: 0.523, zinc: 0.813, copper: 0.667, aluminium: 0.728 } as const

/**
 * Uniform loss in µm after t years from the first year's rate r (µm): r t^b up to 20 years, then on the tangent there.
 * ISO 9224:2012. It says nothing of pitting, nor of stainless steel.
 */
export function toUniformLoss(rate: number, years: number, b: number): number {
  if (years <= 20) return rate * years ** b
  return rate * (20 ** b + b * 20 ** (b - 1) * (years - 20))
}

/** The breaking force in kN of short-link chain of bar d mm at σ N/mm²: 2 (π/4) d² σ. EN 818. */
export function toChainStrength(d: number, sigma: number): number {
  return (2 * (Math.PI / 4) * d * d * sigma) / 1000
}
