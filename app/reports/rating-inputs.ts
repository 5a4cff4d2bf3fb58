import type { AnchorKind } from '~/crags/anchor'
import type { ConditionState } from '~/crags/condition-state'
import type { Corrosivity, Traffic } from '~/crags/crag'
import type { Material, PartKind, Side } from '~/crags/part'
import { yearsBetween } from '~/lib/dates'
import type { EdgeClass, FindingKind } from '~/rating/finding'
import type { PartInput, RatingInputs } from '~/rating/inputs'
import { choosePart } from './part-for-finding'

/** What stands on record about the climb, as a rating needs it. */
export interface RatedClimb {
  lengthM: number
  traffic: Traffic
  ascentsYear: number | null
  ledges: { atM: number }[]
  points: {
    anchorId: string
    kind: AnchorKind
    alongM: number
    assumed: boolean
    state: ConditionState
    below: string
  }[]
}

export interface RatedPart {
  id: string
  side: Side | null
  kind: PartKind
  material: Material
  sizeMm: number | null
  fittedOn: string | null
}

export interface RatedFinding {
  kind: FindingKind
  partId: string | null
  unit: 'mm' | 'percent' | 'grade' | null
  low: number | null
  high: number | null
  edge: EdgeClass | null
  triedByHand: boolean | null
}

/** What a fixed point most likely is when nobody has recorded its parts. */
const usualPart: Record<AnchorKind, PartKind> = {
  bolt: 'wedge_bolt',
  lower_off: 'ring',
  stance: 'ring',
  abseil_station: 'ring',
  thread: 'thread',
  peg: 'peg',
  belay_stake: 'peg',
}

/**
 * The inputs of a rating from what is on record: the climb's line, the parts at the point and the findings, each
 * counted to its part. A measure nobody gave stays null; nothing is filled in with a hopeful value.
 */
export function toRatingInputs(given: {
  climb: RatedClimb
  anchorId: string
  parts: RatedPart[]
  findings: RatedFinding[]
  place: { seaKm: number | null; warmSea: boolean; corrosivity: Corrosivity | null }
  today: string
}): RatingInputs {
  const { climb, anchorId, place } = given
  const at = climb.points.findIndex(point => point.anchorId === anchorId)
  if (at < 0) throw new Error('the fixed point does not stand on this climb')
  const kind = climb.points[at]!.kind
  const parts = toParts(given.parts, given.findings, kind, given.today)
  return {
    climb: {
      lengthM: climb.lengthM,
      traffic: climb.traffic,
      ascentsPerYear: climb.ascentsYear,
      start: 'ground',
      below: climb.points[0]!.below as RatingInputs['climb']['below'],
      ledges: climb.ledges.map(ledge => ({ atM: ledge.atM })),
      points: climb.points.map(({ kind, alongM, assumed, state }) => ({ kind, alongM, assumed, state })),
    },
    at,
    crux: 'ordinary',
    parts,
    place,
    otherSide: toOtherSide(parts),
    usedFor: {
      lowering: kind === 'lower_off',
      abseil: kind === 'abseil_station',
      toprope: kind === 'lower_off',
    },
  }
}

function toParts(there: RatedPart[], findings: RatedFinding[], kind: AnchorKind, today: string): PartInput[] {
  const known =
    there.length > 0
      ? there
      : [
          {
            id: 'assumed',
            side: null,
            kind: usualPart[kind],
            material: 'unknown' as const,
            sizeMm: null,
            fittedOn: null,
          },
        ]
  const homes = new Map<string, RatedFinding[]>()
  for (const finding of findings) {
    const home = known.find(part => part.id === finding.partId) ?? choosePart(finding.kind, known)!
    homes.set(home.id, [...(homes.get(home.id) ?? []), finding])
  }
  return known.map(part => ({
    id: part.id,
    kind: part.kind,
    material: part.material,
    sizeMm: part.sizeMm,
    ageYears: part.fittedOn === null ? null : yearsBetween(part.fittedOn, today),
    side: part.side,
    findings: (homes.get(part.id) ?? []).map(({ partId: _, ...finding }) => finding),
  }))
}

/** Whether somebody looked at the side of a two-point station that is not in question. */
function toOtherSide(parts: PartInput[]): RatingInputs['otherSide'] {
  const withFault = new Set(
    parts.filter(part => part.findings.some(finding => finding.kind !== 'no_fault')).map(part => part.side),
  )
  const sides = new Set(parts.map(part => part.side).filter(side => side !== null))
  if (sides.size < 2) return null
  if (withFault.has('a') && withFault.has('b')) return 'both_bad'
  const other = withFault.has('a') ? 'b' : 'a'
  const looked = parts.some(
    part => part.side === other && part.findings.some(finding => finding.kind === 'no_fault'),
  )
  return looked ? 'looked_at' : 'not_looked_at'
}
