import { describe, expect, it } from 'vitest'
import { toFallLoads } from '~/rating/falls'
import { failLognormal } from '~/rating/interference'
import { type Lognormal, toLognormalCdf } from '~/rating/lognormal'
import { anchorMinimum, connectorMinimum } from '~/rating/minimum-strength'
import { modelRows, toModel } from '~/rating/model'
import { createPicker } from '~/rating/picker'
import { at, part } from '../unit/rating/case'

const model = toModel(modelRows)
const picker = createPicker(model)
const of = (name: string): Lognormal => ({ median: picker.pick(name), zeta: picker.pick(`${name}.zeta`) })
const loadsOn = (bolt: number) => toFallLoads(at(bolt, [part('wedge_bolt', [])]), createPicker(model))
const shareBelow = (bolt: number, kn: number) =>
  loadsOn(bolt).reduce((sum, { share, load }) => sum + share * toLognormalCdf(load, kn), 0)

describe('Falls of the model on a steady route', () => {
  const upper = [3, 4, 5, 6, 7, 8, 9]

  // common practice: from the third bolt up most arrests stay below 6 kN, nearly all below 7, and 3 to 8 kN is expected
  it.each(upper)('stay below 6 kN in four of five cases on bolt %d, and nearly all below 7', bolt => {
    expect(shareBelow(bolt, 6)).toBeGreaterThan(0.8)
    expect(shareBelow(bolt, 7)).toBeGreaterThan(0.97)
    expect(shareBelow(bolt, 8)).toBeGreaterThan(0.5)
    // 3 kN to two figures: the last bolt of nine, just below the lower-off, stands at 2.99
    expect(shareBelow(bolt, 2.95)).toBeLessThan(0.5)
  })

  // HowNot2, Lead falls in climbing gyms: mean of the top bolt 3.54 kN, maximum 4.78 kN
  it('have about the mean that was measured in gyms, and pass its maximum seldom', () => {
    for (const bolt of [5, 6, 7]) {
      const mean = loadsOn(bolt).reduce(
        (sum, { share, load }) => sum + share * load.median * Math.exp(load.zeta ** 2 / 2),
        0,
      )
      expect(Math.abs(mean / 3.54 - 1)).toBeLessThan(0.1)
      expect(shareBelow(bolt, 4.78)).toBeGreaterThan(0.8)
    }
  })
})

describe('Other loads of the model', () => {
  // common practice: hanging, lowering and abseiling load a point with about 0.5 to 3 kN
  it.each(['load.lowering', 'load.abseil', 'load.belay_hang'])('have %s between 0.5 and 3 kN', name => {
    expect(toLognormalCdf(of(name), 0.5)).toBeLessThan(0.01)
    expect(toLognormalCdf(of(name), 3)).toBeGreaterThan(0.99)
  })

  // common practice: a fall on a sling or other stiff tether is some three times as hard as hanging
  it('have a shock on a stiff tether harder than any hang', () => {
    expect(picker.pick('load.static')).toBeGreaterThan(2.5 * picker.pick('load.lowering'))
  })
})

describe('Connectors of the model', () => {
  const open = { median: picker.pick('cap.gate_open'), zeta: 0.12 }
  const cross = { median: picker.pick('cap.cross_loaded'), zeta: 0.12 }

  // EN 12275:2013, major axis with the gate open and minor axis: at least 7 kN for class B
  it('hold with the gate open or lying across what the standard asks', () => {
    expect(open.median).toBeGreaterThanOrEqual(connectorMinimum.B.open)
    expect(cross.median).toBeGreaterThanOrEqual(connectorMinimum.B.minor)
  })

  // common practice: such connectors have broken in falls, and hold a hanging climber
  it('with the gate open or lying across break in some falls, and in fewer than one hang in a million', () => {
    const hard = loadsOn(3).at(-1)!.load
    for (const cap of [open, cross]) {
      expect(failLognormal(hard, cap)).toBeGreaterThan(1e-3)
      expect(failLognormal(of('load.lowering'), cap)).toBeLessThan(1e-6)
    }
  })

  // common practice: hooked by its nose a connector may fail under body weight
  it('hooked by the nose may fail under body weight', () => {
    expect(
      failLognormal(of('load.lowering'), { median: picker.pick('cap.nose_hooked'), zeta: 0.5 }),
    ).toBeGreaterThan(0.05)
  })
})

describe('Strengths of the model', () => {
  const falling = (name: string, kn: number) => toLognormalCdf(of(`strength.${name}.sound`), kn)

  // EN 959:2018, 4.3: 15 kN along the axis, 25 kN across it, 25 kN for linked parts of a belay
  // EN 12275:2013: class B 20 kN, class Q 25 kN
  // EN 566: 22 kN
  it('have sound parts below the minimum of their standard in few cases', () => {
    expect(falling('expansion', anchorMinimum.radial)).toBeLessThan(0.025)
    expect(falling('expansion', anchorMinimum.axial)).toBeLessThan(1e-6)
    expect(falling('bonded', anchorMinimum.radial)).toBeLessThan(0.001)
    expect(falling('ring', anchorMinimum.linkedBelayPart)).toBeLessThan(0.001)
    expect(falling('chain', anchorMinimum.linkedBelayPart)).toBeLessThan(0.001)
    expect(falling('quick_link', connectorMinimum.Q.major)).toBeLessThan(0.01)
    expect(falling('steel_connector', connectorMinimum.B.major)).toBeLessThan(0.001)
    expect(falling('aluminium_connector', connectorMinimum.B.major)).toBeLessThan(0.025)
    expect(of('strength.sling.sound').median).toBeGreaterThan(22)
  })

  const populations = [
    ...new Set(modelRows.flatMap(({ name }) => /^strength\.(\w+)\.sound$/.exec(name)?.[1] ?? [])),
  ]

  it.each(populations)(
    'have a weak %s weaker than a sound one and a bad one weaker still, at every load to 20 kN',
    name => {
      for (let x = 0.5; x <= 20; x += 0.5) {
        const [sound, weak, bad] = ['sound', 'weak', 'bad'].map(which =>
          toLognormalCdf(of(`strength.${name}.${which}`), x),
        )
        expect(weak).toBeGreaterThanOrEqual(sound!)
        expect(bad).toBeGreaterThanOrEqual(weak!)
      }
    },
  )

  // UIAA, Watch your anchor: 10 to 20 % of anchors examined in tropical marine places would fail at 1 to 4 kN
  it('have as many bad ones among stainless by a warm sea as were found', () => {
    const row = (name: string) => modelRows.find(row => row.name === `weight.${name}.bad`)!
    for (const share of [row('cracking_spots').high, row('cracking_known').central]) {
      expect(share).toBeGreaterThanOrEqual(0.1)
      expect(share).toBeLessThanOrEqual(0.2)
    }
    const bad = of('strength.cracking.bad')
    expect(toLognormalCdf(bad, 4) - toLognormalCdf(bad, 1)).toBeGreaterThan(0.6)
  })
})
