import { and, count, desc, eq, inArray, sql } from 'drizzle-orm'
import { unionAll } from 'drizzle-orm/mysql-core'
import { formatPosition } from '~/crags/anchor'
import { listPlacedAnchors } from '~/crags/climbs.server'
import type { Queryable } from '~/db/client.server'
import { anchors, climbAnchors, climbs, cragOrganisations, crags } from '~/db/schema/crags'
import { ratings } from '~/db/schema/rating'
import { hazards, reports } from '~/db/schema/reports'
import { orderHazards, orders } from '~/db/schema/work'
import { groupBy } from '~/lib/group-by'
import { rules } from '~/people/permission'
import type { Viewer } from '~/people/viewer'
import { formatFinding } from './finding-words'
import { listFindings } from './findings.server'
import { dangerousStates, type HazardState } from './hazard'
import type { Judgement } from './judgement'
import type { ReportState } from './report'

/** The crags whose urgency the viewer may see: their organisation looks after them and their role covers it. */
function listMine(viewer: Viewer): string[] {
  const rule = rules['urgency:see']
  if (rule.to !== 'roles') return []
  return viewer.memberships
    .filter(membership => membership.roles.some(role => rule.roles.includes(role)))
    .map(membership => membership.organisationId)
}

const rows = 50

async function listSorted(db: Queryable, mine: string[]) {
  const cragIds = db
    .select({ id: cragOrganisations.cragId })
    .from(cragOrganisations)
    .where(inArray(cragOrganisations.organisationId, mine))
  const open = db
    .select({
      kind: sql<'report' | 'hazard'>`'hazard'`.as('kind'),
      id: hazards.id,
      sort: hazards.urgencySort,
    })
    .from(hazards)
    .where(and(inArray(hazards.cragId, cragIds), inArray(hazards.state, dangerousStates)))
  const fresh = db
    .select({
      kind: sql<'report' | 'hazard'>`'report'`.as('kind'),
      id: reports.id,
      sort: reports.urgencySort,
    })
    .from(reports)
    .where(and(inArray(reports.cragId, cragIds), inArray(reports.state, ['received', 'needs_detail'])))
  return await unionAll(open, fresh).orderBy(sql`urgency_sort desc, id`).limit(rows)
}

const placed = {
  anchorId: anchors.id,
  anchorCode: anchors.code,
  anchorKind: anchors.kind,
  ordinal: climbAnchors.ordinal,
  climbId: climbs.id,
  climbCode: climbs.code,
  climbName: climbs.name,
  cragName: crags.name,
}

function selectHazards(db: Queryable, ids: string[]) {
  return db
    .select({
      ...placed,
      id: hazards.id,
      code: hazards.code,
      state: hazards.state,
      headline: hazards.headline,
      band: hazards.band,
      bandHigh: hazards.bandHigh,
      results: ratings.results,
    })
    .from(hazards)
    .innerJoin(crags, eq(crags.id, hazards.cragId))
    .leftJoin(climbs, eq(climbs.id, hazards.climbId))
    .leftJoin(anchors, eq(anchors.id, hazards.anchorId))
    .leftJoin(
      climbAnchors,
      and(eq(climbAnchors.climbId, hazards.climbId), eq(climbAnchors.anchorId, hazards.anchorId)),
    )
    .leftJoin(ratings, eq(ratings.id, hazards.ratingId))
    .where(inArray(hazards.id, ids))
}

function selectReports(db: Queryable, ids: string[]) {
  return db
    .select({
      ...placed,
      id: reports.id,
      state: reports.state,
      band: reports.band,
      bandHigh: reports.bandHigh,
      receivedAt: reports.receivedAt,
      seenOn: reports.seenOn,
      confirmedAt: reports.confirmedAt,
      results: ratings.results,
    })
    .from(reports)
    .innerJoin(crags, eq(crags.id, reports.cragId))
    .leftJoin(climbs, eq(climbs.id, reports.climbId))
    .leftJoin(anchors, eq(anchors.id, reports.anchorId))
    .leftJoin(
      climbAnchors,
      and(eq(climbAnchors.climbId, reports.climbId), eq(climbAnchors.anchorId, reports.anchorId)),
    )
    .leftJoin(ratings, eq(ratings.id, reports.ratingId))
    .where(inArray(reports.id, ids))
}

/** How many people saw each hazard and when last, and the order that stands for it. */
async function listSeenAndOrders(db: Queryable, ids: string[]) {
  if (ids.length === 0) return { seen: new Map(), ordered: new Map() }
  const seen = await db
    .select({
      hazardId: reports.hazardId,
      people: count(),
      last: sql<string>`date_format(max(${reports.seenOn}), '%Y-%m-%d')`,
    })
    .from(reports)
    .where(inArray(reports.hazardId, ids))
    .groupBy(reports.hazardId)
  const ordered = await db
    .select({ hazardId: orderHazards.hazardId, code: orders.code, state: orders.state })
    .from(orderHazards)
    .innerJoin(orders, eq(orders.id, orderHazards.orderId))
    .where(and(inArray(orderHazards.hazardId, ids), sql`${orders.state} <> 'cancelled'`))
    .orderBy(desc(orders.createdAt))
  return {
    seen: new Map(seen.map(row => [row.hazardId!, row])),
    ordered: new Map(ordered.reverse().map(row => [row.hazardId, row])),
  }
}

export type DangerRow = Awaited<ReturnType<typeof listDanger>>[number]

/**
 * New reports and open hazards of the viewer's organisations in one list, most dangerous first: at most fifty rows,
 * each with its place, what is wrong, its line, urgency with range, who saw it and the order that stands.
 */
export async function listDanger(db: Queryable, viewer: Viewer, today: string) {
  const mine = listMine(viewer)
  if (mine.length === 0) return []
  const sorted = await listSorted(db, mine)
  const ids = (kind: 'report' | 'hazard') => sorted.filter(row => row.kind === kind).map(row => row.id)
  const hazardIds = ids('hazard')
  const reportIds = ids('report')
  const open = hazardIds.length > 0 ? await selectHazards(db, hazardIds) : []
  const fresh = reportIds.length > 0 ? await selectReports(db, reportIds) : []
  const { seen, ordered } = await listSeenAndOrders(db, hazardIds)
  const found = groupBy(await listFindings(db, reportIds), finding => finding.reportId)
  const climbIds = [...open, ...fresh].flatMap(row => (row.climbId === null ? [] : [row.climbId]))
  const lines = await listPlacedAnchors(db, [...new Set(climbIds)], today)

  const shared = (row: (typeof open)[number] | (typeof fresh)[number]) => ({
    id: row.id,
    climbName: row.climbName,
    climbCode: row.climbCode,
    cragName: row.cragName,
    anchorCode: row.anchorCode,
    band: row.band,
    bandHigh: row.bandHigh,
    danger: toDanger(row.results as Judgement | null),
    line: (row.climbId === null ? [] : (lines.get(row.climbId) ?? [])).map(point => ({
      code: point.code,
      alongM: point.alongM,
      state: point.state,
    })),
  })
  const byId = new Map<string, ReturnType<typeof toHazardRow> | ReturnType<typeof toReportRow>>()
  function toHazardRow(row: (typeof open)[number]) {
    const order = ordered.get(row.id) as { code: string; state: string } | undefined
    const saw = seen.get(row.id) as { people: number; last: string } | undefined
    return {
      ...shared(row),
      kind: 'hazard' as const,
      state: row.state as HazardState,
      code: row.code,
      what: row.headline,
      seenBy: saw?.people ?? 0,
      lastSeen: saw?.last ?? null,
      confirmed: true,
      order: order ?? null,
    }
  }
  function toReportRow(row: (typeof fresh)[number]) {
    const position = row.anchorKind === null ? 'Somewhere' : formatPosition(row.anchorKind, row.ordinal ?? 1)
    return {
      ...shared(row),
      kind: 'report' as const,
      state: row.state as ReportState,
      code: null,
      what: `${position}: ${(found.get(row.id) ?? []).map(formatFinding).join('; ')}`,
      seenBy: 1,
      lastSeen: row.seenOn,
      confirmed: row.confirmedAt !== null,
      order: null,
    }
  }
  for (const row of open) byId.set(row.id, toHazardRow(row))
  for (const row of fresh) byId.set(row.id, toReportRow(row))
  return sorted.flatMap(row => byId.get(row.id) ?? [])
}

function toDanger(results: Judgement | null) {
  return results === null ? null : { times: results.times, low: results.timesLow, high: results.timesHigh }
}
