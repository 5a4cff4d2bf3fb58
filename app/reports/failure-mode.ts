import type { FindingKind } from '~/rating/finding'
import type { FailureMode } from './hazard'

const cuts = [
  'groove',
  'sharp_edge_rope',
  'sharp_edge_hanger',
  'nicked',
  'rope_over_edge',
] as const satisfies readonly FindingKind[]
const releases = [
  'link_unscrewed',
  'gate_stuck',
  'keeper_gone',
  'hook_worn',
  'badly_placed',
] as const satisfies readonly FindingKind[]
const pullsOut = [
  'nut_loose',
  'nut_missing',
  'spins',
  'turns_by_hand',
  'loose_in_hole',
  'resin_soft',
  'resin_cracked',
  'resin_gap',
  'rock_hollow',
  'rock_cracked',
  'rock_spalled',
  'rock_edge',
  'missing',
] as const satisfies readonly FindingKind[]

const has = (kinds: readonly FindingKind[], kind: FindingKind) => kinds.includes(kind)

/** How a fault would let a climber fall: it decides which reports are of the same problem. */
export function toFailureMode(kind: FindingKind): FailureMode {
  if (has(cuts, kind)) return 'cuts_rope'
  if (has(releases, kind)) return 'releases_rope'
  if (has(pullsOut, kind)) return 'pulls_out'
  return 'breaks'
}
