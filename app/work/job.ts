import type { AnchorKind } from '../crags/anchor'
import type { FailureMode } from '../reports/hazard'

/** Kinds of job, in the trade's words. */
export const jobKinds = [
  'replace_ring',
  'replace_lower_off',
  'replace_bolt',
  'replace_hanger',
  'tighten',
  'replace_connector',
  'look_closely',
  'other',
] as const
export type JobKind = (typeof jobKinds)[number]

export const jobKindWords: Record<JobKind, string> = {
  replace_ring: 'Replace ring or link',
  replace_lower_off: 'Replace lower-off',
  replace_bolt: 'Replace bolt',
  replace_hanger: 'Replace hanger',
  tighten: 'Tighten nut or link',
  replace_connector: 'Replace fixed connector or draw',
  look_closely: 'Look closely',
  other: 'Other',
}

/** The kind of job that a way of failing usually asks for, to begin the form with. */
export function toUsualJob(mode: FailureMode, kind: AnchorKind | null): JobKind {
  if (mode === 'pulls_out') return kind === 'bolt' ? 'replace_bolt' : 'replace_lower_off'
  if (mode === 'releases_rope') return kind === 'bolt' ? 'replace_connector' : 'replace_ring'
  if (mode === 'cuts_rope') return kind === 'bolt' ? 'replace_connector' : 'replace_ring'
  return 'look_closely'
}
