import { and, asc, eq, inArray, isNotNull } from 'drizzle-orm'
import { formatPosition } from '~/crags/anchor'
import { visibleCrags } from '~/crags/visible.server'
import type { Queryable, Transaction } from '~/db/client.server'
import { anchors, areas, climbAnchors, climbs, crags } from '~/db/schema/crags'
import { people } from '~/db/schema/people'
import { hazards, reports } from '~/db/schema/reports'
import { Refusal } from '~/db/transaction.server'
import { findMove } from '~/lib/moves'
import type { Viewer } from '~/people/viewer'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { type HazardState, hazardMoves, hazardStateWords } from './hazard'

/**
 * Moves a hazard in the command's transaction and writes the line of record. Refuses, with a sentence naming what it
 * is now, when it stands in none of `from` any more: of two people at once one wins.
 */
export async function moveHazard(
  tx: Transaction,
  act: Act,
  hazardId: string,
  move: { from: readonly HazardState[]; to: HazardState; verb: string; details?: Record<string, unknown> },
): Promise<void> {
  const allowed = move.from.filter(from => findMove(hazardMoves, from, move.to) !== null)
  const [done] = await tx
    .update(hazards)
    .set({
      state: move.to,
      updatedAt: act.now,
      ...(move.to === 'mended' ? { mendedAt: act.now } : {}),
      ...(move.to === 'cleared' ? { clearedAt: act.now } : {}),
      ...(move.to === 'open' ? { mendedAt: null, clearedAt: null, warnedUntil: null } : {}),
    })
    .where(and(eq(hazards.id, hazardId), inArray(hazards.state, allowed)))
  const [row] = await tx
    .select({ state: hazards.state, cragId: hazards.cragId, code: hazards.code })
    .from(hazards)
    .where(eq(hazards.id, hazardId))
    .limit(1)
  if (row === undefined) throw new Refusal('This hazard is no longer on record.')
  if (done.affectedRows === 0)
    throw new Refusal(
      `This hazard is ${hazardStateWords[row.state]} now, so that can no longer be done. Open it again to see what happened.`,
    )
  await writeActivity(tx, act, {
    verb: move.verb,
    subjectKind: 'hazard',
    subjectId: hazardId,
    cragId: row.cragId,
    public: true,
    details: move.details,
  })
}

const columns = {
  id: hazards.id,
  code: hazards.code,
  headline: hazards.headline,
  mode: hazards.mode,
  state: hazards.state,
  openedAt: hazards.openedAt,
  mendedAt: hazards.mendedAt,
  clearedAt: hazards.clearedAt,
  warnedUntil: hazards.warnedUntil,
  ratingId: hazards.ratingId,
  band: hazards.band,
  bandHigh: hazards.bandHigh,
  partId: hazards.partId,
  anchorId: hazards.anchorId,
  anchorCode: anchors.code,
  anchorKind: anchors.kind,
  climbId: hazards.climbId,
  climbCode: climbs.code,
  climbName: climbs.name,
  cragId: crags.id,
  cragCode: crags.code,
  cragName: crags.name,
  areaName: areas.name,
  areaCode: areas.code,
  timeZone: areas.timeZone,
  consent: crags.consent,
  ordinal: climbAnchors.ordinal,
  alongM: climbAnchors.alongM,
}

function selectHazards(db: Queryable) {
  return db
    .select(columns)
    .from(hazards)
    .innerJoin(crags, eq(crags.id, hazards.cragId))
    .innerJoin(areas, eq(areas.id, crags.areaId))
    .leftJoin(anchors, eq(anchors.id, hazards.anchorId))
    .leftJoin(climbs, eq(climbs.id, hazards.climbId))
    .leftJoin(
      climbAnchors,
      and(eq(climbAnchors.climbId, hazards.climbId), eq(climbAnchors.anchorId, hazards.anchorId)),
    )
}

type HazardRow = Awaited<ReturnType<ReturnType<typeof selectHazards>['limit']>>[number]

/** Adds how the place is called on its climb: "Lower-off", "Bolt 3". */
function withPosition(row: HazardRow) {
  const position = row.anchorKind === null ? null : formatPosition(row.anchorKind, row.ordinal ?? 1)
  return { ...row, position }
}

/** The hazard of a code if the viewer may see its crag, with its place in words; else null. */
export async function findHazard(db: Queryable, viewer: Viewer, code: string) {
  const [row] = await selectHazards(db)
    .where(and(eq(hazards.code, code), visibleCrags(viewer)))
    .limit(1)
  return row === undefined ? null : withPosition(row)
}

export type Hazard = NonNullable<Awaited<ReturnType<typeof findHazard>>>

/** The hazards of the given ids with their places, for commands. */
export async function listHazardsById(db: Queryable, ids: string[]): Promise<Hazard[]> {
  if (ids.length === 0) return []
  return (await selectHazards(db).where(inArray(hazards.id, ids)).orderBy(asc(hazards.id)).limit(500)).map(
    withPosition,
  )
}

/** The hazards ever open at a fixed point, newest first. */
export async function listHazardsAt(db: Queryable, anchorIds: string[]): Promise<Hazard[]> {
  if (anchorIds.length === 0) return []
  const rows = await selectHazards(db).where(inArray(hazards.anchorId, anchorIds)).limit(200)
  return rows.map(withPosition).sort((a, b) => b.openedAt.getTime() - a.openedAt.getTime())
}

/** Who told of a hazard and may be written to: an address once each, with the first report it came with. */
export async function listHazardReporters(db: Queryable, hazardId: string) {
  const rows = await db
    .select({
      reportId: reports.id,
      personId: reports.personId,
      name: people.name,
      personEmail: people.email,
      guestEmail: reports.guestEmail,
      confirmedAt: reports.confirmedAt,
    })
    .from(reports)
    .leftJoin(people, eq(people.id, reports.personId))
    .where(and(eq(reports.hazardId, hazardId), isNotNull(reports.confirmedAt)))
    .orderBy(asc(reports.receivedAt))
    .limit(200)
  const told = new Map<
    string,
    { reportId: string; personId: string | null; name: string | null; email: string }
  >()
  for (const row of rows) {
    const email = row.personEmail ?? row.guestEmail
    if (email !== null && !told.has(email))
      told.set(email, { reportId: row.reportId, personId: row.personId, name: row.name, email })
  }
  return [...told.values()]
}
