import type { ConsequenceClass } from './consequence'
import { findEdge, toCutPerFall, toCutPerLowering } from './edges'
import { countEvents, isStation, toStationClass } from './events'
import { toUncaughtHang, toUncaughtLoads } from './falls'
import type { RatingInputs } from './inputs'
import type { Picker } from './picker'

/** The chance a year that the rope is cut over the sharpest edge at the point, by what follows: nothing catches. */
export function toCuts(inputs: RatingInputs, picker: Picker): Record<ConsequenceClass, number> {
  const expected = { short: 0, long: 0, low: 0, ground: 0 }
  const edge = findEdge(inputs.parts, isStation(inputs), picker)
  if (edge === null) return expected
  const { hangs, falls } = countEvents(inputs, picker)
  if (isStation(inputs)) expected[toStationClass(inputs)] = hangs * toCutPerLowering(edge, picker)
  else {
    const hang = { median: picker.pick('load.lowering'), zeta: picker.pick('load.lowering.zeta') }
    expected[toUncaughtHang(inputs, picker)] += hangs * toCutPerFall(edge, hang, picker)
    for (const { consequence, share, load } of picker.step('uncaught', () => toUncaughtLoads(inputs, picker)))
      expected[consequence] += falls * share * toCutPerFall(edge, load, picker)
  }
  return toChances(expected)
}

/** At least one in a year, from the number expected: 1 − exp(−νp). */
export function toChances(expected: Record<ConsequenceClass, number>): Record<ConsequenceClass, number> {
  const chance = (count: number) => -Math.expm1(-count)
  const { short, long, low, ground } = expected
  return { short: chance(short), long: chance(long), low: chance(low), ground: chance(ground) }
}
