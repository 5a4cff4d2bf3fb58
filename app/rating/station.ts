/** How the two sides of a station share and lose their load. */
export interface Sharing {
  /** shock on the side that is left, a factor on the load */
  k: number
  /** share of cases in which both sides have one cause */
  c: number
}

type Cdf = (x: number) => number

/**
 * The chance that a two-point station lets go under load x: each side takes half; if one goes the other takes all with
 * a shock; in the common-cause share both are what the worse one is, at the full load (β-factor of functional safety).
 */
export function failStation(a: Cdf, b: Cdf, { k, c }: Sharing): Cdf {
  return x => {
    const aHalf = a(x / 2)
    const bHalf = b(x / 2)
    const apart = aHalf * b(k * x) + bHalf * a(k * x) - aHalf * bHalf
    return (1 - c) * apart + c * Math.max(a(x), b(x))
  }
}
