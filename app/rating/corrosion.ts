import type { Corrosivity } from '~/crags/crag'
import type { PartInput, RatingInputs } from './inputs'

/** Metals of ISO 9224 with the exponent b of its table 3 (B1). */
export const corrosionExponents = { steel: 0.523, zinc: 0.813, copper: 0.667, aluminium: 0.728 } as const

/** Upper first-year losses by corrosivity, µm. ISO 9223:2012, table 2. */
export const firstYearLoss: Record<'steel', Record<Corrosivity, number>> &
  Record<'zinc', Record<Exclude<Corrosivity, 'CX'>, number>> = {
  steel: { C1: 1.3, C2: 25, C3: 50, C4: 80, C5: 200, CX: 700 },
  zinc: { C1: 0.1, C2: 0.7, C3: 2.1, C4: 4.2, C5: 8.4 },
}

/**
 * Uniform loss in µm after t years from the first year's rate r (µm): r t^b up to 20 years, then on the tangent there.
 * ISO 9224:2012. It says nothing of pitting, nor of stainless steel.
 */
export function toUniformLoss(rate: number, years: number, b: number): number {
  if (years <= 20) return rate * years ** b
  return rate * (20 ** b + b * 20 ** (b - 1) * (years - 20))
}

/** The corrosivity of a place: as recorded, else by its distance from the sea (words of ISO 9223, annex C). */
function toCorrosivity(place: RatingInputs['place']): Corrosivity {
  if (place.corrosivity !== null) return place.corrosivity
  if (place.seaKm === null) return 'C3'
  return place.seaKm <= 0.5 ? 'C5' : place.seaKm <= 5 ? 'C4' : 'C3'
}

/** Self-drilled bolts are rarely younger where nobody knows their age. */
const unknownYears = 25

/** The share of a 10 mm bolt's section that a uniform loss in µm takes, all round. */
const toSectionShare = (loss: number) => 1 - Math.max(0, 1 - loss / 5000) ** 2

/** The age to reckon with: of a self-drilled bolt an old one where nobody knows, of others only what is known. */
function toRustingYears(part: PartInput): number | null {
  const isDrilled = part.kind === 'self_drilled' || part.kind === 'drive_in'
  if (isDrilled && (part.material === 'unknown' || part.material === 'steel'))
    return part.ageYears ?? unknownYears
  if (part.material !== 'plated_steel') return null
  return isDrilled ? (part.ageYears ?? unknownYears) : part.ageYears
}

/**
 * The rust grade to reckon with on plated steel that nobody has found sound, from place and age: 5 where a fifth of a
 * 10 mm bolt's section is expected to be gone, 4 from a tenth, null below and for other metals. Thresholds are a judgement.
 */
export function toExpectedRust(part: PartInput, place: RatingInputs['place']): 4 | 5 | null {
  const years = toRustingYears(part)
  if (years === null) return null
  const steel = firstYearLoss.steel[toCorrosivity(place)]
  const gone = toSectionShare(toUniformLoss(steel, years, corrosionExponents.steel))
  if (gone >= 1 / 5) return 5
  return gone >= 1 / 10 ? 4 : null
}
