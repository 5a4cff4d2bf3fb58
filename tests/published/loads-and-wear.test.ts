import { describe, expect, it } from 'vitest'
import { toChainStrength } from '~/rating/chain'
import { corrosionExponents, firstYearLoss, toUniformLoss } from '~/rating/corrosion'
import { toEffectiveFactor, toImpactForce, toRopeModulus } from '~/rating/rope'
import { toReducedCircleLoss, toSegmentLoss } from '~/rating/wear'

const relative = (got: number, want: number) => Math.abs(got / want - 1)
const force = (factor: number, impact = 9000, massKg = 80) =>
  toImpactForce({ massKg, factor, modulus: toRopeModulus(impact) })

describe('Impact force of a fall', () => {
  // R. Goldstone, The Standard Equation for Impact Force, after A. Wexler 1950; rope of EN 892 (80 kg, factor 1.77)
  it.each([
    [8000, [2661.6, 3840.1, 4676.8, 5363.1, 6232.7, 7434.0, 8000.0, 8449.3]],
    [9000, [2881.0, 4241.7, 5201.4, 5987.0, 6981.4, 8353.7, 9000.0, 9512.9]],
    [12_000, [3557.4, 5457.1, 6782.6, 7864.1, 9230.5, 11_113.8, 12_000.0, 12_703.1]],
  ])('on a rope of %d N is as tabled for fall factors 0.1 to 2', (impact, newtons) => {
    const factors = [0.1, 0.3, 0.5, 0.7, 1, 1.5, 1.77, 2]
    for (const [i, factor] of factors.entries())
      expect(Math.abs(force(factor, impact) - newtons[i]!)).toBeLessThan(0.06)
  })

  it('gives back the rated force at the standard fall, whatever the rope', () => {
    for (const rated of [8000, 9000, 12_000]) expect(force(1.77, rated)).toBeCloseTo(rated, 6)
  })

  it('is twice the weight for a fall of no height', () => {
    expect(force(0)).toBeCloseTo(1569.6, 6)
  })

  // the same equation: moduli 18 516.8, 24 070.9 and 45 052.6 N
  it('has the moduli of 8, 9 and 12 kN ropes', () => {
    expect(toRopeModulus(8000)).toBeCloseTo(18_516.8, 1)
    expect(toRopeModulus(9000)).toBeCloseTo(24_070.9, 1)
    expect(toRopeModulus(12_000)).toBeCloseTo(45_052.6, 1)
  })

  // published spreadsheet form with f₀ 1.78 and g 9.8: 6.963 kN; conventions differ by less than half a percent
  it('agrees with the published spreadsheet form within half a percent', () => {
    expect(Math.abs(force(1) / 6963 - 1)).toBeLessThan(0.005)
  })

  // common practice: a sling or other stiff tether gives about three to ten times the force
  it('is about three to nine times as high on a tether ten to a hundred times as stiff', () => {
    const modulus = toRopeModulus(9000)
    const at = (stiffer: number) => toImpactForce({ massKg: 75, factor: 2, modulus: modulus * stiffer })
    expect(at(10) / at(1)).toBeCloseTo(2.979, 3)
    expect(at(100) / at(1)).toBeCloseTo(9.24, 2)
  })

  it('with friction at the top connector loads climber 5392 N and connector 8986 N', () => {
    const r = 2 / 3
    const factor = toEffectiveFactor({ height: 4, climberSide: 2, belayerSide: 8, slack: 0, r })
    expect(force(factor)).toBeCloseTo(5392, 0)
    expect(force(factor) * (1 + r)).toBeCloseTo(8986, 0)
    const frictionless = toEffectiveFactor({ height: 4, climberSide: 2, belayerSide: 8, slack: 0, r: 1 })
    expect(force(frictionless) * 2).toBeCloseTo(9501, 0)
  })
})

describe('Section lost to wear', () => {
  // geometry of the circle's segment, and of the circle that is left
  it.each([
    [0.1, 5.2, 19],
    [0.25, 19.55, 43.75],
    [1 / 3, 29.18, 55.56],
    [0.5, 50, 75],
  ])('of a groove %d of the bar deep lies between segment and reduced circle', (depth, segment, circle) => {
    expect(100 * toSegmentLoss(depth, 1)).toBeCloseTo(segment, 1)
    expect(100 * toReducedCircleLoss(depth, 1)).toBeCloseTo(circle, 1)
  })
})

describe('Corrosion and chain', () => {
  // ISO 9224:2012, table 3, column B1
  it.each([
    ['steel', [1.437, 2.32, 3.334, 4.122, 4.791]],
    ['zinc', [1.757, 3.701, 6.501, 9.04, 11.422]],
    ['copper', [1.588, 2.926, 4.645, 6.088, 7.375]],
    ['aluminium', [1.656, 3.227, 5.346, 7.181, 8.854]],
  ] as const)('multiplies the first year of %s as tabled for 2 to 20 years', (metal, times) => {
    const b = corrosionExponents[metal]
    for (const [i, years] of [2, 5, 10, 15, 20].entries())
      expect(Math.abs(toUniformLoss(1, years, b) - times[i]!)).toBeLessThan(0.001)
  })

  // ISO 9223:2012, table 2, upper limits: steel 1.3, 25, 50, 80, 200 and 700 µm, zinc 0.1, 0.7, 2.1, 4.2 and 8.4 µm
  // the same table gives steel 200, 400, 650, 1500 and 5500 g/m² from C2 to CX; steel weighs 7.86 g/cm³
  it('has the first-year losses of steel in µm that the masses give', () => {
    const masses = { C2: 200, C3: 400, C4: 650, C5: 1500, CX: 5500 } as const
    for (const [category, grams] of Object.entries(masses))
      expect(relative(firstYearLoss.steel[category as keyof typeof masses], grams / 7.86)).toBeLessThan(0.05)
  })

  // ISO 9224:2012, annex A, at the upper C3 rate of 50 µm: 302.2 µm after 30 years, on the tangent from 20
  it('goes on along the tangent after twenty years', () => {
    expect(toUniformLoss(50, 20, corrosionExponents.steel)).toBeCloseTo(239.6, 1)
    expect(toUniformLoss(50, 30, corrosionExponents.steel)).toBeCloseTo(302.2, 1)
  })

  // ISO 9223:2012 upper zinc rates, ISO 9224: 8 µm last 5.18 years in C3 and 0.94 in C5
  it('takes 8 µm of zinc in the published time', () => {
    expect(toUniformLoss(firstYearLoss.zinc.C3, 5.18, corrosionExponents.zinc)).toBeCloseTo(8, 1)
    expect(toUniformLoss(firstYearLoss.zinc.C5, 0.94, corrosionExponents.zinc)).toBeCloseTo(8, 1)
  })

  // EN 818-3, grade 4: 30.8, 40.2, 106 and 161 kN
  it('gives grade 4 chain its published breaking force', () => {
    for (const [d, kn] of [
      [7, 30.8],
      [8, 40.2],
      [13, 106],
      [16, 161],
    ] as const)
      expect(Math.abs(toChainStrength(d, 400) - kn)).toBeLessThan(0.3)
  })
})
