import type { PartKind } from '~/crags/part'
import type { FindingKind } from '~/rating/finding'

const bolts = ['wedge_bolt', 'sleeve_bolt', 'self_drilled', 'drive_in', 'screw_in', 'bonded_stud'] as const
const bonded = ['bonded_eye', 'bonded_staple', 'bonded_stud'] as const
const ropeParts = [
  'ring',
  'lower_off_hook',
  'cold_shut',
  'quick_link',
  'connector',
  'fixed_draw',
  'chain',
  'bonded_eye',
  'bonded_staple',
  'hanger',
] as const
const fabric = ['sling', 'cord', 'fixed_draw', 'thread'] as const

/** Which parts a finding is most likely about, likeliest first. */
const likely: Partial<Record<FindingKind, readonly PartKind[]>> = {
  groove: ropeParts,
  section_lost: ropeParts,
  sharp_edge_rope: ropeParts,
  nicked: ['connector', 'fixed_draw', 'quick_link'],
  sharp_edge_hanger: ['hanger'],
  spins: ['hanger', ...bolts],
  nut_loose: bolts,
  nut_missing: bolts,
  missing: ['hanger', ...bolts],
  loose_in_hole: [...bolts, 'peg'],
  turns_by_hand: [...bonded, ...bolts],
  resin_soft: [...bonded, 'resin'],
  resin_cracked: [...bonded, 'resin'],
  resin_gap: [...bonded, 'resin'],
  link_unscrewed: ['quick_link'],
  gate_stuck: ['connector', 'fixed_draw'],
  cross_loaded: ['connector', 'fixed_draw'],
  nose_hooked: ['connector', 'fixed_draw'],
  fabric_faded: fabric,
  fabric_stiff: fabric,
  keeper_gone: ['lower_off_hook'],
  hook_worn: ['lower_off_hook', 'cold_shut'],
}

/** The part a finding without one is counted to: the likeliest kind that is there, else the first part, else null. */
export function choosePart<T extends { kind: PartKind }>(kind: FindingKind, there: readonly T[]): T | null {
  for (const partKind of likely[kind] ?? []) {
    const found = there.find(part => part.kind === partKind)
    if (found !== undefined) return found
  }
  return there[0] ?? null
}
