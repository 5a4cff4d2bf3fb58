const upper = [
  0.035262496599891, 0.700383064443688, 6.37396220353165, 33.912866078383, 112.079291497871, 221.213596169931,
  220.206867912376,
]
const lower = [
  0.0883883476483184, 1.75566716318264, 16.064177579207, 86.7807322029461, 296.564248779674, 637.333633378831,
  793.826512519948, 440.413735824752,
]
const rootTwoPi = Math.sqrt(2 * Math.PI)

const horner = (coefficients: readonly number[], x: number) => coefficients.reduce((sum, c) => sum * x + c, 0)

/** x + 1/(x + 2/(x + 3/(x + …))): the continued fraction of the far tail, deep enough from x = 5 on. Laplace. */
function toMillsDivisor(x: number): number {
  let divisor = x
  for (let depth = 40; depth >= 1; depth--) divisor = x + depth / divisor
  return divisor
}

/**
 * The standard normal distribution function Φ(z): Hart's double-precision rational approximation with a continued
 * fraction in the far tail, so that small probabilities keep their digits.
 * Source: G. West, Better approximations to cumulative normal functions, Wilmott 2005.
 */
export function toNormalCdf(z: number): number {
  const x = Math.abs(z)
  if (x > 37) return z > 0 ? 1 : 0
  const bell = Math.exp((-x * x) / 2)
  const tail = x < 5 ? (bell * horner(upper, x)) / horner(lower, x) : bell / toMillsDivisor(x) / rootTwoPi
  return z > 0 ? 1 - tail : tail
}
