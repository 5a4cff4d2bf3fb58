import type { FindingInput, PartInput } from './inputs'

/** A measure between two ends with the value to reckon with. */
export interface Measure {
  low: number
  central: number
  high: number
}

/** What people gave as low and high, and its middle; null when nobody measured. */
export function toMeasure({ low, high }: Pick<FindingInput, 'low' | 'high'>): Measure | null {
  if (low === null && high === null) return null
  const [from, to] = [low ?? high!, high ?? low!]
  return { low: Math.min(from, to), central: (from + to) / 2, high: Math.max(from, to) }
}

/** Bar diameters in mm that are usual where nobody measured (common practice). */
const usualBar: Partial<Record<PartInput['kind'], number>> = {
  chain: 8,
  quick_link: 8,
  cable: 8,
  fixed_draw: 11,
}

/**
 * How deep a groove is as a share of the bar, 0 to 1; null when nobody gave a depth. A bar nobody measured counts as the
 * usual one of its kind.
 */
export function toDepthShare(found: FindingInput, part: Pick<PartInput, 'kind' | 'sizeMm'>): Measure | null {
  const measure = toMeasure(found)
  if (measure === null) return null
  const whole = found.unit === 'percent' ? 100 : (part.sizeMm ?? usualBar[part.kind] ?? 10)
  const share = (value: number) => Math.min(1, Math.max(0, value / whole))
  return { low: share(measure.low), central: share(measure.central), high: share(measure.high) }
}

/** An ISO 4628-3 grade of rust, 0 to 5, or the middle one when it was only called rust. */
export function toRustGrade(found: FindingInput): number {
  return Math.min(5, Math.max(0, Math.round(toMeasure(found)?.central ?? 3)))
}
