import { type ConsequenceClass, consequenceClasses, toConsequence, toUncaught } from './consequence'
import type { RatedLine, RatingInputs } from './inputs'
import type { Lognormal } from './lognormal'
import type { Picker } from './picker'
import { toEffectiveFactor, toImpactForce, toRopeModulus } from './rope'

/** The falls (or hangs) on one point that would end in one class if it failed: their share, and their load. */
export interface ClassedLoad {
  consequence: ConsequenceClass
  share: number
  load: Lognormal
}

/** Three points of Gauss and Hermite for a standard normal. */
const nodes = [
  { z: -Math.sqrt(3), weight: 1 / 6 },
  { z: 0, weight: 2 / 3 },
  { z: Math.sqrt(3), weight: 1 / 6 },
] as const
const positions = 12

interface Sum {
  weight: number
  mean: number
  square: number
}

const emptySums = (): Record<ConsequenceClass, Sum> => ({
  short: { weight: 0, mean: 0, square: 0 },
  long: { weight: 0, mean: 0, square: 0 },
  low: { weight: 0, mean: 0, square: 0 },
  ground: { weight: 0, mean: 0, square: 0 },
})

/** Adds the moments of ln load of one way to fall to its class. */
function note(sum: Sum, weight: number, load: number): void {
  const log = Math.log(load)
  sum.weight += weight
  sum.mean += weight * log
  sum.square += weight * log * log
}

/** The lognormal of each class with the mean and variance of ln load; `extra` is variance not drawn. */
function toClasses(sums: Record<ConsequenceClass, Sum>, extra: number): ClassedLoad[] {
  return consequenceClasses.flatMap(consequence => {
    const { weight, mean, square } = sums[consequence]
    if (weight <= 1e-12) return []
    const average = mean / weight
    const variance = Math.max(1e-4, square / weight - average * average) + extra
    return [{ consequence, share: weight, load: { median: Math.exp(average), zeta: Math.sqrt(variance) } }]
  })
}

/** Which points below may catch after the one at `index` has failed, with the chance that each does. */
export function listCatches(
  line: RatedLine,
  index: number,
  picker: Picker,
): { at: number | null; chance: number }[] {
  const catches: { at: number | null; chance: number }[] = []
  let left = 1
  for (let i = index - 1; i >= 0 && left > 1e-9; i--) {
    const point = line.points[i]!
    const fails = picker.pick(`next.fails.${point.state}`)
    catches.push({ at: point.alongM, chance: left * (1 - fails) })
    left *= fails
  }
  return [...catches, { at: null, chance: left }]
}

/**
 * Falls on a bolt from the climb's geometry: the tie-in anywhere between it and the next point, rope, slack, mass, body
 * and belay as they vary; by what they would lead to if it failed. Loads in kN, shares adding up to 1.
 */
export function toFallLoads(inputs: RatingInputs, picker: Picker): ClassedLoad[] {
  const { climb, at } = inputs
  const held = climb.points[at]!.alongM
  const next = climb.points[at + 1]?.alongM ?? Math.max(climb.lengthM, held + 1)
  const catches = listCatches(climb, at, picker)
  const sums = emptySums()
  const draw = toDraw(picker)
  for (let i = 0; i < positions; i++) {
    const y = held + ((i + 0.5) / positions) * (next - held)
    for (const { load, give, weight } of draw(held, y))
      for (const { at: caughtAt, chance } of catches)
        note(sums[toConsequence(climb, { y, at: held, caughtAt, give })], (weight * chance) / positions, load)
  }
  return toClasses(sums, 0)
}

/** Loads of falls that would end in each class if the rope were cut: nothing catches. */
export function toUncaughtLoads(inputs: RatingInputs, picker: Picker): ClassedLoad[] {
  const { climb, at } = inputs
  const held = climb.points[at]!.alongM
  const next = climb.points[at + 1]?.alongM ?? Math.max(climb.lengthM, held + 1)
  const sums = emptySums()
  const draw = toDraw(picker)
  for (let i = 0; i < positions; i++) {
    const y = held + ((i + 0.5) / positions) * (next - held)
    for (const { load, weight } of draw(held, y)) note(sums[toUncaught(climb, y)], weight / positions, load)
  }
  return toClasses(sums, 0)
}

/** All ways a fall from `y` onto a point at `held` may load it (kN), with slack and stretch, weights adding up to 1. */
function toDraw(
  picker: Picker,
): (held: number, y: number) => { load: number; give: number; weight: number }[] {
  const r = picker.pick('r')
  const spread = (name: string) =>
    nodes.map(({ z, weight }) => ({ factor: Math.exp(z * picker.pick(`${name}.zeta`)), weight }))
  const [masses, slacks, bodies, brakes] = [spread('mass'), spread('slack'), spread('body'), spread('brake')]
  const modulus = toRopeModulus(picker.pick('rope.force') * 1000)
  const mass = picker.pick('mass')
  const slack = picker.pick('slack')
  const body = picker.pick('body')
  const slips = [picker.pick('brake.soft'), picker.pick('brake.firm')].map(
    kn => kn * picker.pick('brake') * (1 + 1 / r),
  )
  const spent: { massKg: number; slackM: number; bodyFactor: number; cap: number; weight: number }[] = []
  for (const m of masses)
    for (const s of slacks)
      for (const b of bodies)
        for (const t of brakes)
          for (const slip of slips)
            spent.push({
              massKg: mass * m.factor,
              slackM: slack * s.factor,
              bodyFactor: body * b.factor,
              cap: slip * t.factor,
              weight: (m.weight * s.weight * b.weight * t.weight) / 2,
            })
  return (held, y) =>
    spent.map(({ massKg, slackM, bodyFactor, cap, weight }) => {
      const climberSide = Math.abs(y - held)
      const height = 2 * Math.max(0, y - held) + slackM
      const factor = toEffectiveFactor({ height, climberSide, belayerSide: held, slack: slackM, r })
      const tension = toImpactForce({ massKg, factor, modulus }) / 1000
      const load = Math.min(bodyFactor * (1 + r) * tension, cap)
      // the rope stretches by what it really carries, on the climber's side and less on the belayer's
      const stretch = ((load / (1 + r)) * 1000 * (climberSide + r * held + slackM)) / modulus
      return { load, give: slackM + stretch, weight }
    })
}

/** What a failure would lead to while somebody hangs on the point, the tie-in just below it; chances adding up to 1. */
export function toHangConsequences(
  inputs: RatingInputs,
  picker: Picker,
): { consequence: ConsequenceClass; share: number }[] {
  const { climb, at } = inputs
  const held = climb.points[at]!.alongM
  const y = held - 0.3
  return listCatches(climb, at, picker).map(({ at: caughtAt, chance }) => ({
    consequence: toConsequence(climb, { y, at: held, caughtAt, give: picker.pick('slack') + 0.3 }),
    share: chance,
  }))
}
