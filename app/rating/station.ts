/** The chance that one side has failed at half the load, at the load with the shock, and at the load. */
export interface SideFailing {
  half: number
  shocked: number
  whole: number
}

/**
 * The chance that a two-point station lets go: each side takes half; if one goes the other takes all with a shock; in
 * the common-cause share both are what the worse one is, at the full load (β-factor of functional safety).
 */
export function failStation(a: SideFailing, b: SideFailing, c: number): number {
  const apart = a.half * b.shocked + b.half * a.shocked - a.half * b.half
  return (1 - c) * apart + c * Math.max(a.whole, b.whole)
}
