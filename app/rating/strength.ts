import type { AnchorKind } from '~/crags/anchor'
import type { ConditionState } from '~/crags/condition-state'
import type { PartKind } from '~/crags/part'
import { type Cracking, isOfFabric, isStainless, toCracking } from './cracking'
import type { PartInput, RatingInputs } from './inputs'
import type { Lognormal, Mixture } from './lognormal'
import type { Population } from './model-strengths'
import type { Picker } from './picker'
import { toSectionLeft } from './wear'
import { listWeightNames, toWeights, type Weights } from './weights'

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

function toPopulation(part: PartInput): Population {
  if (part.kind !== 'thread' && isOfFabric(part)) return 'sling'
  const population = populationOf[part.kind]
  return population === 'steel_connector' && part.material === 'aluminium'
    ? 'aluminium_connector'
    : population
}

/** What a connector holds when it is not loaded along its axis with the gate shut, kN; null where it is. */
export function toCap(part: PartInput, picker: Picker): Lognormal | null {
  const has = (kind: string) => part.findings.some(found => found.kind === kind)
  if (has('nose_hooked')) return { median: picker.pick('cap.nose_hooked'), zeta: 0.5 }
  if (has('gate_stuck')) return { median: picker.pick('cap.gate_open'), zeta: 0.12 }
  if (has('cross_loaded')) return { median: picker.pick('cap.cross_loaded'), zeta: 0.12 }
  return null
}

/** Sound, weak and bad of a population with their weights, kN; `left` is the share of the section that is left. */
function mix(population: Population, { weak, bad }: Weights, left: number, picker: Picker): Mixture {
  const sound = left * picker.pick('strength.factor')
  const of = (which: string, weight: number, factor: number) => ({
    weight,
    median: picker.pick(`strength.${population}.${which}`) * factor,
    zeta: picker.pick(`strength.${population}.${which}.zeta`),
  })
  return [
    of('sound', 1 - weak - bad, sound),
    of('weak', weak, sound),
    of('bad', bad, left * picker.pick('strength.bad.factor')),
  ]
}

/** The cracking that counts in this run: of steel that nobody knows, none but at the worse end. */
function toCountedCracking(part: PartInput, place: RatingInputs['place'], picker: Picker): Cracking | null {
  const stainless = isStainless(part)
  const cracking = toCracking(part, place)
  if (cracking === null || stainless === false) return null
  if (stainless === true) return cracking
  return picker.pickBetween('material.stainless', { low: 0, central: 0, high: 1 }) > 0 ? cracking : null
}

/**
 * The strength of a part as it is now along its axis, three populations with their weights (kN): what stands on record
 * and was found decides how many of its kind are weak or bad; wear lowers what all of them hold.
 */
export function toStrength(part: PartInput, place: RatingInputs['place'], picker: Picker): Mixture {
  const cracking = toCountedCracking(part, place, picker)
  const weights = toWeights(listWeightNames(part, place, cracking), picker)
  const population = cracking === null ? toPopulation(part) : 'cracking'
  return mix(population, weights, toSectionLeft(part, picker), picker)
}

const pointPopulation: Partial<Record<AnchorKind, Population>> = { peg: 'peg', thread: 'thread' }
const unknownOf: Partial<Record<AnchorKind, string>> = { peg: 'peg_unknown', thread: 'sling_unknown' }

/** The strength of another point on the line of which only kind and condition are known, kN. */
export function toStateStrength(kind: AnchorKind, state: ConditionState, picker: Picker): Mixture {
  const name = state === 'unknown' ? (unknownOf[kind] ?? 'unknown_age') : state
  return mix(pointPopulation[kind] ?? 'expansion', toWeights([name], picker), 1, picker)
}
