import { and, asc, eq, gt, inArray, isNull, or } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { anchors, areas, climbAnchors, climbs, crags, ledges, pitches, sectors } from '~/db/schema/crags'
import { parts } from '~/db/schema/parts'
import type { Viewer } from '~/people/viewer'
import { type AnchorKind, type Below, formatPosition } from './anchor'
import type { ConditionState } from './condition-state'
import type { Material, PartKind } from './part'
import { visibleCrags } from './visible.server'

/** A fixed point as it stands on one climb, lowest first. */
export interface PlacedAnchor {
  climbId: string
  anchorId: string
  code: string
  kind: AnchorKind
  ordinal: number
  name: string
  alongM: number
  assumed: boolean
  below: Below
  state: ConditionState
  stateOn: string | null
  stateHow: string | null
  openHazards: number
  parts: { kind: PartKind; material: Material; sizeMm: number | null; fittedOn: string | null }[]
}

async function listPartsOf(db: Queryable, anchorIds: string[]) {
  const found = new Map<string, PlacedAnchor['parts']>()
  if (anchorIds.length === 0) return found
  const rows = await db
    .select({
      anchorId: parts.anchorId,
      kind: parts.kind,
      material: parts.material,
      sizeMm: parts.sizeMm,
      fittedOn: parts.fittedOn,
    })
    .from(parts)
    .where(and(inArray(parts.anchorId, anchorIds), isNull(parts.removedOn)))
    .orderBy(asc(parts.id))
  for (const { anchorId, ...part } of rows) found.set(anchorId, [...(found.get(anchorId) ?? []), part])
  return found
}

/** The fixed points in place on each of the climbs, lowest first, with the parts now at them. */
export async function listPlacedAnchors(
  db: Queryable,
  climbIds: string[],
  today: string,
): Promise<Map<string, PlacedAnchor[]>> {
  const found = new Map<string, PlacedAnchor[]>(climbIds.map(id => [id, []]))
  if (climbIds.length === 0) return found
  const rows = await db
    .select({
      climbId: climbAnchors.climbId,
      anchorId: anchors.id,
      code: anchors.code,
      kind: anchors.kind,
      ordinal: climbAnchors.ordinal,
      alongM: climbAnchors.alongM,
      assumed: climbAnchors.assumed,
      below: climbAnchors.below,
      state: anchors.state,
      stateOn: anchors.stateOn,
      stateHow: anchors.stateHow,
      openHazards: anchors.openHazards,
    })
    .from(climbAnchors)
    .innerJoin(anchors, eq(anchors.id, climbAnchors.anchorId))
    .where(
      and(
        inArray(climbAnchors.climbId, climbIds),
        eq(anchors.life, 'in_place'),
        or(isNull(climbAnchors.toOn), gt(climbAnchors.toOn, today)),
      ),
    )
    .orderBy(asc(climbAnchors.climbId), asc(climbAnchors.alongM))
  const fitted = await listPartsOf(db, [...new Set(rows.map(row => row.anchorId))])
  for (const row of rows)
    found.get(row.climbId)!.push({
      ...row,
      name: formatPosition(row.kind, row.ordinal),
      parts: fitted.get(row.anchorId) ?? [],
    })
  return found
}

const climbColumns = {
  id: climbs.id,
  code: climbs.code,
  name: climbs.name,
  grade: climbs.grade,
  traffic: climbs.traffic,
  ascentsYear: climbs.ascentsYear,
  worstState: climbs.worstState,
  openHazards: climbs.openHazards,
  notices: climbs.notices,
  retiredAt: climbs.retiredAt,
  lengthM: pitches.lengthM,
  pitchId: pitches.id,
  sectorId: sectors.id,
  sectorName: sectors.name,
  cragId: crags.id,
  cragCode: crags.code,
  cragName: crags.name,
  areaName: areas.name,
  areaCode: areas.code,
  timeZone: areas.timeZone,
}

function selectClimbs(db: Queryable) {
  return db
    .select(climbColumns)
    .from(climbs)
    .innerJoin(sectors, eq(sectors.id, climbs.sectorId))
    .innerJoin(crags, eq(crags.id, sectors.cragId))
    .innerJoin(areas, eq(areas.id, crags.areaId))
    .innerJoin(pitches, and(eq(pitches.climbId, climbs.id), eq(pitches.number, 1)))
}

/** The routes of a crag, sector by sector from the left, each with its line. */
export async function listClimbs(db: Queryable, viewer: Viewer, cragId: string, today: string) {
  const rows = await selectClimbs(db)
    .where(and(eq(crags.id, cragId), isNull(climbs.retiredAt), visibleCrags(viewer)))
    .orderBy(asc(sectors.ordinal), asc(climbs.ordinal))
    .limit(500)
  const placed = await listPlacedAnchors(
    db,
    rows.map(row => row.id),
    today,
  )
  return rows.map(row => ({ ...row, points: placed.get(row.id)! }))
}

/** The route of a code if the viewer may see it, with its line and ledges; else null. */
export async function findClimb(db: Queryable, viewer: Viewer, code: string, today: string) {
  const [row] = await selectClimbs(db)
    .where(and(eq(climbs.code, code), visibleCrags(viewer)))
    .limit(1)
  return row === undefined ? null : await withLine(db, row, today)
}

/** The route of an id with its line, whoever asks: for computations, never for a page. */
export async function findClimbById(db: Queryable, climbId: string, today: string) {
  const [row] = await selectClimbs(db).where(eq(climbs.id, climbId)).limit(1)
  return row === undefined ? null : await withLine(db, row, today)
}

async function withLine<Row extends { id: string; pitchId: string }>(db: Queryable, row: Row, today: string) {
  const placed = await listPlacedAnchors(db, [row.id], today)
  const onIt = await db
    .select({ atM: ledges.atM, below: ledges.below })
    .from(ledges)
    .where(eq(ledges.pitchId, row.pitchId))
    .orderBy(asc(ledges.atM))
  return { ...row, points: placed.get(row.id)!, ledges: onIt }
}
