import type { Picker } from './picker'
import { toEffectiveFactor, toImpactForce, toRopeModulus } from './rope'

/** One way a fall may go, besides where it starts: climber, slack, rope, body and belay. */
export interface Setting {
  massKg: number
  slackM: number
  /** of the rope, N */
  modulus: number
  /** tension ratio over the connector */
  r: number
  /** how much a giving body and belayer leave of the force on a rigid mass */
  bodyFactor: number
  /** the load on the point at which the belay device slips, kN */
  cap: number
  weight: number
}

/**
 * Signs for five factors at two levels each: half of all combinations, the fifth being the product of the others, which
 * keeps means, variances and every pair of factors (a half-fraction design of resolution V).
 */
const signs = Array.from({ length: 16 }, (_, i) => {
  const [a, b, c, d] = [1, 2, 4, 8].map(bit => ((i & bit) === 0 ? -1 : 1)) as [number, number, number, number]
  return [a, b, c, d, a * b * c * d] as const
})

type Four = [number, number, number, number]

/**
 * Standard deviations at which slack is asked, finely, since it decides how far a fall goes; two at most, since nobody
 * belays with more rope out than that.
 */
const slackSteps = Array.from({ length: 11 }, (_, i) => (i - 5) * 0.4)
const slackTotal = slackSteps.reduce((sum, z) => sum + Math.exp((-z * z) / 2), 0)

/** All settings with the picker's numbers, weights adding up to 1. */
export function listSettings(picker: Picker): Setting[] {
  const r = picker.pick('r')
  const [mass, slack, body, brake] = ['mass', 'slack', 'body', 'brake'].map(name => picker.pick(name)) as Four
  const force = picker.pick('rope.force') * 1000
  const [soft, firm] = [picker.pick('brake.soft'), picker.pick('brake.firm')]
  const spread = (name: string) => picker.pick(`${name}.zeta`)
  const zetas = { mass: spread('mass'), rope: spread('rope'), body: spread('body'), brake: spread('brake') }
  const people = signs.map(([ofMass, ofRope, ofBody, ofBrake, device]) => ({
    massKg: mass * Math.exp(ofMass * zetas.mass),
    modulus: toRopeModulus(force * Math.exp(ofRope * zetas.rope)),
    bodyFactor: body * Math.exp(ofBody * zetas.body),
    cap: (device < 0 ? soft : firm) * brake * Math.exp(ofBrake * zetas.brake) * (1 + 1 / r),
  }))
  const slackZeta = spread('slack')
  return slackSteps.flatMap(z => {
    const slackM = slack * Math.exp(z * slackZeta)
    const weight = Math.exp((-z * z) / 2) / slackTotal / people.length
    return people.map(({ massKg, modulus, bodyFactor, cap }) => ({
      massKg,
      modulus,
      r,
      bodyFactor,
      cap,
      slackM,
      weight,
    }))
  })
}

/**
 * The load in kN of a fall from tie-in height `y` onto a point at `held` metres:
 * min(body factor × (1 + r) T, T_s (1 + 1/r)), a giving body and a belay device that slips. Derived from the impact force.
 */
export function toFallLoad(held: number, y: number, setting: Setting): number {
  const { massKg, slackM, modulus, r, bodyFactor, cap } = setting
  const climberSide = Math.abs(y - held)
  const height = 2 * Math.max(0, y - held) + slackM
  const factor = toEffectiveFactor({ height, climberSide, belayerSide: held, slack: slackM, r })
  const tension = toImpactForce({ massKg, factor, modulus }) / 1000
  return Math.min(bodyFactor * (1 + r) * tension, cap)
}

/** Slack and stretch in metres of that fall: the rope by what it really carries, less on the belayer's side. */
export function toGive(held: number, y: number, load: number, { slackM, modulus, r }: Setting): number {
  const carried = (load / (1 + r)) * 1000
  return slackM + (carried * (Math.abs(y - held) + r * held + slackM)) / modulus
}
