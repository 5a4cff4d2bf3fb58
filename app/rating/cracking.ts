import type { PartKind } from '~/crags/part'
import type { PartInput, RatingInputs } from './inputs'
import { toRustGrade } from './measure'

/** Hidden cracking of stainless steel by a warm sea: by what was seen, and what is known of the place. */
export type Cracking = 'possible' | 'spots' | 'known'

const fabric: readonly PartKind[] = ['sling', 'cord', 'thread']
const fabricFindings = ['fabric_faded', 'fabric_stiff']

/** Whether a part is of fabric, or it is the fabric of a draw that something was found on. */
export function isOfFabric(part: PartInput): boolean {
  if (part.material === 'fabric' || fabric.includes(part.kind)) return true
  return part.kind === 'fixed_draw' && part.findings.some(({ kind }) => fabricFindings.includes(kind))
}

/** Glue-in eyes and staples are of stainless steel where nobody says otherwise (common practice). */
const usuallyStainless: readonly PartKind[] = ['bonded_eye', 'bonded_staple']
/** Parts that are never of stainless steel, or of no steel at all. */
const neverStainless: readonly PartKind[] = ['self_drilled', 'drive_in', 'peg', 'resin', 'cable']

/** Whether a part is of the stainless steel that may crack: yes, no, or nobody knows. */
export function isStainless(part: PartInput): boolean | 'unknown' {
  if (part.material === 'stainless') return true
  if (part.material !== 'unknown' || isOfFabric(part) || neverStainless.includes(part.kind)) return false
  return usuallyStainless.includes(part.kind) ? true : 'unknown'
}

/** The cracking to reckon with if the part is of stainless steel; null away from a warm sea. */
export function toCracking(part: PartInput, place: RatingInputs['place']): Cracking | null {
  if (!place.warmSea) return null
  if (part.findings.some(found => found.kind === 'known_failures')) return 'known'
  return part.findings.some(found => found.kind === 'rust' && toRustGrade(found) >= 1) ? 'spots' : 'possible'
}

/** Whether hidden cracking is possible in a part that is, or may be taken to be, of stainless steel. */
export function mayCrack(part: PartInput, place: RatingInputs['place']): boolean {
  return isStainless(part) === true && toCracking(part, place) !== null
}
