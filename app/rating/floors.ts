import { toDepthShare } from './edges'
import type { PartInput, RatingInputs } from './inputs'
import { toCracking } from './strength'

/** Discard guides beside a measurement, as a share of the bar: rings 25 % (common practice), chain 10 % (EN 818-6), connectors 20 % (a maker's advice). */
const discardAt = { ring: 0.25, chain: 0.1, connector: 0.2, fixed_draw: 0.2, quick_link: 0.2 } as Partial<
  Record<PartInput['kind'], number>
>

function reachesDiscard(part: PartInput): boolean {
  const guide = discardAt[part.kind]
  if (guide === undefined) return false
  return part.findings.some(found => found.kind === 'groove' && (toDepthShare(found, part) ?? 0) >= guide)
}

/** Why a point is at least In turn whatever the figure says, in words; empty when nothing holds it up. */
export function listFloors(inputs: RatingInputs): string[] {
  const { kind } = inputs.climb.points[inputs.at]!
  const floors: string[] = []
  if (inputs.parts.some(reachesDiscard)) floors.push('the wear has reached the depth at which it is replaced')
  if (inputs.parts.some(part => toCracking(part, inputs.place) !== null))
    floors.push('stainless steel by a warm sea may crack unseen')
  const station = kind === 'lower_off' || kind === 'abseil_station'
  const single = inputs.parts.some(part => part.findings.some(found => found.kind === 'single_point'))
  if (station && single) floors.push('everything hangs on a single point')
  return floors
}
