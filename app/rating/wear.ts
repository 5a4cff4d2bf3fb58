import type { PartInput } from './inputs'
import { type Measure, toDepthShare, toMeasure } from './measure'
import type { Picker } from './picker'

/** The share of a round bar's section lost to a flat groove of depth h in a bar of diameter d (a circle's segment). */
export function toSegmentLoss(h: number, d: number): number {
  const r = d / 2
  if (h <= 0) return 0
  if (h >= d) return 1
  const area = r * r * Math.acos((r - h) / r) - (r - h) * Math.sqrt(2 * r * h - h * h)
  return area / (Math.PI * r * r)
}

/** The share lost when what is left is a circle of the remaining thickness: 1 − (1 − h/d)², the cautious end. */
export function toReducedCircleLoss(h: number, d: number): number {
  return 1 - Math.max(0, 1 - h / d) ** 2
}

/** A groove whose depth nobody gave may be anything up to a third of the bar, where rings are replaced. */
const unmeasured: Measure = { low: 0, central: 0, high: 1 / 3 }

/**
 * How much of a part's section is left, 0 to 1: at a groove central by the segment and cautious by the reduced circle,
 * the depth itself within what was measured; lost section as it was told. The least of several findings.
 */
export function toSectionLeft(part: PartInput, picker: Picker): number {
  let left = 1
  for (const found of part.findings) {
    if (found.kind === 'section_lost') {
      const lost = found.unit === 'percent' ? toMeasure(found) : null
      const share = lost && { low: lost.low / 100, central: lost.central / 100, high: lost.high / 100 }
      left = Math.min(left, 1 - picker.pickBetween('measure.section', share ?? unmeasured))
    } else if (found.kind === 'groove') {
      const depth = picker.pickBetween('measure.depth', toDepthShare(found, part) ?? unmeasured)
      const segment = toSegmentLoss(depth, 1)
      const lost = { low: segment, central: segment, high: toReducedCircleLoss(depth, 1) }
      left = Math.min(left, 1 - picker.pickBetween('section.model', lost))
    }
  }
  return Math.max(left, 0.01)
}
