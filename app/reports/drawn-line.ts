import type { AnchorKind, Below } from '~/crags/anchor'
import type { ConditionState } from '~/crags/condition-state'
import type { Traffic } from '~/crags/crag'
import { groundZones } from '~/rating/consequence'
import { formatDay } from '~/ui/when'
import { type HowSeen, howSeenWords } from './report'

interface Placed {
  code: string
  name: string
  kind: AnchorKind
  alongM: number
  assumed: boolean
  below: Below
  state: ConditionState
  stateOn: string | null
  stateHow: string | null
  openHazards: number
}

/** A fixed point as the line draws it: its name, what it is in a few words, when and how it was last seen. */
export function toDrawnPoint(point: Placed, what: string) {
  const how = point.stateHow === null ? '' : `, ${howSeenWords[point.stateHow as HowSeen]}`
  return {
    code: point.code,
    name: point.name,
    kind: point.kind,
    alongM: point.alongM,
    assumed: point.assumed,
    state: point.state,
    what,
    seen: point.stateOn === null ? null : `${formatDay(point.stateOn)}${how}`,
    open: point.openHazards > 0,
  }
}

/** The stretches of a climb from which a fall reaches the ground: hatched where only a failure lets it, dotted anyway. */
export function toZones(climb: {
  lengthM: number
  traffic: Traffic
  ascentsYear: number | null
  ledges: { atM: number }[]
  points: Placed[]
}) {
  const [lowest] = climb.points
  if (lowest === undefined) return []
  return groundZones({
    lengthM: climb.lengthM,
    traffic: climb.traffic,
    ascentsPerYear: climb.ascentsYear,
    start: 'ground',
    below: lowest.below,
    ledges: climb.ledges,
    points: climb.points.map(({ kind, alongM, assumed, state }) => ({ kind, alongM, assumed, state })),
  })
}
