import type { PartKind } from '~/crags/part'
import { toExpectedRust } from './corrosion'
import { type Cracking, isOfFabric } from './cracking'
import type { FindingKind } from './finding'
import type { FindingInput, PartInput, RatingInputs } from './inputs'
import { toRustGrade } from './measure'
import type { Picker } from './picker'

/** How large the weak and the bad populations are among parts like this one. */
export interface Weights {
  weak: number
  bad: number
}

/** Parts that hold by what they sit in. */
export const inRock: readonly PartKind[] = [
  'wedge_bolt',
  'sleeve_bolt',
  'self_drilled',
  'drive_in',
  'screw_in',
  'bonded_eye',
  'bonded_staple',
  'bonded_stud',
  'resin',
  'peg',
  'thread',
]

/** Findings whose kind alone names its weights in the model; what is not here or below weakens nothing by itself. */
const byKind: Partial<Record<FindingKind, string>> = {
  spins: 'spins',
  nut_missing: 'link_unscrewed',
  turns_by_hand: 'turns',
  bent: 'bent',
  resin_soft: 'resin_soft',
  resin_cracked: 'resin_gap',
  resin_gap: 'resin_gap',
  rock_hollow: 'rock_hollow',
  rock_cracked: 'rock_cracked',
  rock_edge: 'rock_cracked',
  rock_spalled: 'fair',
  fabric_faded: 'sling_faded',
  fabric_stiff: 'sling_stiff',
  link_unscrewed: 'link_unscrewed',
  mixed_metals: 'fair',
  aluminium_left: 'fair',
  nicked: 'fair',
  pitting: 'poor',
  undersized: 'poor',
  home_made: 'poor',
  hook_worn: 'fair',
  known_failures: 'poor',
  unknown_age: 'unknown_age',
  other: 'poor',
}

/** The weights of the model that a finding brings to its part, or null when it weakens nothing. */
function toFindingName(found: FindingInput, part: PartInput): string | null {
  const isSound = part.findings.some(other => other.kind === 'no_fault')
  switch (found.kind) {
    case 'loose_in_hole':
      return part.kind === 'peg' ? 'peg_loose' : 'loose_in_hole'
    case 'turns_by_hand':
      return part.kind === 'peg' ? 'peg_loose' : 'turns'
    // a nut on a stud that was tried and found firm is a five-minute job
    case 'nut_loose':
      return isSound ? 'spins' : 'nut_loose'
    case 'cracked':
      return inRock.includes(part.kind) ? 'severe' : 'hanger_cracked'
    default:
      return byKind[found.kind] ?? null
  }
}

/** What age and material alone say of a part in service, before anybody looked; only a look replaces it. */
function toPriorName(part: PartInput): string {
  if (part.findings.some(found => found.kind === 'no_fault')) return 'good'
  if (isOfFabric(part)) return 'sling_unknown'
  if (part.kind === 'peg') return 'peg_unknown'
  if (part.kind === 'self_drilled' || part.kind === 'drive_in') return 'self_drilled'
  // what age leaves open is the placement in the rock, not the plate on it
  if (part.ageYears === null) return part.kind === 'hanger' ? 'fair' : 'unknown_age'
  if (part.ageYears < 2) return 'new'
  if (part.material === 'plated_steel' && part.ageYears > 15) return 'old_plated'
  return 'good'
}

/** The worst grade of rust that was seen, or is to be expected where nobody looked; 0 for none. */
function toWorstRust(part: PartInput, place: RatingInputs['place']): number {
  const seen = part.findings.map(found => (found.kind === 'rust' ? toRustGrade(found) : 0))
  const isLooked = part.findings.some(({ kind }) => kind === 'no_fault')
  return Math.max(0, ...seen, isLooked ? 0 : (toExpectedRust(part, place) ?? 0))
}

/** The rows of the model whose weights add up for a part: its prior, what was found, what place and age let expect. */
export function listWeightNames(
  part: PartInput,
  place: RatingInputs['place'],
  cracking: Cracking | null,
): string[] {
  const names = [toPriorName(part), ...part.findings.flatMap(found => toFindingName(found, part) ?? [])]
  const rust = toWorstRust(part, place)
  if (rust > 0) names.push(`rust${rust}`)
  if (cracking !== null) names.push(`cracking_${cracking}`)
  return [...new Set(names)]
}

/** Findings add to the prior, w = 1 − Π(1 − wᵢ), and never replace it; bad is cut at 1 and weak at what it leaves. */
export function toWeights(names: readonly string[], picker: Picker): Weights {
  const join = (which: keyof Weights) =>
    1 - names.reduce((left, name) => left * (1 - Math.min(1, picker.pick(`weight.${name}.${which}`))), 1)
  const bad = Math.min(1, join('bad'))
  return { bad, weak: Math.min(join('weak'), 1 - bad) }
}
