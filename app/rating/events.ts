import type { ConsequenceClass } from './consequence'
import { type ClassedLoad, toFallLoads, toHangConsequences } from './falls'
import type { RatingInputs } from './inputs'
import type { Picker } from './picker'
import type { Stream } from './yearly'

/** Events of a year that load the point, by what a failure then would lead to. */
export type YearlyEvents = Record<ConsequenceClass, Stream[]>

/** How often in a year each kind of thing happens at the point. */
export interface Counts {
  handling: number
  hangs: number
  falls: number
}

const noEvents = (): YearlyEvents => ({ short: [], long: [], low: [], ground: [] })

const loadOf = (name: string, picker: Picker) => ({
  median: picker.pick(`load.${name}`),
  zeta: picker.pick(`load.${name}.zeta`),
})

/** Ascents a year: counted, or by the class of traffic. */
export function toAscents({ climb }: RatingInputs, picker: Picker): number {
  if (climb.ascentsPerYear !== null) return climb.ascentsPerYear * picker.pick('ascents.counted')
  return picker.pick(`ascents.${climb.traffic}`)
}

/** Which row of the model counts falls and hangs on this point of the line. */
function toFallRow(inputs: RatingInputs): string {
  if (inputs.crux === 'crux') return 'crux'
  if (inputs.crux === 'much_fallen_on') return 'much'
  return ['bolt1', 'bolt2'][inputs.at] ?? 'other'
}

/** Whether people lower, abseil or belay here rather than lead past it. */
export function isStation(inputs: RatingInputs): boolean {
  return ['lower_off', 'abseil_station', 'stance', 'belay_stake'].includes(
    inputs.climb.points[inputs.at]!.kind,
  )
}

/** Handling, hangs and falls a year at the point; at a lower-off a lowering or top-rope fall counts as a hang. */
export function countEvents(inputs: RatingInputs, picker: Picker): Counts {
  const ascents = toAscents(inputs, picker)
  if (!isStation(inputs)) {
    const row = toFallRow(inputs)
    return {
      handling: ascents * picker.pick('handling.bolt'),
      hangs: ascents * picker.pick(`hangs.${row}`),
      falls: ascents * picker.pick(`falls.${row}`),
    }
  }
  const { lowering, toprope, abseil } = inputs.usedFor
  const hangs =
    (lowering ? picker.pick('lowerings') : 0) +
    (toprope ? picker.pick('toprope_falls') : 0) +
    (abseil ? picker.pick('abseils') : 0)
  return {
    handling: ascents * picker.pick('handling.lower_off'),
    hangs: ascents * hangs,
    falls: ascents * picker.pick('static.lower_off'),
  }
}

/** Where a failure of a lower-off or belay at this height ends: the ground from three metres up, low below that. */
export function toStationShares(inputs: RatingInputs): { consequence: ConsequenceClass; share: number }[] {
  const height = inputs.climb.points[inputs.at]!.alongM
  const ground = Math.max(0, (height - 3) / Math.max(height, 1e-9))
  return [
    { consequence: 'ground', share: ground },
    { consequence: 'low', share: 1 - ground },
  ]
}

function toStationEvents(inputs: RatingInputs, picker: Picker): YearlyEvents {
  const events = noEvents()
  const ascents = toAscents(inputs, picker)
  const { kind } = inputs.climb.points[inputs.at]!
  const { lowering, toprope, abseil } = inputs.usedFor
  const belay = kind === 'stance' || kind === 'belay_stake'
  const streams: (Stream | null)[] = [
    lowering ? { rate: picker.pick('lowerings'), load: loadOf('lowering', picker) } : null,
    toprope ? { rate: picker.pick('toprope_falls'), load: loadOf('toprope', picker) } : null,
    abseil ? { rate: picker.pick('abseils'), load: loadOf('abseil', picker) } : null,
    belay ? { rate: picker.pick('belay.hangs'), load: loadOf('belay_hang', picker) } : null,
    belay ? { rate: picker.pick('belay.falls'), load: loadOf('belay_fall', picker) } : null,
    { rate: picker.pick('static.lower_off'), load: loadOf('static', picker) },
  ]
  for (const stream of streams)
    if (stream !== null)
      for (const { consequence, share } of toStationShares(inputs))
        if (share > 0) events[consequence].push({ load: stream.load, rate: stream.rate * ascents * share })
  return events
}

function toBoltEvents(inputs: RatingInputs, picker: Picker): { events: YearlyEvents; falls: ClassedLoad[] } {
  const events = noEvents()
  const counts = countEvents(inputs, picker)
  const falls = toFallLoads(inputs, picker)
  for (const { consequence, share, load } of falls)
    events[consequence].push({ load, rate: counts.falls * share })
  const still: Stream[] = [
    { rate: counts.hangs, load: loadOf('lowering', picker) },
    { rate: toAscents(inputs, picker) * picker.pick('static.bolt'), load: loadOf('static', picker) },
  ]
  for (const { consequence, share } of toHangConsequences(inputs, picker))
    for (const { rate, load } of still)
      if (share > 1e-9) events[consequence].push({ load, rate: rate * share })
  return { events, falls }
}

/** The year's loads on the point, and of a bolt the falls apart, for drawing. */
export function toYearlyEvents(
  inputs: RatingInputs,
  picker: Picker,
): { events: YearlyEvents; falls: ClassedLoad[] } {
  return isStation(inputs)
    ? { events: toStationEvents(inputs, picker), falls: [] }
    : toBoltEvents(inputs, picker)
}
