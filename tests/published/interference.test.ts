import { describe, expect, it } from 'vitest'
import {
  failExponential,
  failLognormal,
  failNormal,
  failUnderExponential,
  failWeibull,
  inSeries,
  interfere,
} from '~/rating/interference'
import { toLognormalCdf } from '~/rating/lognormal'
import { failStation } from '~/rating/station'
import { toMixtureTable } from '~/rating/tables'
import { failInYear, toYearlyLargest } from '~/rating/yearly'

const relative = (got: number, want: number) => Math.abs(got / want - 1)

describe('Interference of load and strength', () => {
  // Kapur and Lamberson, Reliability in Engineering Design, 1977: R = 0.97725 (β = 2)
  it('gives the textbook reliability of 40 000 ± 4000 against 30 000 ± 3000', () => {
    expect(1 - failNormal({ mean: 30_000, sd: 3000 }, { mean: 40_000, sd: 4000 })).toBeCloseTo(0.97725, 5)
  })

  // the same book's design: tensile 35 000 ± 4000 less residual 10 000 ± 1500, strength 50 000 ± 6840 psi, R = 0.999
  it('gives the textbook reliability of a strength chosen for 0.999', () => {
    const stress = { mean: 25_000, sd: Math.hypot(4000, 1500) }
    expect(1 - failNormal(stress, { mean: 50_000, sd: 6840 })).toBeCloseTo(0.999, 4)
  })

  // P. O'Connor, Practical Reliability Engineering: β = 2.65165, R = 0.995995
  it('gives the textbook reliability of 5000 ± 400 against 3500 ± 400', () => {
    expect(1 - failNormal({ mean: 3500, sd: 400 }, { mean: 5000, sd: 400 })).toBeCloseTo(0.995995, 6)
  })

  // Accendo Reliability, after Lee 1989: P = 0.158655
  it('gives the published failure probability of 75 ± 20 against 50 ± 15', () => {
    expect(failNormal({ mean: 50, sd: 15 }, { mean: 75, sd: 20 })).toBeCloseTo(0.158655, 6)
  })

  // Kapur and Lamberson: normal strength 100 ± 10 under an exponential load of mean 50, R = 0.8619307627
  it('gives the textbook reliability under an exponential load', () => {
    expect(1 - failUnderExponential(50, { mean: 100, sd: 10 })).toBeCloseTo(0.8619307627, 9)
  })

  // closed forms of the same textbooks
  it('gives the closed forms of exponentials and Weibulls', () => {
    expect(1 - failExponential(50, 200)).toBeCloseTo(0.8, 12)
    expect(1 - failWeibull(40, 100, 2)).toBeCloseTo(0.862069, 6)
    expect(1 - failWeibull(40, 100, 3)).toBeCloseTo(0.93985, 6)
  })

  // closed form: β = 3.09985, P = 9.68098e-4
  it('gives the closed form of two lognormals, and the quadrature agrees to nine digits', () => {
    const load = { median: 50, zeta: 0.2 }
    const strength = { median: 100, zeta: 0.1 }
    expect(relative(failLognormal(load, strength), 9.68098e-4)).toBeLessThan(1e-5)
    const by = interfere(load, [strength], x => toLognormalCdf(strength, x))
    expect(relative(by, failLognormal(load, strength))).toBeLessThan(1e-9)
  })

  // Simpson's rule with 400 000 points over the same integral: 0.0337148681 and 0.0030058436
  it('gives parts in series under one load, which are not independent', () => {
    const load = { median: 4.3, zeta: 0.27 }
    const three = [
      { median: 24, zeta: 0.06 },
      { median: 14, zeta: 0.2 },
      { median: 9, zeta: 0.3 },
    ]
    const different = interfere(load, three, x => inSeries(three.map(part => toLognormalCdf(part, x))))
    expect(relative(different, 0.0337148681)).toBeLessThan(1e-8)
    const equal = { median: 12, zeta: 0.2 }
    const alike = interfere(load, [equal], x => inSeries([1, 2, 3].map(() => toLognormalCdf(equal, x))))
    expect(relative(alike, 0.0030058436)).toBeLessThan(1e-7)
    expect(3 * failLognormal(load, equal)).toBeGreaterThan(alike * 1.02)
  })

  // the same integral by Simpson's rule: P = 5.02551708e-4, apart 3.47544e-7
  it('gives a two-point station with shared load, shock and common cause', () => {
    const load = { median: 1.5, zeta: 0.2 }
    const [a, b] = [
      { median: 6, zeta: 0.5 },
      { median: 8, zeta: 0.4 },
    ]
    const at = (side: typeof a, x: number) => ({
      half: toLognormalCdf(side, x / 2),
      shocked: toLognormalCdf(side, 1.3 * x),
      whole: toLognormalCdf(side, x),
    })
    const reach = [a, b].flatMap(side => [0.5, 1, 1.3].map(factor => ({ ...side, factor })))
    const all = interfere(load, reach, x => failStation(at(a, x), at(b, x), 0.1))
    expect(relative(all, 5.02551708e-4)).toBeLessThan(1e-7)
    const apart = interfere(load, reach, x => failStation(at(a, x), at(b, x), 0))
    expect(relative(apart, 3.47544e-7)).toBeLessThan(1e-5)
    const common = interfere(load, reach, x => failStation(at(a, x), at(b, x), 1))
    expect(relative(common, 5.022389184e-3)).toBeLessThan(1e-7)
  })

  // extreme-value theory of a Poisson stream, computed by Simpson's rule
  it.each([
    [0.1, 1.126309e-4],
    [1, 1.1148965e-3],
    [10, 0.0102284487],
    [100, 0.0671239408],
  ])('gives the chance of failing under the largest of %d loads in a year', (rate, want) => {
    const strength = toMixtureTable([{ weight: 1, median: 12, zeta: 0.2 }])
    const got = failInYear(toYearlyLargest([{ rate, load: { median: 4.3, zeta: 0.27 } }]), strength)
    expect(relative(got, want)).toBeLessThan(1e-6)
  })
})
