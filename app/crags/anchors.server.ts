import { and, asc, eq, isNull } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { anchors, areas, climbAnchors, climbs, crags, pitches } from '~/db/schema/crags'
import { parts } from '~/db/schema/parts'
import type { Viewer } from '~/people/viewer'
import { formatPosition } from './anchor'
import { visibleCrags } from './visible.server'

/** The fixed point of a code if the viewer may see it, with the climbs it stands on; else null. */
export async function findAnchor(db: Queryable, viewer: Viewer, code: string) {
  const [row] = await db
    .select({
      id: anchors.id,
      code: anchors.code,
      kind: anchors.kind,
      life: anchors.life,
      state: anchors.state,
      stateOn: anchors.stateOn,
      stateHow: anchors.stateHow,
      lapsesOn: anchors.lapsesOn,
      openHazards: anchors.openHazards,
      notices: anchors.notices,
      cragId: crags.id,
      cragCode: crags.code,
      cragName: crags.name,
      warmSea: crags.warmSea,
      seaKm: crags.seaKm,
      areaName: areas.name,
      areaCode: areas.code,
      timeZone: areas.timeZone,
    })
    .from(anchors)
    .innerJoin(crags, eq(crags.id, anchors.cragId))
    .innerJoin(areas, eq(areas.id, crags.areaId))
    .where(and(eq(anchors.code, code), visibleCrags(viewer)))
    .limit(1)
  return row === undefined ? null : { ...row, climbs: await listClimbsOf(db, row.id) }
}

/** The climbs a fixed point stands on, with its name on each. */
export async function listClimbsOf(db: Queryable, anchorId: string) {
  const rows = await db
    .select({
      climbId: climbs.id,
      code: climbs.code,
      name: climbs.name,
      kind: anchors.kind,
      ordinal: climbAnchors.ordinal,
      alongM: climbAnchors.alongM,
      assumed: climbAnchors.assumed,
      lengthM: pitches.lengthM,
    })
    .from(climbAnchors)
    .innerJoin(climbs, eq(climbs.id, climbAnchors.climbId))
    .innerJoin(pitches, eq(pitches.id, climbAnchors.pitchId))
    .innerJoin(anchors, eq(anchors.id, climbAnchors.anchorId))
    .where(and(eq(climbAnchors.anchorId, anchorId), isNull(climbAnchors.toOn), isNull(climbs.retiredAt)))
    .orderBy(asc(climbs.ordinal))
    .limit(20)
  return rows.map(row => ({ ...row, position: formatPosition(row.kind, row.ordinal) }))
}

/** The parts ever at a fixed point, those in place first, oldest last. */
export async function listParts(db: Queryable, anchorId: string) {
  const rows = await db
    .select({
      id: parts.id,
      side: parts.side,
      kind: parts.kind,
      material: parts.material,
      sizeMm: parts.sizeMm,
      lengthMm: parts.lengthMm,
      marking: parts.marking,
      standard: parts.standard,
      fittedOn: parts.fittedOn,
      fittedPrecision: parts.fittedPrecision,
      removedOn: parts.removedOn,
    })
    .from(parts)
    .where(eq(parts.anchorId, anchorId))
    .orderBy(asc(parts.id))
    .limit(200)
  return [...rows.filter(row => row.removedOn === null), ...rows.filter(row => row.removedOn !== null)]
}
