import {
  type ConsequenceClass,
  consequenceClasses,
  toConsequence,
  toTerrain,
  toUncaught,
} from './consequence'
import { listSettings, toFallLoad, toGive } from './draws'
import type { RatedLine, RatingInputs } from './inputs'
import { failMixture } from './interference'
import type { Lognormal } from './lognormal'
import type { Picker } from './picker'
import { toStateStrength } from './strength'

/** The falls on one point that would end in one class if it failed: their share, and their load (kN). */
export interface ClassedLoad {
  consequence: ConsequenceClass
  share: number
  load: Lognormal
}

/** The share of falls in which the point at `at` (null: none) is the one that catches after the rated one failed. */
interface Catch {
  at: number | null
  share: number
}

const positions = 12

/** Below this share a fall past all that has failed counts as caught by nothing. */
const mattering = 1e-12

/** Which points below catch after the one at `index` has failed, each with its own condition. Shares add up to 1. */
function listCatches(line: RatedLine, index: number, picker: Picker): Catch[] {
  // what the next point feels is like a fall straight onto a belay: harder, on less rope
  const load = { median: picker.pick('load.belay_fall'), zeta: picker.pick('load.belay_fall.zeta') }
  const catches: Catch[] = []
  let left = 1
  for (let i = index - 1; i >= 0 && left > mattering; i--) {
    const point = line.points[i]!
    const fails = failMixture(load, toStateStrength(point.kind, point.state, picker))
    catches.push({ at: point.alongM, share: left * (1 - fails) })
    left *= fails
  }
  return [...catches, { at: null, share: left }]
}

/** Where the tie-in may be when a climber falls onto a point: evenly from it up to the next, or the end of the pitch. */
function listPositions(line: RatedLine, index: number): number[] {
  const held = line.points[index]!.alongM
  const next = line.points[index + 1]?.alongM ?? Math.max(line.lengthM, held + 1)
  return Array.from({ length: positions }, (_, i) => held + ((i + 0.5) / positions) * (next - held))
}

const order: Record<ConsequenceClass, number> = { short: 0, long: 1, low: 2, ground: 3 }

/** Gathers weights and moments of ln load by class: each class keeps the lognormal of the same mean and variance. */
class Sums {
  private readonly moments = new Float64Array(3 * consequenceClasses.length)

  add(of: ConsequenceClass, weight: number, logLoad: number): void {
    const i = 3 * order[of]
    this.moments[i]! += weight
    this.moments[i + 1]! += weight * logLoad
    this.moments[i + 2]! += weight * logLoad * logLoad
  }

  addAll(other: Sums, share: number): void {
    for (let i = 0; i < this.moments.length; i++) this.moments[i]! += share * other.moments[i]!
  }

  toLoads(): ClassedLoad[] {
    return consequenceClasses.flatMap(consequence => {
      const i = 3 * order[consequence]
      const share = this.moments[i]!
      if (share <= 0) return []
      const mean = this.moments[i + 1]! / share
      // a single way to fall still spreads a little
      const variance = Math.max(1e-4, this.moments[i + 2]! / share - mean * mean)
      return [{ consequence, share, load: { median: Math.exp(mean), zeta: Math.sqrt(variance) } }]
    })
  }
}

/** Falls onto the rated point, one entry for each position and setting; weights add up to 1. */
interface Drawn {
  y: Float64Array
  logLoad: Float64Array
  give: Float64Array
  weight: Float64Array
}

function drawFalls({ climb, at }: RatingInputs, picker: Picker): Drawn {
  const held = climb.points[at]!.alongM
  const settings = listSettings(picker)
  const empty = () => new Float64Array(positions * settings.length)
  const drawn: Drawn = { y: empty(), logLoad: empty(), give: empty(), weight: empty() }
  let i = 0
  for (const y of listPositions(climb, at))
    for (const setting of settings) {
      const load = toFallLoad(held, y, setting)
      drawn.y[i] = y
      drawn.logLoad[i] = Math.log(load)
      drawn.give[i] = toGive(held, y, load, setting)
      drawn.weight[i++] = setting.weight / positions
    }
  return drawn
}

/** Moments of the falls by class, with what follows each as told. */
function classify(
  { y, logLoad, give, weight }: Drawn,
  follow: (y: number, give: number) => ConsequenceClass,
): Sums {
  const sums = new Sums()
  for (let i = 0; i < y.length; i++) sums.add(follow(y[i]!, give[i]!), weight[i]!, logLoad[i]!)
  return sums
}

const draw = (inputs: RatingInputs, picker: Picker) => picker.step('draws', () => drawFalls(inputs, picker))

/**
 * Falls on a bolt from the climb's geometry: the tie-in anywhere between it and the next point, rope, slack, mass, body
 * and belay as they vary; by what they would lead to if the bolt failed. Shares adding up to 1.
 */
export function toFallLoads(inputs: RatingInputs, picker: Picker): ClassedLoad[] {
  const terrain = toTerrain(inputs.climb, picker.pick('feet'))
  const at = inputs.climb.points[inputs.at]!.alongM
  const all = new Sums()
  for (const { at: caughtAt, share } of listCatches(inputs.climb, inputs.at, picker))
    all.addAll(
      picker.step(`falls caught at ${caughtAt}`, () =>
        classify(draw(inputs, picker), (y, give) => toConsequence(terrain, { y, at, caughtAt, give })),
      ),
      share,
    )
  return all.toLoads()
}

/** The same falls by what they would lead to if the rope were cut: nothing catches. */
export function toUncaughtLoads(inputs: RatingInputs, picker: Picker): ClassedLoad[] {
  const terrain = toTerrain(inputs.climb, picker.pick('feet'))
  return classify(draw(inputs, picker), y => toUncaught(terrain, y)).toLoads()
}

/** Metres the tie-in hangs below the point. */
const hanging = 0.3

/** What a failure leads to while somebody hangs on the point; shares adding up to 1. */
export function toHangShares(
  inputs: RatingInputs,
  picker: Picker,
): { consequence: ConsequenceClass; share: number }[] {
  const { climb, at: index } = inputs
  const terrain = toTerrain(climb, picker.pick('feet'))
  const at = climb.points[index]!.alongM
  const fall = { y: at - hanging, at, give: picker.pick('slack') + hanging }
  return listCatches(climb, index, picker).map(({ at: caughtAt, share }) => ({
    consequence: toConsequence(terrain, { ...fall, caughtAt }),
    share,
  }))
}

/** What a rope cut while somebody hangs on the point leads to. */
export function toUncaughtHang({ climb, at }: RatingInputs, picker: Picker): ConsequenceClass {
  return toUncaught(toTerrain(climb, picker.pick('feet')), climb.points[at]!.alongM - hanging)
}
