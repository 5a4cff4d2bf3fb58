import type { PartKind } from '~/crags/part'
import { partKindWords } from '~/crags/part'
import type { EdgeClass, FindingKind } from '~/rating/finding'

/** What was found, in the trade's words; measures and edge are added by `formatFinding`. */
export const findingWords: Record<FindingKind, string> = {
  no_fault: 'no fault seen',
  sharp_edge_rope: 'sharp edge where the rope runs',
  sharp_edge_hanger: 'sharp edge of the hanger',
  groove: 'groove',
  section_lost: 'section lost',
  nut_loose: 'nut loose',
  nut_missing: 'nut missing',
  link_unscrewed: 'link unscrewed',
  spins: 'spins',
  turns_by_hand: 'turns by hand',
  loose_in_hole: 'loose in its hole',
  bent: 'bent',
  cracked: 'cracked',
  rust: 'rust',
  pitting: 'pitting',
  mixed_metals: 'mixed metals',
  aluminium_left: 'aluminium left in place',
  resin_soft: 'resin soft',
  resin_cracked: 'resin cracked',
  resin_gap: 'gap in the resin',
  rock_hollow: 'rock hollow',
  rock_cracked: 'rock cracked',
  rock_spalled: 'rock spalled',
  rock_edge: 'too near an edge of the rock',
  gate_stuck: 'gate does not close',
  cross_loaded: 'lies across its hanger',
  nose_hooked: 'hooked by its nose',
  nicked: 'nicked',
  fabric_faded: 'fabric faded',
  fabric_stiff: 'fabric stiff',
  undersized: 'undersized',
  home_made: 'home-made',
  single_point: 'single point',
  badly_placed: 'badly placed to clip',
  rope_over_edge: 'rope runs over an edge',
  missing: 'missing',
  unknown_age: 'age not known',
  keeper_gone: 'keeper gone',
  hook_worn: 'hook worn',
  known_failures: 'others like it have failed',
  other: 'something else',
}

export const edgeWords: Record<EdgeClass, string> = {
  smooth: 'no edge felt',
  rounded: 'rounded edge',
  felt: 'edge catches a fingernail',
  sharp: 'sharp edge',
  knife: 'edge that cuts',
}

const rustWords = [
  'no rust',
  'a trace of rust',
  'spots of rust',
  'patches of rust',
  'flaking rust',
  'rust all over',
]

function formatMeasure(found: { unit: string | null; low: number | null; high: number | null }): string {
  const { low, high } = found
  const value = low !== null && high !== null && low !== high ? `${low} to ${high}` : `${high ?? low}`
  if (low === null && high === null) return ''
  return found.unit === 'percent' ? `${value} %` : `${value} mm`
}

/** One finding in a few words: "groove 3.3 mm of 10 mm, sharp edge". */
export function formatFinding(found: {
  kind: FindingKind
  unit: 'mm' | 'percent' | 'grade' | null
  low: number | null
  high: number | null
  edge: EdgeClass | null
  sizeMm?: number | null
}): string {
  if (found.kind === 'rust') return rustWords[Math.round(found.high ?? found.low ?? 3)] ?? 'rust'
  const measure = formatMeasure(found)
  const bar = measure !== '' && found.sizeMm && found.unit === 'mm' ? ` of ${found.sizeMm} mm` : ''
  const edge =
    found.edge === null || found.edge === 'smooth' || found.kind.startsWith('sharp')
      ? ''
      : `, ${edgeWords[found.edge]}`
  return `${findingWords[found.kind]}${measure && ` ${measure}`}${bar}${edge}`
}

/** A hazard's line in lists: what, on which part ("Ring: groove 3.3 mm, sharp edge"). */
export function formatHeadline(
  position: string,
  partKind: PartKind | null,
  findings: Parameters<typeof formatFinding>[0][],
): string {
  const part = partKind === null ? '' : ` ${partKindWords[partKind].toLowerCase()}`
  const words = findings.map(found => formatFinding({ ...found, sizeMm: null })).join('; ')
  return `${position}${part}: ${words}`.slice(0, 200)
}
