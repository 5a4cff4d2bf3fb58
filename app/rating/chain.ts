/** The breaking force in kN of short-link chain of bar d mm at σ N/mm²: 2 (π/4) d² σ. EN 818. */
export function toChainStrength(d: number, sigma: number): number {
  return (2 * (Math.PI / 4) * d * d * sigma) / 1000
}
