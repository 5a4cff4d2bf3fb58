import type { AnchorKind, Below } from '~/crags/anchor'
import type { ConditionState } from '~/crags/condition-state'
import type { Corrosivity, Traffic } from '~/crags/crag'
import type { Material, PartKind, Side } from '~/crags/part'
import type { EdgeClass, FindingKind } from './finding'

/** One fixed point of the line, lowest first. */
interface LinePoint {
  kind: AnchorKind
  alongM: number
  assumed: boolean
  state: ConditionState
}

/** The line of a pitch as consequence and loads need it. */
export interface RatedLine {
  lengthM: number
  traffic: Traffic
  /** counted, or null where only the class of traffic is known */
  ascentsPerYear: number | null
  start: 'ground' | 'stance'
  below: Below
  ledges: { atM: number }[]
  points: LinePoint[]
}

export interface FindingInput {
  kind: FindingKind
  low: number | null
  high: number | null
  unit: 'mm' | 'percent' | 'grade' | null
  edge: EdgeClass | null
  triedByHand: boolean | null
}

export interface PartInput {
  id: string
  kind: PartKind
  material: Material
  sizeMm: number | null
  ageYears: number | null
  side: Side | null
  findings: FindingInput[]
}

/** Everything a rating is made of, as plain data. What nobody gave is null: unknown is not fair. */
export interface RatingInputs {
  climb: RatedLine
  /** index into the line's points */
  at: number
  crux: 'ordinary' | 'crux' | 'much_fallen_on'
  parts: PartInput[]
  place: { seaKm: number | null; warmSea: boolean; corrosivity: Corrosivity | null }
  /** of a two-point station: what is known of the side not in question */
  otherSide: 'looked_at' | 'not_looked_at' | 'both_bad' | null
  usedFor: { lowering: boolean; abseil: boolean; toprope: boolean }
}

/** The inputs as one text with keys in order, so that equal inputs have equal hashes. */
export function canonicalInputs(inputs: RatingInputs): string {
  return JSON.stringify(inputs, (_, value) =>
    value !== null && typeof value === 'object' && !Array.isArray(value)
      ? Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)))
      : value,
  )
}
