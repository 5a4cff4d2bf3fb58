import { type ConsequenceClass, toStationConsequence, toTerrain } from './consequence'
import { type ClassedLoad, toFallLoads, toHangShares } from './falls'
import type { RatingInputs } from './inputs'
import type { Picker } from './picker'
import type { Stream } from './yearly'

/** Events of a year that load the point, by what a failure then would lead to. */
export type YearlyEvents = Record<ConsequenceClass, Stream[]>

const noEvents = (): YearlyEvents => ({ short: [], long: [], low: [], ground: [] })

/** How often in a year each kind of thing happens at the point. */
export interface Counts {
  handling: number
  hangs: number
  falls: number
}

const loadOf = (name: string, picker: Picker) => ({
  median: picker.pick(`load.${name}`),
  zeta: picker.pick(`load.${name}.zeta`),
})

/** Ascents a year: counted, or by the class of traffic. */
function toAscents({ climb }: RatingInputs, picker: Picker): number {
  if (climb.ascentsPerYear !== null) return climb.ascentsPerYear * picker.pick('ascents.counted')
  return picker.pick(`ascents.${climb.traffic}`)
}

/** Which row of the model counts falls and hangs on this point of the line. */
function toFallRow(inputs: RatingInputs): string {
  if (inputs.crux === 'crux') return 'crux'
  if (inputs.crux === 'much_fallen_on') return 'much'
  return ['bolt1', 'bolt2'][inputs.at] ?? 'other'
}

const stations = ['lower_off', 'abseil_station', 'stance', 'belay_stake']

/** Whether people lower, abseil or belay here rather than lead past it. */
export function isStation(inputs: RatingInputs): boolean {
  return stations.includes(inputs.climb.points[inputs.at]!.kind)
}

/** One kind of event at a station: the row of its count an ascent, and of its load. */
type StationEvent = readonly [count: string, load: string]

/** What goes on at a station; where nobody said what it is used for, what its kind is for. */
function listStationEvents(inputs: RatingInputs): StationEvent[] {
  const { kind } = inputs.climb.points[inputs.at]!
  const { lowering, toprope, abseil } = inputs.usedFor
  const isSaid = lowering || toprope || abseil
  const events: StationEvent[] = []
  if (kind === 'stance' || kind === 'belay_stake')
    events.push(['belay.hangs', 'belay_hang'], ['belay.falls', 'belay_fall'], ['static.bolt', 'static'])
  else events.push(['static.lower_off', 'static'])
  if (lowering || (!isSaid && kind === 'lower_off')) events.push(['lowerings', 'lowering'])
  if (toprope || (!isSaid && kind === 'lower_off')) events.push(['toprope_falls', 'toprope'])
  if (abseil || (!isSaid && kind === 'abseil_station')) events.push(['abseils', 'abseil'])
  return [...events, ['handling.lower_off', 'handling']]
}

/** Counts at a station that are neither handling nor a shock. */
const hangCounts = ['belay.hangs', 'lowerings', 'toprope_falls', 'abseils']
const shockCounts = ['belay.falls', 'static.bolt', 'static.lower_off']

/** Handling, hangs and falls a year; at a station a lowering, abseil or top-rope fall counts as a hang, a shock as a fall. */
export function countEvents(inputs: RatingInputs, picker: Picker): Counts {
  const ascents = toAscents(inputs, picker)
  const sum = (rows: readonly string[]) => ascents * rows.reduce((total, row) => total + picker.pick(row), 0)
  if (!isStation(inputs)) {
    const row = toFallRow(inputs)
    return { handling: sum(['handling.bolt']), hangs: sum([`hangs.${row}`]), falls: sum([`falls.${row}`]) }
  }
  const rows = listStationEvents(inputs).map(([count]) => count)
  return {
    handling: sum(['handling.lower_off']),
    hangs: sum(rows.filter(row => hangCounts.includes(row))),
    falls: sum(rows.filter(row => shockCounts.includes(row))),
  }
}

/** What the failure of this station leads to. */
export function toStationClass({ climb, at }: RatingInputs): ConsequenceClass {
  return toStationConsequence(toTerrain(climb), climb.points[at]!.alongM)
}

function toStationEvents(inputs: RatingInputs, picker: Picker): YearlyEvents {
  const events = noEvents()
  const ascents = toAscents(inputs, picker)
  for (const [count, load] of listStationEvents(inputs))
    events[toStationClass(inputs)].push({ rate: ascents * picker.pick(count), load: loadOf(load, picker) })
  return events
}

function toBoltEvents(inputs: RatingInputs, falls: readonly ClassedLoad[], picker: Picker): YearlyEvents {
  const events = noEvents()
  const counts = countEvents(inputs, picker)
  for (const { consequence, share, load } of falls)
    events[consequence].push({ load, rate: counts.falls * share })
  const still: Stream[] = [
    { rate: counts.hangs, load: loadOf('lowering', picker) },
    { rate: toAscents(inputs, picker) * picker.pick('static.bolt'), load: loadOf('static', picker) },
  ]
  for (const { consequence, share } of picker.step('hangs', () => toHangShares(inputs, picker)))
    for (const { rate, load } of still) events[consequence].push({ load, rate: rate * share })
  return events
}

/** The falls on a bolt by what they would lead to; none at a station. */
export function listFalls(inputs: RatingInputs, picker: Picker): ClassedLoad[] {
  return isStation(inputs) ? [] : picker.step('falls', () => toFallLoads(inputs, picker))
}

/** The year's loads on the point, by what its failure would lead to. */
export function toYearlyEvents(inputs: RatingInputs, picker: Picker): YearlyEvents {
  return isStation(inputs)
    ? toStationEvents(inputs, picker)
    : toBoltEvents(inputs, listFalls(inputs, picker), picker)
}

/**
 * The year's loads where nothing is left to hold: it is seen, and only some go on all the same. Nobody hangs on a bolt
 * that is not there, but falls from above it still come.
 */
export function toAvoidedEvents(inputs: RatingInputs, picker: Picker): YearlyEvents {
  const events = noEvents()
  const avoided = picker.pick('avoided')
  if (isStation(inputs)) {
    for (const [of, streams] of Object.entries(toStationEvents(inputs, picker)))
      events[of as ConsequenceClass] = streams.map(({ rate, load }) => ({ load, rate: rate * avoided }))
    return events
  }
  const { falls } = countEvents(inputs, picker)
  for (const { consequence, share, load } of listFalls(inputs, picker))
    events[consequence].push({ load, rate: falls * avoided * share })
  return events
}
