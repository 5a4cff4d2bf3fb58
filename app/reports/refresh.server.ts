import { and, eq, inArray, isNull, sql } from 'drizzle-orm'
import { worstState } from '~/crags/condition-state'
import type { Transaction } from '~/db/client.server'
import { listNoticesInForce } from '~/db/notices-in-force'
import { anchors, areas, climbAnchors, climbs, crags } from '~/db/schema/crags'
import { parts } from '~/db/schema/parts'
import { findings, hazards, reports } from '~/db/schema/reports'
import { toDay } from '~/lib/dates'
import { groupBy } from '~/lib/group-by'
import { type Band, bands } from '~/rating/band'
import type { Act } from '~/record/act'
import { type StandingFinding, toAnchorState } from './anchor-state'
import { dangerousStates } from './hazard'

const seaCliffKm = 1

async function listPlaces(tx: Transaction, anchorIds: string[]) {
  return await tx
    .select({
      id: anchors.id,
      cragId: crags.id,
      warmSea: crags.warmSea,
      seaKm: crags.seaKm,
      timeZone: areas.timeZone,
      stainless: sql<number>`exists (select 1 from ${parts} where ${parts.anchorId} = ${anchors.id} and ${parts.removedOn} is null and ${parts.material} = 'stainless')`,
    })
    .from(anchors)
    .innerJoin(crags, eq(crags.id, anchors.cragId))
    .innerJoin(areas, eq(areas.id, crags.areaId))
    .where(inArray(anchors.id, anchorIds))
    .orderBy(anchors.id)
}

async function listStanding(tx: Transaction, anchorIds: string[]) {
  const rows = await tx
    .select({
      anchorId: reports.anchorId,
      kind: findings.kind,
      unit: findings.unit,
      low: findings.low,
      high: findings.high,
      edge: findings.edge,
      sizeMm: parts.sizeMm,
      isCheck: reports.isCheck,
      seenOn: reports.seenOn,
      howSeen: reports.howSeen,
    })
    .from(findings)
    .innerJoin(reports, eq(reports.id, findings.reportId))
    .leftJoin(parts, eq(parts.id, findings.partId))
    .where(
      and(
        inArray(reports.anchorId, anchorIds),
        inArray(reports.state, ['taken_in', 'on_record']),
        isNull(findings.clearedAt),
      ),
    )
  return groupBy(rows, row => row.anchorId!) as Map<string, StandingFinding[]>
}

async function listDangerous(tx: Transaction, anchorIds: string[]) {
  const rows = await tx
    .select({ anchorId: hazards.anchorId, band: hazards.band, sort: hazards.urgencySort })
    .from(hazards)
    .where(and(inArray(hazards.anchorId, anchorIds), inArray(hazards.state, dangerousStates)))
  return groupBy(rows, row => row.anchorId!)
}

/** The most urgent of some bands, or null. */
function mostUrgent(given: (Band | null)[]): Band | null {
  return bands.find(band => given.includes(band)) ?? null
}

/**
 * Recomputes everything derived of the given fixed points (condition, lapse, open hazards, urgency, notices) from
 * reports, hazards and notices, then of the climbs and crags they stand on. The only writer of those columns.
 */
export async function refreshAnchors(tx: Transaction, act: Act, anchorIds: string[]): Promise<void> {
  if (anchorIds.length === 0) return
  const ids = [...new Set(anchorIds)].sort()
  const standing = await listStanding(tx, ids)
  const dangerous = await listDangerous(tx, ids)
  const places = await listPlaces(tx, ids)
  const inForce = await listNoticesInForce(tx, { anchorIds: ids, now: act.now })
  for (const place of places) {
    const open = dangerous.get(place.id) ?? []
    const state = toAnchorState(standing.get(place.id) ?? [], {
      hiddenCracking: place.warmSea && Number(place.stainless) === 1,
      seaCliff: place.seaKm !== null && place.seaKm < seaCliffKm,
      today: toDay(act.now, place.timeZone),
    })
    await tx
      .update(anchors)
      .set({
        ...state,
        worstBand: mostUrgent(open.map(hazard => hazard.band)),
        openHazards: open.length,
        notices: inForce.anchors.get(place.id)?.size ?? 0,
        updatedAt: act.now,
      })
      .where(eq(anchors.id, place.id))
  }
  await refreshClimbsOf(tx, act, ids)
  await refreshCrags(tx, act, [...new Set(places.map(place => place.cragId))])
}

async function refreshClimbsOf(tx: Transaction, act: Act, anchorIds: string[]): Promise<void> {
  const rows = await tx
    .selectDistinct({ id: climbAnchors.climbId })
    .from(climbAnchors)
    .where(and(inArray(climbAnchors.anchorId, anchorIds), isNull(climbAnchors.toOn)))
  for (const { id } of rows) {
    const points = await tx
      .select({ state: anchors.state, band: anchors.worstBand, open: anchors.openHazards })
      .from(climbAnchors)
      .innerJoin(anchors, eq(anchors.id, climbAnchors.anchorId))
      .where(and(eq(climbAnchors.climbId, id), isNull(climbAnchors.toOn), eq(anchors.life, 'in_place')))
    const inForce = await listNoticesInForce(tx, { climbIds: [id], now: act.now })
    await tx
      .update(climbs)
      .set({ ...toWorst(points), notices: inForce.climbs.get(id)?.size ?? 0, updatedAt: act.now })
      .where(eq(climbs.id, id))
  }
}

function toWorst(
  points: { state: (typeof anchors.$inferSelect)['state']; band: Band | null; open: number }[],
) {
  return {
    worstState: worstState(points.map(point => point.state)),
    worstBand: mostUrgent(points.map(point => point.band)),
    openHazards: points.reduce((sum, point) => sum + point.open, 0),
  }
}

/** Recomputes what crags derive from their fixed points and notices. */
export async function refreshCrags(tx: Transaction, act: Act, cragIds: string[]): Promise<void> {
  for (const cragId of cragIds.sort()) {
    const points = await tx
      .select({ state: anchors.state, band: anchors.worstBand, open: anchors.openHazards })
      .from(anchors)
      .where(and(eq(anchors.cragId, cragId), eq(anchors.life, 'in_place')))
    const inForce = await listNoticesInForce(tx, { cragIds: [cragId], now: act.now })
    await tx
      .update(crags)
      .set({ ...toWorst(points), notices: inForce.crags.get(cragId)?.size ?? 0, updatedAt: act.now })
      .where(eq(crags.id, cragId))
  }
}
