import { describe, expect, it } from 'vitest'
import { failLognormal, failMixture, inSeries, interfere } from '~/rating/interference'
import { toLognormalCdf } from '~/rating/lognormal'
import { toMixtureTable } from '~/rating/tables'
import { failInYear, toYearlyLargest } from '~/rating/yearly'
import { seeded } from '../unit/rating/random-hazard'

const relative = (got: number, want: number) => Math.abs(got / want - 1)
const random = seeded(11)
const between = (low: number, high: number) => low + random() * (high - low)
const load = () => ({ median: between(0.8, 6), zeta: between(0.1, 0.4) })
const strength = () => ({ median: between(2, 40), zeta: between(0.03, 0.8) })

/** Simpson's rule over ln x with steps far below any spread, as an independent answer. */
function simpson(from: number, to: number, f: (u: number) => number): number {
  const n = 40_000
  const h = (to - from) / n
  let sum = f(from) + f(to)
  for (let i = 1; i < n; i++) sum += (i % 2 === 0 ? 2 : 4) * f(from + i * h)
  return (sum * h) / 3
}

describe('The quadrature of load against strength', () => {
  // closed form of two lognormals: Φ(−ln(m_S/m_L)/√(ζ_S² + ζ_L²))
  it('agrees with the closed form to nine digits over a thousand random pairs', () => {
    let compared = 0
    for (let i = 0; i < 1000; i++) {
      const [of, against] = [load(), strength()]
      const want = failLognormal(of, against)
      if (want < 3e-13) continue
      compared++
      const got = interfere(of, [against], x => toLognormalCdf(against, x))
      expect(relative(got, want), `${JSON.stringify([of, against])}: ${want}`).toBeLessThan(1e-9)
    }
    expect(compared).toBeGreaterThan(500)
  })

  // Simpson's rule over the same integral
  it('agrees with Simpson’s rule for one to five parts in series', () => {
    for (let i = 0; i < 40; i++) {
      const of = load()
      const parts = Array.from({ length: 1 + (i % 5) }, strength)
      const failing = (x: number) => inSeries(parts.map(part => toLognormalCdf(part, x)))
      const density = (u: number) => {
        const z = (u - Math.log(of.median)) / of.zeta
        return Math.exp((-z * z) / 2) / (of.zeta * Math.sqrt(2 * Math.PI))
      }
      const want = simpson(Math.log(0.01), Math.log(3000), u => density(u) * failing(Math.exp(u)))
      if (want < 3e-13) continue
      expect(relative(interfere(of, parts, failing), want), JSON.stringify([of, parts])).toBeLessThan(1e-8)
    }
  })
})

describe('The year’s largest load on the grid', () => {
  it('comes down to rate times the closed form where events are rare', () => {
    for (let i = 0; i < 300; i++) {
      const of = load()
      const mixture = [
        { weight: 0.69, median: between(25, 45), zeta: between(0.1, 0.15) },
        { weight: 0.3, median: between(9, 16), zeta: between(0.25, 0.4) },
        { weight: 0.01, median: between(1.5, 5), zeta: between(0.4, 0.7) },
      ]
      const rate = 1e-12
      const got = failInYear(toYearlyLargest([{ rate, load: of }]), toMixtureTable(mixture)) / rate
      expect(relative(got, failMixture(of, mixture))).toBeLessThan(2e-9)
    }
  })

  // Simpson's rule over g(x) F(x), the extreme value of a Poisson stream written out
  it('agrees with Simpson’s rule for two streams and many events', () => {
    for (const rate of [0.1, 3, 40, 600]) {
      const streams = [
        { rate, load: { median: 4.3, zeta: 0.27 } },
        { rate: 10 * rate, load: { median: 1.4, zeta: 0.23 } },
      ]
      const part = { weight: 1, median: 9, zeta: 0.3 }
      const g = (u: number) => {
        let [exceed, density] = [0, 0]
        for (const { rate, load } of streams) {
          const z = (u - Math.log(load.median)) / load.zeta
          exceed += rate * (1 - toLognormalCdf(load, Math.exp(u)))
          density += (rate * Math.exp((-z * z) / 2)) / (load.zeta * Math.sqrt(2 * Math.PI))
        }
        return density * Math.exp(-exceed)
      }
      const want = simpson(Math.log(0.01), Math.log(600), u => g(u) * toLognormalCdf(part, Math.exp(u)))
      const got = failInYear(toYearlyLargest(streams), toMixtureTable([part]))
      expect(relative(got, want), `${rate} a year`).toBeLessThan(1e-8)
    }
  })
})
