import type { RatedLine } from './inputs'

/** What a failure leads to, mildest first. */
export const consequenceClasses = ['short', 'long', 'low', 'ground'] as const
export type ConsequenceClass = (typeof consequenceClasses)[number]

/** How much each counts in the one figure. */
export const consequenceWeights: Record<ConsequenceClass, number> = {
  ground: 1,
  low: 0.1,
  long: 0.01,
  short: 0.001,
}

/** Metres the tie-in stands above the feet. */
const feet = 1

/** One class milder. */
export function milder(of: ConsequenceClass): ConsequenceClass {
  return consequenceClasses[Math.max(0, consequenceClasses.indexOf(of) - 1)]!
}

/** A fall onto ground or a ledge whose feet fell so many metres. */
function onHard(metres: number): ConsequenceClass {
  if (metres >= 3) return 'ground'
  return metres >= 1 ? 'low' : 'long'
}

/** The ledge, or the ground at 0, that feet falling from one height to another meet first; null in free air. */
function meets(line: RatedLine, fromFeet: number, toFeet: number): number | null {
  const ledge = line.ledges
    .map(({ atM }) => atM)
    .filter(at => at < fromFeet && at > toFeet)
    .sort((a, b) => b - a)[0]
  if (ledge !== undefined) return ledge
  return line.below !== 'air' && toFeet <= 0 ? 0 : null
}

/** Where the tie-in comes to rest when a point at `held` metres catches a fall from `y`; `give` is slack and stretch. */
function restsAt(held: number, y: number, give: number): number {
  return held - Math.abs(y - held) - give
}

/** What happens when the point below catches (`caughtAt`), or nothing does (null), after the point at `at` has failed. */
export function toConsequence(
  line: RatedLine,
  fall: { y: number; at: number; caughtAt: number | null; give: number },
): ConsequenceClass {
  const { y, at, caughtAt, give } = fall
  const from = y - feet
  const rest = caughtAt === null ? Number.NEGATIVE_INFINITY : restsAt(caughtAt, y, give)
  const hit = meets(line, from, rest - feet)
  if (hit === null) return toCaught(caughtAt === null ? Number.POSITIVE_INFINITY : 2 * (at - caughtAt))
  const kept = meets(line, from, restsAt(at, y, give) - feet)
  const hard = onHard(from - hit)
  return kept === hit ? milder(hard) : hard
}

function toCaught(further: number): ConsequenceClass {
  if (further < 3) return 'short'
  return further <= 8 ? 'long' : 'low'
}

/** What a cut, after which nothing catches, leads to from a tie-in at `y`. */
export function toUncaught(line: RatedLine, y: number): ConsequenceClass {
  const hit = meets(line, y - feet, Number.NEGATIVE_INFINITY)
  return hit === null ? 'low' : onHard(y - feet - hit)
}

export interface GroundZone {
  fromM: number
  toM: number
  kind: 'hatched' | 'anyway'
}

/** Slack and stretch of a usual fall, for drawing. */
const usualGive = (y: number) => 0.6 + 0.08 * y

/**
 * The stretches of the line from which a fall reaches ground or ledge: `hatched` where only a failure of the bolt below
 * lets it, `anyway` where it does even though the bolt holds. Metres of the tie-in, merged, lowest first.
 */
export function groundZones(line: RatedLine): GroundZone[] {
  const step = 0.1
  const heights = line.points.map(point => point.alongM).sort((a, b) => a - b)
  const zones: GroundZone[] = []
  for (let y = step; y <= line.lengthM + 1e-9; y += step) {
    const below = heights.filter(height => height < y)
    const kind = toZone(line, y, below.at(-1), below.at(-2))
    if (kind === null) continue
    const last = zones.at(-1)
    if (last?.kind === kind && y - last.toM < 1.5 * step) last.toM = round(y)
    else zones.push({ fromM: round(y - step), toM: round(y), kind })
  }
  return zones
}

const round = (metres: number) => Math.round(metres * 10) / 10

function toZone(line: RatedLine, y: number, held: number | undefined, next: number | undefined) {
  const lands = (catching: number | undefined) =>
    meets(
      line,
      y - feet,
      catching === undefined ? Number.NEGATIVE_INFINITY : restsAt(catching, y, usualGive(y)) - feet,
    )
  if (lands(held) !== null) return 'anyway' as const
  return lands(next) !== null ? ('hatched' as const) : null
}
