import { mayCrack } from './cracking'
import type { PartInput, RatingInputs } from './inputs'
import { toDepthShare } from './measure'

/**
 * Share of the bar at which a part is to be discarded: lifting chain 10 % (EN 818-6), connectors 20 % (one maker's
 * advice), rings 25 % to plan and 33 % to replace (common practice).
 */
const discardAt: Partial<Record<PartInput['kind'], number>> = {
  ring: 0.25,
  chain: 0.1,
  connector: 0.2,
  fixed_draw: 0.2,
  quick_link: 0.2,
}

const connectors: readonly PartInput['kind'][] = ['connector', 'fixed_draw']

/** The deepest groove measured on a part as a share of its bar, 0 when none was. */
function toDeepest(part: PartInput): number {
  const depths = part.findings.flatMap(found =>
    found.kind === 'groove' ? (toDepthShare(found, part)?.central ?? []) : [],
  )
  return Math.max(0, ...depths)
}

function toWearFloor(part: PartInput): string | null {
  const guide = discardAt[part.kind]
  const depth = toDeepest(part)
  if (guide !== undefined && depth >= guide - 1e-9) {
    const at = `${Math.round(depth * 100)} % of the bar is worn away`
    if (part.kind === 'ring' && depth < 0.33 - 1e-9) return `${at}; a ring is planned for replacing from 25 %`
    const from = part.kind === 'ring' ? 33 : Math.round(guide * 100)
    return `${at}; such a part is replaced from ${from} %`
  }
  const felt = part.findings.some(({ edge }) => edge === 'felt' || edge === 'sharp' || edge === 'knife')
  return felt && connectors.includes(part.kind)
    ? 'a connector with an edge that a fingernail feels is replaced'
    : null
}

/** Why a point is at least In turn whatever the figure says, in words; empty when nothing holds it up. */
export function listFloors(inputs: RatingInputs): string[] {
  const { kind } = inputs.climb.points[inputs.at]!
  const floors = new Set(inputs.parts.flatMap(part => toWearFloor(part) ?? []))
  if (inputs.parts.some(part => mayCrack(part, inputs.place)))
    floors.add('stainless steel by a warm sea may crack unseen')
  const station = kind === 'lower_off' || kind === 'abseil_station'
  const single = inputs.parts.some(part => part.findings.some(found => found.kind === 'single_point'))
  if (station && single) floors.add('everything hangs on a single point')
  return [...floors]
}
