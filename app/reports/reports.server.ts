import { and, desc, eq, inArray } from 'drizzle-orm'
import { formatPosition } from '~/crags/anchor'
import { visibleCrags } from '~/crags/visible.server'
import type { Queryable } from '~/db/client.server'
import { anchors, areas, climbAnchors, climbs, crags } from '~/db/schema/crags'
import { people } from '~/db/schema/people'
import { hazards, reports } from '~/db/schema/reports'
import type { Viewer } from '~/people/viewer'

const columns = {
  id: reports.id,
  state: reports.state,
  reason: reports.reason,
  seenOn: reports.seenOn,
  receivedAt: reports.receivedAt,
  howSeen: reports.howSeen,
  words: reports.words,
  isCheck: reports.isCheck,
  personId: reports.personId,
  personName: people.name,
  personEmail: people.email,
  guestEmail: reports.guestEmail,
  confirmedAt: reports.confirmedAt,
  ratingId: reports.ratingId,
  band: reports.band,
  bandHigh: reports.bandHigh,
  decidedAt: reports.decidedAt,
  anchorId: reports.anchorId,
  anchorCode: anchors.code,
  anchorKind: anchors.kind,
  ordinal: climbAnchors.ordinal,
  climbId: reports.climbId,
  climbCode: climbs.code,
  climbName: climbs.name,
  cragId: crags.id,
  cragCode: crags.code,
  cragName: crags.name,
  areaName: areas.name,
  timeZone: areas.timeZone,
  hazardId: reports.hazardId,
  hazardCode: hazards.code,
  hazardState: hazards.state,
}

function selectReports(db: Queryable) {
  return db
    .select(columns)
    .from(reports)
    .innerJoin(crags, eq(crags.id, reports.cragId))
    .innerJoin(areas, eq(areas.id, crags.areaId))
    .leftJoin(climbs, eq(climbs.id, reports.climbId))
    .leftJoin(anchors, eq(anchors.id, reports.anchorId))
    .leftJoin(
      climbAnchors,
      and(eq(climbAnchors.climbId, reports.climbId), eq(climbAnchors.anchorId, reports.anchorId)),
    )
    .leftJoin(people, eq(people.id, reports.personId))
    .leftJoin(hazards, eq(hazards.id, reports.hazardId))
}

type ReportRow = Awaited<ReturnType<ReturnType<typeof selectReports>['limit']>>[number]

const withPosition = (row: ReportRow) => ({
  ...row,
  position: row.anchorKind === null ? null : formatPosition(row.anchorKind, row.ordinal ?? 1),
})

/** The report of an id if the viewer may see its crag; the route asks whether it may be read. Else null. */
export async function findReport(db: Queryable, viewer: Viewer, id: string) {
  const [row] = await selectReports(db)
    .where(and(eq(reports.id, id), visibleCrags(viewer)))
    .limit(1)
  return row === undefined ? null : withPosition(row)
}

export type Report = NonNullable<Awaited<ReturnType<typeof findReport>>>

/** The report of an id for its private page, whoever opens it: the caller has proved the link. Else null. */
export async function findReportById(db: Queryable, id: string): Promise<Report | null> {
  const [report] = await selectReports(db).where(eq(reports.id, id)).limit(1)
  return report === undefined ? null : withPosition(report)
}

/** The reports of a hazard, newest first. */
export async function listReportsOf(db: Queryable, hazardId: string): Promise<Report[]> {
  const rows = await selectReports(db)
    .where(eq(reports.hazardId, hazardId))
    .orderBy(desc(reports.receivedAt))
    .limit(100)
  return rows.map(withPosition)
}

/** What counts at the given fixed points: reports taken in or on record and checks, newest first. */
export async function listStandingReports(db: Queryable, anchorIds: string[]): Promise<Report[]> {
  if (anchorIds.length === 0) return []
  const rows = await selectReports(db)
    .where(and(inArray(reports.anchorId, anchorIds), inArray(reports.state, ['taken_in', 'on_record'])))
    .orderBy(desc(reports.seenOn), desc(reports.receivedAt))
    .limit(300)
  return rows.map(withPosition)
}
