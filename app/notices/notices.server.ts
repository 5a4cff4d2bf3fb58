import { and, asc, desc, eq, inArray, or, type SQL, sql } from 'drizzle-orm'
import { visibleCrags } from '~/crags/visible.server'
import type { Queryable } from '~/db/client.server'
import { holdingRevision, isAtCrag, isInForceAt } from '~/db/notices-in-force'
import { anchors, areas, climbAnchors, climbs, crags } from '~/db/schema/crags'
import { noticeHazards, noticePlaces, noticeRevisions, notices } from '~/db/schema/notices'
import { organisations } from '~/db/schema/people'
import { hazards } from '~/db/schema/reports'
import type { Viewer } from '~/people/viewer'
import type { NoticeKind } from './notice'

const columns = {
  id: notices.id,
  code: notices.code,
  kind: notices.kind,
  state: notices.state,
  revision: notices.revision,
  decidedByWords: notices.decidedByWords,
  ground: notices.ground,
  reviewOn: notices.reviewOn,
  publishedBy: notices.publishedBy,
  publishedAt: notices.publishedAt,
  confirmedAt: notices.confirmedAt,
  withdrawnAt: notices.withdrawnAt,
  askedAt: notices.askedAt,
  organisationId: notices.organisationId,
  organisation: organisations.name,
  headline: noticeRevisions.headline,
  words: noticeRevisions.words,
  lang: noticeRevisions.lang,
  startsAt: noticeRevisions.startsAt,
  endsAt: noticeRevisions.endsAt,
  cragId: crags.id,
  cragCode: crags.code,
  cragName: crags.name,
  timeZone: areas.timeZone,
  climbCode: climbs.code,
  climbName: climbs.name,
  anchorId: anchors.id,
  anchorCode: anchors.code,
  whileOpen: noticeRevisions.whileOpen,
}

/** A notice with its holding revision and its one place; the crag is found through whatever the place is. */
function selectNotices(db: Queryable) {
  const cragOf = sql`coalesce(${noticePlaces.cragId}, ${anchors.cragId}, (select crag_id from sectors where sectors.id = ${climbs.sectorId}))`
  return db
    .select(columns)
    .from(notices)
    .innerJoin(noticeRevisions, holdingRevision)
    .innerJoin(organisations, eq(organisations.id, notices.organisationId))
    .innerJoin(noticePlaces, eq(noticePlaces.noticeId, notices.id))
    .leftJoin(climbs, eq(climbs.id, noticePlaces.climbId))
    .leftJoin(anchors, eq(anchors.id, noticePlaces.anchorId))
    .innerJoin(crags, sql`${crags.id} = ${cragOf}`)
    .innerJoin(areas, eq(areas.id, crags.areaId))
}

type NoticeRow = Awaited<ReturnType<ReturnType<typeof selectNotices>['limit']>>[number]
/** A notice as anybody may read it: whose organisation, never which person. */
export type ShownNotice = Omit<NoticeRow, 'publishedBy'>

/** Strongest first: what the law and the owner say, then please do not climb, hazards, first warnings, works. */
const strength = [
  'closed_in_law',
  'owner_forbids',
  'please_do_not_climb',
  'hazard',
  'first_warning',
  'works',
] as const satisfies readonly NoticeKind[]

const byStrength = sql`field(${notices.kind}, ${sql.join(
  strength.map(kind => sql`${kind}`),
  sql`, `,
)})`

/** The place asked about, as a condition on `notice_places`; everywhere when nothing is asked. */
function atPlace(given: { cragId?: string; climbId?: string; anchorIds?: string[] }): SQL | undefined {
  const { cragId, climbId, anchorIds = [] } = given
  const points =
    climbId === undefined
      ? undefined
      : sql`(select ${climbAnchors.anchorId} from ${climbAnchors} where ${climbAnchors.climbId} = ${climbId})`
  return or(
    cragId === undefined ? undefined : isAtCrag(cragId),
    climbId === undefined ? undefined : eq(noticePlaces.climbId, climbId),
    points === undefined ? undefined : sql`${noticePlaces.anchorId} in ${points}`,
    anchorIds.length === 0 ? undefined : inArray(noticePlaces.anchorId, anchorIds),
  )
}

/** The most notices that one page shows. */
export const mostNotices = 200

/**
 * The notices in force that a viewer may see, strongest first, then newest, at most `limit`: of a crag and everything
 * in it, of a climb and its points, of fixed points, or all.
 */
export async function noticesInForce(
  db: Queryable,
  viewer: Viewer,
  given: { now: Date; cragId?: string; climbId?: string; anchorIds?: string[]; limit?: number },
): Promise<ShownNotice[]> {
  const rows = await selectNotices(db)
    .where(and(isInForceAt(given.now), visibleCrags(viewer), atPlace(given)))
    .orderBy(byStrength, desc(notices.publishedAt), desc(notices.id))
    .limit(given.limit ?? mostNotices)
  return [...new Map(rows.map(({ publishedBy: _, ...row }) => [row.id, row])).values()]
}

/** The notice of a code if the viewer may see its crag (drafts are nobody's here), else null. */
export async function findNotice(db: Queryable, viewer: Viewer, code: string): Promise<NoticeRow | null> {
  const [row] = await selectNotices(db)
    .where(
      and(eq(notices.code, code), visibleCrags(viewer), inArray(notices.state, ['published', 'withdrawn'])),
    )
    .limit(1)
  return row ?? null
}

/** The hazards a notice is about, and whether each is open or warned of. */
export async function listHazardsOf(db: Queryable, noticeId: string) {
  const rows = await db
    .select({ code: hazards.code, state: hazards.state })
    .from(noticeHazards)
    .innerJoin(hazards, eq(hazards.id, noticeHazards.hazardId))
    .where(eq(noticeHazards.noticeId, noticeId))
    .orderBy(asc(hazards.code))
    .limit(50)
  return rows.map(row => ({ code: row.code, open: row.state === 'open' || row.state === 'warned' }))
}

/** Every wording a notice has had, newest first. */
export async function listRevisions(db: Queryable, noticeId: string) {
  return await db
    .select({
      number: noticeRevisions.number,
      headline: noticeRevisions.headline,
      words: noticeRevisions.words,
      at: noticeRevisions.at,
      endsAt: noticeRevisions.endsAt,
    })
    .from(noticeRevisions)
    .where(eq(noticeRevisions.noticeId, noticeId))
    .orderBy(desc(noticeRevisions.number))
    .limit(50)
}
