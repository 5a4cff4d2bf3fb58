import { describe, expect, it } from 'vitest'
import { toChainStrength } from '~/rating/chain'
import { corrosionExponents, toUniformLoss } from '~/rating/corrosion'
import { anchorMinimum, connectorMinimum } from '~/rating/minimum-strength'
import { modelRows } from '~/rating/model'
import { toEffectiveFactor, toImpactForce, toRopeModulus } from '~/rating/rope'
import { toReducedCircleLoss, toSegmentLoss } from '~/rating/wear'

const force = (factor: number, impact = 9000, massKg = 80) =>
  toImpactForce({ massKg, factor, modulus: toRopeModulus(impact) })

describe('Impact force of a fall', () => {
  // R. Goldstone, The Standard Equation for Impact Force, after A. Wexler 1950; rope of EN 892 (80 kg, factor 1.77)
  it.each([
    [0.3, 4241.7],
    [0.5, 5201.4],
    [1.0, 6981.4],
    [1.77, 9000],
    [2.0, 9512.9],
  ])('at fall factor %d on a 9 kN rope is %d N', (factor, newtons) => {
    expect(Math.abs(force(factor) - newtons)).toBeLessThan(0.06)
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
  // ISO 9224:2012, table 3: steel (B1)
  it.each([
    [2, 1.437],
    [5, 2.32],
    [10, 3.334],
    [20, 4.791],
  ])('steel has lost so many first years after %d years', (years, times) => {
    expect(toUniformLoss(1, years, corrosionExponents.steel)).toBeCloseTo(times, 3)
  })

  // ISO 9224:2012, annex A, at the upper C3 rate of 50 µm: 302.2 µm after 30 years, on the tangent from 20
  it('goes on along the tangent after twenty years', () => {
    expect(toUniformLoss(50, 20, corrosionExponents.steel)).toBeCloseTo(239.6, 1)
    expect(toUniformLoss(50, 30, corrosionExponents.steel)).toBeCloseTo(302.2, 1)
  })

  // ISO 9223:2012 upper zinc rates, ISO 9224: 8 µm last 5.18 years in C3 and 0.94 in C5
  it('takes 8 µm of zinc in the published time', () => {
    expect(toUniformLoss(2.1, 5.18, corrosionExponents.zinc)).toBeCloseTo(8, 1)
    expect(toUniformLoss(8.4, 0.94, corrosionExponents.zinc)).toBeCloseTo(8, 1)
  })

  // EN 818-3, grade 4: 30.8, 40.2 and 106 kN
  it('gives grade 4 chain its published breaking force', () => {
    for (const [d, kn] of [
      [7, 30.8],
      [8, 40.2],
      [13, 106],
    ] as const)
      expect(Math.abs(toChainStrength(d, 400) - kn)).toBeLessThan(0.3)
  })
})

describe('Sound parts of the rating model', () => {
  const sound = (name: string) => modelRows.find(row => row.name === `strength.${name}.sound`)!.central

  // EN 959:2018, 4.3.2: 25 kN radial; EN 12275:2013, table: class Q 25 kN, class B 20 kN on the major axis
  it('stand above the minima of their standards', () => {
    expect(sound('expansion')).toBeGreaterThan(anchorMinimum.radial)
    expect(sound('bonded')).toBeGreaterThan(anchorMinimum.radial)
    expect(sound('ring')).toBeGreaterThan(anchorMinimum.linkedBelayPart)
    expect(sound('quick_link')).toBeGreaterThan(connectorMinimum.Q.major)
    expect(sound('steel_connector')).toBeGreaterThan(connectorMinimum.B.major)
    expect(sound('aluminium_connector')).toBeGreaterThan(connectorMinimum.B.major)
  })

  // EN 12275:2013: gate open at least 7 kN, minor axis at least 7 kN for class B
  it('hold at least the standard with the gate open or cross-loaded', () => {
    const cap = (name: string) => modelRows.find(row => row.name === `cap.${name}`)!.central
    expect(cap('gate_open')).toBeGreaterThanOrEqual(connectorMinimum.B.open)
    expect(cap('cross_loaded')).toBeGreaterThanOrEqual(connectorMinimum.B.minor)
  })
})
