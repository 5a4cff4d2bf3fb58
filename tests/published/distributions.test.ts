import { createRequire } from 'node:module'
import { describe, expect, it } from 'vitest'
import { toLognormalCdf } from '~/rating/lognormal'
import { toNormalCdf } from '~/rating/normal'

const require = createRequire(import.meta.url)
// reference libraries: @stdlib/stats-base-dists-normal and -lognormal (Apache-2.0), lib-r-math.js (R's nmath, MIT)
const stdlibNormal: (x: number, mean: number, sd: number) => number =
  require('@stdlib/stats-base-dists-normal').cdf
const stdlibLognormal: (x: number, mu: number, sigma: number) => number =
  require('@stdlib/stats-base-dists-lognormal').cdf

const grid = Array.from({ length: 161 }, (_, i) => -8 + i * 0.1)
const relative = (got: number, want: number) => Math.abs(got / want - 1)

describe('The normal distribution', () => {
  it('agrees with @stdlib to ten digits from −8 to 8, tail and all', () => {
    const worst = Math.max(...grid.map(z => relative(toNormalCdf(z), stdlibNormal(z, 0, 1))))
    expect(worst).toBeLessThan(1e-10)
  })

  it('agrees with R’s pnorm to ten digits', async () => {
    const { pnorm } = await import('lib-r-math.js')
    const worst = Math.max(...grid.map(z => relative(toNormalCdf(z), Number(pnorm(z)))))
    expect(worst).toBeLessThan(1e-10)
  })
})

describe('The lognormal distribution', () => {
  it('agrees with @stdlib to ten digits over loads and strengths of the trade', () => {
    for (const [median, zeta] of [
      [4.3, 0.27],
      [12, 0.2],
      [38, 0.12],
      [3.5, 0.5],
    ] as const)
      for (let x = 0.5; x < 60; x += 0.5) {
        const want = stdlibLognormal(x, Math.log(median), zeta)
        if (want > 1e-14) expect(relative(toLognormalCdf({ median, zeta }, x), want)).toBeLessThan(1e-10)
      }
  })
})
