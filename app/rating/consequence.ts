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

/** Metres the tie-in stands above the feet, for drawing; a rating takes it from its model. */
const usualFeet = 1

/** What a falling climber may meet, highest first, and what holds when every bolt has failed. */
export interface Terrain {
  /** metres of ledges and of the ground at 0 */
  hard: readonly number[]
  /** metres of the belay that catches last, on a pitch that starts at a stance; null where nothing does */
  belay: number | null
  /** metres of the feet below the tie-in */
  feet: number
}

/** The terrain of a line: its ledges, and the ground, sea, stance or ledge at its foot unless there is only air. */
export function toTerrain(
  line: Pick<RatedLine, 'ledges' | 'below' | 'start'>,
  feet: number = usualFeet,
): Terrain {
  const ledges = line.ledges.map(({ atM }) => atM).filter(at => at > 0)
  const hard = line.below === 'air' ? ledges : [...ledges, 0]
  return { hard: hard.sort((a, b) => b - a), belay: line.start === 'stance' ? 0 : null, feet }
}

/** One class milder. */
function milder(of: ConsequenceClass): ConsequenceClass {
  return consequenceClasses[Math.max(0, consequenceClasses.indexOf(of) - 1)]!
}

/** A fall onto ground or a ledge whose feet fell so many metres. */
function onHard(metres: number): ConsequenceClass {
  if (metres >= 3) return 'ground'
  return metres >= 1 ? 'low' : 'long'
}

/** What feet falling from one height to another meet first, in metres; null in free air. */
function meets({ hard }: Terrain, fromFeet: number, toFeet: number): number | null {
  // asked some ten thousand times a rating: an index walks faster than an iterator
  const from = Math.max(fromFeet, 1e-9)
  for (let i = 0; i < hard.length; i++) {
    const at = hard[i]!
    if (at < from && at >= toFeet) return at
  }
  return null
}

/** Where the tie-in comes to rest when a point at `held` metres catches a fall from `y`; `give` is slack and stretch. */
function restsAt(held: number, y: number, give: number): number {
  return held - Math.abs(y - held) - give
}

/** A fall that somebody or something catches so many metres further down; further than any catch counts as the ground. */
function toCaught(further: number): ConsequenceClass {
  if (further < 3) return 'short'
  if (further <= 8) return 'long'
  return Number.isFinite(further) ? 'low' : 'ground'
}

/**
 * What follows when the point at `at` fails in a fall from tie-in height `y` and the point at `caughtAt` (null: none)
 * catches; metres. Counted one class lower where a sound point would not have kept the climber off the ground either.
 */
export function toConsequence(
  terrain: Terrain,
  fall: { y: number; at: number; caughtAt: number | null; give: number },
): ConsequenceClass {
  const { y, at, give } = fall
  const { feet } = terrain
  const from = y - feet
  const caughtAt = fall.caughtAt ?? terrain.belay
  const rest = caughtAt === null ? Number.NEGATIVE_INFINITY : restsAt(caughtAt, y, give)
  const hit = meets(terrain, from, rest - feet)
  if (hit === null) return toCaught(caughtAt === null ? Number.POSITIVE_INFINITY : 2 * (at - caughtAt))
  const hard = onHard(from - hit)
  const anyway = meets(terrain, from, restsAt(at, y, give) - feet)
  return anyway === hit ? milder(hard) : hard
}

/** What a cut rope, which nothing catches, leads to from a tie-in at `y`; free air below counts as the ground. */
export function toUncaught(terrain: Terrain, y: number): ConsequenceClass {
  const from = y - terrain.feet
  const hit = meets(terrain, from, Number.NEGATIVE_INFINITY)
  return hit === null ? 'ground' : onHard(from - hit)
}

/** What the failure of a lower-off or belay leads to, `height` metres up: the ground from 3 m, by the fall's length below. */
export function toStationConsequence(terrain: Terrain, height: number): ConsequenceClass {
  return height > 3 || terrain.hard.at(-1) !== 0 ? 'ground' : onHard(height)
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
  const tenths = Math.floor(line.lengthM * 10 + 1e-9)
  const heights = line.points.map(point => point.alongM).sort((a, b) => a - b)
  const terrain = toTerrain(line)
  const zones: GroundZone[] = []
  for (let tenth = 1; tenth <= tenths; tenth++) {
    const y = tenth / 10
    const below = heights.filter(height => height < y)
    const kind = toZone(terrain, y, below.at(-1), below.at(-2))
    if (kind === null) continue
    const last = zones.at(-1)
    if (last?.kind === kind && last.toM === (tenth - 1) / 10) last.toM = y
    else zones.push({ fromM: (tenth - 1) / 10, toM: y, kind })
  }
  return zones
}

function toZone(terrain: Terrain, y: number, held: number | undefined, next: number | undefined) {
  const lands = (catching: number | undefined) => {
    const at = catching ?? terrain.belay
    const rest = at === null ? Number.NEGATIVE_INFINITY : restsAt(at, y, usualGive(y))
    return meets(terrain, y - terrain.feet, rest - terrain.feet) !== null
  }
  if (lands(held)) return 'anyway' as const
  return lands(next) ? ('hatched' as const) : null
}
