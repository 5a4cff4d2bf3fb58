import { and, eq, inArray, isNull, or, type SQL, sql } from 'drizzle-orm'
import type { Queryable } from './client.server'
import { climbAnchors, climbs, sectors } from './schema/crags'
import { noticeHazards, noticePlaces, noticeRevisions, notices } from './schema/notices'
import { hazards } from './schema/reports'

/**
 * The condition that a notice is in force at a moment, over `notices` joined to its newest revision: published, begun,
 * and not ended; a first warning also stands past its end while one of its hazards is open.
 */
export function isInForceAt(now: Date): SQL {
  const openHazard = sql`exists (select 1 from ${noticeHazards} join ${hazards} on ${hazards.id} = ${noticeHazards.hazardId} where ${noticeHazards.noticeId} = ${notices.id} and ${hazards.state} in ('open', 'warned'))`
  return and(
    eq(notices.state, 'published'),
    sql`${noticeRevisions.startsAt} <= ${now}`,
    or(
      isNull(noticeRevisions.endsAt),
      sql`${noticeRevisions.endsAt} > ${now}`,
      and(eq(noticeRevisions.whileOpen, true), openHazard),
    ),
  )!
}

/** Joins a notice to the revision that holds. */
export const holdingRevision = and(
  eq(noticeRevisions.noticeId, notices.id),
  eq(noticeRevisions.number, notices.revision),
)!

/** Which of some places a notice in force touches: ids of notices by anchor, climb and crag. */
export interface InForce {
  anchors: Map<string, Set<string>>
  climbs: Map<string, Set<string>>
  crags: Map<string, Set<string>>
}

const add = (map: Map<string, Set<string>>, key: string, id: string) =>
  map.set(key, (map.get(key) ?? new Set()).add(id))

function selectPlaces(db: Queryable, now: Date, of: SQL) {
  return db
    .select({
      noticeId: notices.id,
      anchorId: noticePlaces.anchorId,
      climbId: noticePlaces.climbId,
      cragId: noticePlaces.cragId,
    })
    .from(notices)
    .innerJoin(noticeRevisions, holdingRevision)
    .innerJoin(noticePlaces, eq(noticePlaces.noticeId, notices.id))
    .where(and(isInForceAt(now), of))
}

/**
 * The notices in force on the given fixed points; on the given climbs or any point of theirs; on the given crags or
 * anything in them.
 */
export async function listNoticesInForce(
  db: Queryable,
  given: { anchorIds?: string[]; climbIds?: string[]; cragIds?: string[]; now: Date },
): Promise<InForce> {
  const found: InForce = { anchors: new Map(), climbs: new Map(), crags: new Map() }
  const { anchorIds = [], climbIds = [], cragIds = [], now } = given
  if (anchorIds.length > 0)
    for (const row of await selectPlaces(db, now, inArray(noticePlaces.anchorId, anchorIds)))
      add(found.anchors, row.anchorId!, row.noticeId)
  for (const climbId of climbIds) {
    const points = db
      .select({ id: climbAnchors.anchorId })
      .from(climbAnchors)
      .where(eq(climbAnchors.climbId, climbId))
    const of = or(eq(noticePlaces.climbId, climbId), inArray(noticePlaces.anchorId, points))!
    for (const row of await selectPlaces(db, now, of)) add(found.climbs, climbId, row.noticeId)
  }
  for (const cragId of cragIds)
    for (const row of await selectPlaces(db, now, isAtCrag(cragId))) add(found.crags, cragId, row.noticeId)
  return found
}

/** The condition that a notice's place lies at a crag: the crag itself, a sector, a climb or a fixed point of it. */
export function isAtCrag(cragId: string): SQL {
  return or(
    eq(noticePlaces.cragId, cragId),
    sql`${noticePlaces.sectorId} in (select ${sectors.id} from ${sectors} where ${sectors.cragId} = ${cragId})`,
    sql`${noticePlaces.climbId} in (select ${climbs.id} from ${climbs} join ${sectors} on ${sectors.id} = ${climbs.sectorId} where ${sectors.cragId} = ${cragId})`,
    sql`${noticePlaces.anchorId} in (select id from anchors where crag_id = ${cragId})`,
  )!
}
