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
import { dangerousStates } from './hazard'
import type { Judgement } from './judgement'

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
  if (ids.length === 0) return { seen: new Map<string, Seen>(), ordered: new Map<string, Ordered>() }
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
    seen: new Map<string, Seen>(seen.map(row => [row.hazardId!, row])),
    ordered: new Map<string, Ordered>(ordered.reverse().map(row => [row.hazardId, row])),
  }
}

type HazardRow = Awaited<ReturnType<typeof selectHazards>>[number]
type ReportRow = Awaited<ReturnType<typeof selectReports>>[number]
type Lines = Awaited<ReturnType<typeof listPlacedAnchors>>

interface Seen {
  people: number
  last: string
}

interface Ordered {
  code: string
  state: string
}

/** What a row says of its place and urgency, be it a hazard or a report. */
function toShared(row: HazardRow | ReportRow, lines: Lines) {
  const line = row.climbId === null ? [] : (lines.get(row.climbId) ?? [])
  const results = row.results as Judgement | null
  return {
    id: row.id,
    climbName: row.climbName,
    climbCode: row.climbCode,
    cragName: row.cragName,
    anchorCode: row.anchorCode,
    band: row.band,
    bandHigh: row.bandHigh,
    danger: results && { times: results.times, low: results.timesLow, high: results.timesHigh },
    line: line.map(({ code, alongM, state }) => ({ code, alongM, state })),
  }
}

function toHazardRow(row: HazardRow, lines: Lines, seen: Seen | undefined, order: Ordered | undefined) {
  return {
    ...toShared(row, lines),
    kind: 'hazard' as const,
    state: row.state,
    code: row.code,
    what: row.headline,
    seenBy: seen?.people ?? 0,
    lastSeen: seen?.last ?? null,
    confirmed: true,
    order: order ?? null,
  }
}

function toReportRow(row: ReportRow, lines: Lines, found: string) {
  const position = row.anchorKind === null ? 'Somewhere' : formatPosition(row.anchorKind, row.ordinal ?? 1)
  return {
    ...toShared(row, lines),
    kind: 'report' as const,
    state: row.state,
    code: null,
    what: `${position}: ${found}`,
    seenBy: 1,
    lastSeen: row.seenOn,
    confirmed: row.confirmedAt !== null,
    order: null,
  }
}

export type DangerRow = ReturnType<typeof toHazardRow> | ReturnType<typeof toReportRow>

/**
 * New reports and open hazards of the viewer's organisations in one list, most dangerous first: at most fifty rows,
 * each with its place, what is wrong, its line, urgency with range, who saw it and the order that stands.
 */
export async function listDanger(db: Queryable, viewer: Viewer, today: string): Promise<DangerRow[]> {
  const mine = listMine(viewer)
  if (mine.length === 0) return []
  const sorted = await listSorted(db, mine)
  const ids = (kind: 'report' | 'hazard') => sorted.filter(row => row.kind === kind).map(row => row.id)
  const open = ids('hazard').length > 0 ? await selectHazards(db, ids('hazard')) : []
  const fresh = ids('report').length > 0 ? await selectReports(db, ids('report')) : []
  const { seen, ordered } = await listSeenAndOrders(db, ids('hazard'))
  const found = groupBy(await listFindings(db, ids('report')), finding => finding.reportId)
  const climbIds = [...open, ...fresh].flatMap(row => row.climbId ?? [])
  const lines = await listPlacedAnchors(db, [...new Set(climbIds)], today)
  const words = (id: string) => (found.get(id) ?? []).map(formatFinding).join('; ')
  const rows: DangerRow[] = [
    ...open.map(row => toHazardRow(row, lines, seen.get(row.id), ordered.get(row.id))),
    ...fresh.map(row => toReportRow(row, lines, words(row.id))),
  ]
  const byId = new Map(rows.map(row => [row.id, row]))
  return sorted.flatMap(row => byId.get(row.id) ?? [])
}
