import type { PartKind } from '~/crags/part'
import { toDepthShare, toMiddle } from './edges'
import type { FindingInput, PartInput, RatingInputs } from './inputs'
import type { Mixture } from './lognormal'
import type { Population } from './model-strengths'
import type { Picker } from './picker'
import { toReducedCircleLoss, toSegmentLoss } from './wear'

const populationOf: Record<PartKind, Population> = {
  wedge_bolt: 'expansion',
  sleeve_bolt: 'expansion',
  self_drilled: 'expansion',
  drive_in: 'expansion',
  screw_in: 'expansion',
  bonded_eye: 'bonded',
  bonded_staple: 'bonded',
  bonded_stud: 'bonded',
  hanger: 'hanger',
  ring: 'ring',
  lower_off_hook: 'ring',
  cold_shut: 'ring',
  swivel: 'ring',
  chain: 'chain',
  quick_link: 'quick_link',
  fixed_draw: 'steel_connector',
  connector: 'steel_connector',
  sling: 'sling',
  cord: 'sling',
  cable: 'chain',
  resin: 'bonded',
  peg: 'peg',
  thread: 'thread',
}

const fabric = ['sling', 'cord', 'thread'] satisfies PartKind[] as PartKind[]
const boltKinds = ['expansion', 'bonded']

/** A weight of the model that a finding brings to its part, or null when it weakens nothing. */
function toWeightName(found: FindingInput, part: PartInput): string | null {
  const onBolt = boltKinds.includes(populationOf[part.kind])
  switch (found.kind) {
    case 'spins':
      return 'spins'
    case 'nut_loose':
    case 'nut_missing':
      return 'nut_loose'
    case 'loose_in_hole':
      return part.kind === 'peg' ? 'peg_loose' : 'loose_in_hole'
    case 'turns_by_hand':
      return 'turns'
    case 'resin_soft':
      return 'resin_soft'
    case 'resin_gap':
    case 'resin_cracked':
      return 'resin_gap'
    case 'bent':
      return 'bent'
    case 'cracked':
      return onBolt ? 'severe' : 'hanger_cracked'
    case 'rock_hollow':
      return 'rock_hollow'
    case 'rock_cracked':
    case 'rock_edge':
      return 'rock_cracked'
    case 'fabric_faded':
      return 'sling_faded'
    case 'fabric_stiff':
      return 'sling_stiff'
    case 'link_unscrewed':
      return 'link_unscrewed'
    case 'rust': {
      const grade = Math.round(toMiddle(found) ?? 3)
      return grade < 1 ? null : `rust${Math.min(5, grade)}`
    }
    case 'pitting':
    case 'undersized':
    case 'home_made':
      return 'poor'
    case 'other':
      return 'poor'
    default:
      return null
  }
}

/** What age and material alone say of a part in service, before anybody looked. */
function toPriorName(part: PartInput): string {
  if (part.findings.some(found => found.kind === 'no_fault')) return 'good'
  if (fabric.includes(part.kind)) return 'sling_unknown'
  if (part.kind === 'peg') return 'peg_unknown'
  if (part.kind === 'self_drilled' || part.kind === 'drive_in') return 'self_drilled'
  // what age leaves open is the placement in the rock, not the plate on it
  if (part.ageYears === null) return part.kind === 'hanger' ? 'fair' : 'unknown_age'
  if (part.ageYears < 2) return 'new'
  if (part.material === 'plated_steel' && part.ageYears > 15) return 'old_plated'
  return 'good'
}

/** Hidden cracking: stainless of the usual families by a warm sea, by what was seen and what is known of the place. */
export function toCracking(
  part: PartInput,
  place: RatingInputs['place'],
): 'possible' | 'spots' | 'known' | null {
  if (part.material !== 'stainless' || !place.warmSea) return null
  if (part.findings.some(found => found.kind === 'known_failures')) return 'known'
  const spots = part.findings.some(found => found.kind === 'rust' && (toMiddle(found) ?? 3) >= 1)
  return spots ? 'spots' : 'possible'
}

/** Weights of weak and bad: findings add to the prior, w = 1 − Π(1 − wᵢ); bad is cut at 1 and weak at what it leaves. */
function toWeights(names: string[], picker: Picker): { weak: number; bad: number } {
  const join = (which: 'weak' | 'bad') =>
    1 - names.reduce((left, name) => left * (1 - Math.min(1, picker.pick(`weight.${name}.${which}`))), 1)
  const bad = Math.min(1, join('bad'))
  return { bad, weak: Math.min(join('weak'), 1 - bad) }
}

/** How much of the section is left at a groove, central by the segment; the cautious end by the reduced circle. */
function toSectionLeft(part: PartInput, picker: Picker): number {
  let left = 1
  for (const found of part.findings) {
    if (found.kind !== 'groove' && found.kind !== 'section_lost') continue
    const share = toDepthShare(found, part)
    if (share === null) continue
    const range = {
      low: 1 - toSegmentLoss(share * 0.8, 1),
      central: 1 - toSegmentLoss(share, 1),
      high: 1 - toReducedCircleLoss(share, 1),
    }
    left = Math.min(left, picker.pickBetween('section left', range))
  }
  return left
}

/** The cap that a finding puts on a connector's strength, kN; null without one. */
function toCap(part: PartInput, picker: Picker): number | null {
  const kinds = part.findings.map(found => found.kind)
  if (kinds.includes('nose_hooked')) return picker.pick('cap.nose_hooked')
  if (kinds.includes('gate_stuck')) return picker.pick('cap.gate_open')
  if (kinds.includes('cross_loaded')) return picker.pick('cap.cross_loaded')
  return null
}

/**
 * The strength of a part as it is now, three populations with their weights (kN): what stands on record and was found
 * decides how many of its kind are weak or bad; wear and a gate left open lower what the sound ones hold. `prior` names
 * the weights before findings, when they shall not come from the part's age and material.
 */
export function toStrength(
  part: PartInput,
  place: RatingInputs['place'],
  picker: Picker,
  prior: string = toPriorName(part),
): Mixture {
  const cracking = toCracking(part, place)
  const aluminium = part.material === 'aluminium' && populationOf[part.kind] === 'steel_connector'
  const population = cracking ? 'cracking' : aluminium ? 'aluminium_connector' : populationOf[part.kind]
  const found = part.findings.flatMap(finding => toWeightName(finding, part) ?? [])
  const names = cracking
    ? [`cracking_${cracking}`, ...found.filter(name => !name.startsWith('rust'))]
    : [prior, ...found]
  const { weak, bad } = toWeights([...new Set(names)], picker)
  const left = toSectionLeft(part, picker)
  const factor = left / picker.pick('strength.factor')
  const badFactor = left / picker.pick('strength.bad.factor')
  const cap = toCap(part, picker)
  const of = (which: 'sound' | 'weak' | 'bad', weight: number) => {
    const median = picker.pick(`strength.${population}.${which}`) * (which === 'bad' ? badFactor : factor)
    const zeta = picker.pick(`strength.${population}.${which}.zeta`)
    if (cap === null) return { weight, median, zeta }
    const nose = part.findings.some(finding => finding.kind === 'nose_hooked')
    return { weight, median: Math.min(median, cap), zeta: Math.max(zeta, nose ? 0.5 : 0.12) }
  }
  return [of('sound', 1 - weak - bad), of('weak', weak), of('bad', bad)]
}
