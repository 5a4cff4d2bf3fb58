import { type ConditionState, worstState } from '~/crags/condition-state'
import type { EdgeClass, FindingKind } from '~/rating/finding'

/** What the condition rule asks of one finding; measures in the finding's unit, a percentage of the bar for wear. */
export interface ConditionFinding {
  kind: FindingKind
  unit: 'mm' | 'percent' | 'grade' | null
  low: number | null
  high: number | null
  edge: EdgeClass | null
  /** the part's bar, for depths */
  sizeMm: number | null
}

/** Findings whose kind alone decides; those that are measured stand below. */
const byKind: Partial<Record<FindingKind, ConditionState>> = {
  no_fault: 'good',
  nut_loose: 'poor',
  nut_missing: 'severe',
  link_unscrewed: 'severe',
  spins: 'fair',
  turns_by_hand: 'severe',
  loose_in_hole: 'severe',
  bent: 'poor',
  cracked: 'severe',
  pitting: 'poor',
  mixed_metals: 'fair',
  aluminium_left: 'fair',
  resin_soft: 'severe',
  resin_cracked: 'poor',
  resin_gap: 'poor',
  rock_hollow: 'poor',
  rock_cracked: 'poor',
  rock_spalled: 'fair',
  rock_edge: 'fair',
  gate_stuck: 'poor',
  cross_loaded: 'poor',
  nose_hooked: 'severe',
  nicked: 'poor',
  fabric_faded: 'poor',
  fabric_stiff: 'severe',
  undersized: 'poor',
  home_made: 'poor',
  single_point: 'fair',
  badly_placed: 'fair',
  rope_over_edge: 'poor',
  missing: 'severe',
  unknown_age: 'unknown',
  keeper_gone: 'poor',
  hook_worn: 'severe',
  known_failures: 'severe',
  other: 'poor',
}

const byEdge: Record<EdgeClass, ConditionState> = {
  smooth: 'fair',
  rounded: 'fair',
  felt: 'poor',
  sharp: 'severe',
  knife: 'severe',
}

/** Rust by its ISO 4628-3 grade, 0 to 5. */
const byRust: readonly ConditionState[] = ['good', 'fair', 'fair', 'fair', 'poor', 'severe']

/** Wear as a share of the bar (plan at a quarter, replace at a third: common practice). */
function toWearState(share: number): ConditionState {
  if (share >= 1 / 3) return 'severe'
  return share >= 0.25 ? 'poor' : 'fair'
}

function toWorn(finding: ConditionFinding): ConditionState {
  const measured = finding.high ?? finding.low
  if (measured === null) return 'fair'
  if (finding.unit === 'percent') return toWearState(measured / 100)
  if (finding.sizeMm === null) return measured >= 2 ? 'poor' : 'fair'
  return toWearState(measured / finding.sizeMm)
}

/** The condition one finding gives its point: one table of kind and measure, the worse of wear and edge for a groove. */
export function toCondition(finding: ConditionFinding): ConditionState {
  if (finding.kind === 'rust') return byRust[Math.round(finding.high ?? finding.low ?? 3)] ?? 'severe'
  const edge = finding.edge === null ? 'fair' : byEdge[finding.edge]
  if (finding.kind === 'groove' || finding.kind === 'section_lost') return worstState([toWorn(finding), edge])
  if (finding.kind === 'sharp_edge_rope' || finding.kind === 'sharp_edge_hanger')
    return finding.edge === null ? 'poor' : edge
  return byKind[finding.kind] ?? 'poor'
}
