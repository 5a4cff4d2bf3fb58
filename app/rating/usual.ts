import type { AnchorKind } from '~/crags/anchor'
import type { PartKind } from '~/crags/part'
import type { FindingInput, PartInput, RatingInputs } from './inputs'

/** What a fixed point most likely is of which no part is on record; nothing more is known of it. */
const usualPart: Record<AnchorKind, PartKind> = {
  bolt: 'wedge_bolt',
  lower_off: 'wedge_bolt',
  stance: 'wedge_bolt',
  abseil_station: 'wedge_bolt',
  thread: 'thread',
  peg: 'peg',
  belay_stake: 'peg',
}

/** The inputs with one part of which nothing is known where none is on record: unknown is not harmless. */
export function withSomePart(inputs: RatingInputs): RatingInputs {
  if (inputs.parts.length > 0) return inputs
  const kind = usualPart[inputs.climb.points[inputs.at]!.kind]
  const unknown = { material: 'unknown', sizeMm: null, ageYears: null, side: null } as const
  return { ...inputs, parts: [{ id: 'assumed', kind, ...unknown, findings: [] }] }
}

const usualKind: Partial<Record<PartKind, PartKind>> = { self_drilled: 'wedge_bolt', drive_in: 'wedge_bolt' }
/** What a usual part in service shows: looked at, and no more than patches of rust. */
const inService: FindingInput[] = [
  { kind: 'no_fault', low: null, high: null, unit: null, edge: null, triedByHand: null },
  { kind: 'rust', low: 3, high: 3, unit: 'grade', edge: null, triedByHand: null },
]

/** A usual one of its kind: the same place, with the same kinds of part in ordinary service, of metal that does not crack. */
export function toUsual(inputs: RatingInputs): RatingInputs {
  const parts: PartInput[] = inputs.parts.map(part => ({
    ...part,
    kind: usualKind[part.kind] ?? part.kind,
    findings: inService,
  }))
  const otherSide = inputs.otherSide === null ? null : ('looked_at' as const)
  return { ...inputs, parts, otherSide, place: { ...inputs.place, warmSea: false } }
}
