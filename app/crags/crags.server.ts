import { and, asc, count, eq, inArray, isNull } from 'drizzle-orm'
import { alias } from 'drizzle-orm/mysql-core'
import type { Queryable } from '~/db/client.server'
import { anchors, areas, climbs, consents, cragOrganisations, crags, sectors } from '~/db/schema/crags'
import { organisations } from '~/db/schema/people'
import type { Subject, Viewer } from '~/people/viewer'
import type { ConditionState } from './condition-state'
import { conditionStates } from './condition-state'
import { visibleCrags } from './visible.server'

export type ConditionCounts = Record<ConditionState, number>

const noCounts = (): ConditionCounts => ({ severe: 0, poor: 0, fair: 0, unknown: 0, good: 0 })

/** the area around an area */
const regions = alias(areas, 'regions')

const listed = {
  id: crags.id,
  code: crags.code,
  name: crags.name,
  pos: crags.pos,
  areaName: areas.name,
  areaCode: areas.code,
  regionName: regions.name,
  worstState: crags.worstState,
  openHazards: crags.openHazards,
  notices: crags.notices,
}

async function countAnchors(db: Queryable, cragIds: string[]): Promise<Map<string, ConditionCounts>> {
  const found = new Map<string, ConditionCounts>()
  if (cragIds.length === 0) return found
  const rows = await db
    .select({ cragId: anchors.cragId, state: anchors.state, count: count() })
    .from(anchors)
    .where(and(inArray(anchors.cragId, cragIds), eq(anchors.life, 'in_place')))
    .groupBy(anchors.cragId, anchors.state)
  for (const row of rows) {
    const counts = found.get(row.cragId) ?? noCounts()
    counts[row.state] = row.count
    found.set(row.cragId, counts)
  }
  return found
}

async function countClimbs(db: Queryable, cragIds: string[]): Promise<Map<string, number>> {
  if (cragIds.length === 0) return new Map()
  const rows = await db
    .select({ cragId: sectors.cragId, count: count() })
    .from(climbs)
    .innerJoin(sectors, eq(sectors.id, climbs.sectorId))
    .where(and(inArray(sectors.cragId, cragIds), isNull(climbs.retiredAt)))
    .groupBy(sectors.cragId)
  return new Map(rows.map(row => [row.cragId, row.count]))
}

export interface ListedCrag {
  id: string
  code: string
  name: string
  pos: { lon: number; lat: number }
  areaName: string
  areaCode: string
  regionName: string | null
  worstState: ConditionState
  openHazards: number
  notices: number
  climbs: number
  counts: ConditionCounts
}

/** The crags a viewer may see, worst condition first, each with its routes and its fixed points by condition. */
export async function listCrags(db: Queryable, viewer: Viewer): Promise<ListedCrag[]> {
  const rows = await db
    .select(listed)
    .from(crags)
    .innerJoin(areas, eq(areas.id, crags.areaId))
    .leftJoin(regions, eq(regions.id, areas.parentId))
    .where(visibleCrags(viewer))
    .orderBy(asc(crags.name))
    .limit(500)
  const ids = rows.map(row => row.id)
  const [points, routes] = [await countAnchors(db, ids), await countClimbs(db, ids)]
  return rows
    .map(row => ({ ...row, climbs: routes.get(row.id) ?? 0, counts: points.get(row.id) ?? noCounts() }))
    .sort(byDanger)
}

/** Worst state first; of the same state, more points in it first, then by name. */
function byDanger(a: ListedCrag, b: ListedCrag): number {
  const worse = conditionStates.indexOf(a.worstState) - conditionStates.indexOf(b.worstState)
  if (worse !== 0) return worse
  return b.counts[b.worstState] - a.counts[a.worstState] || a.name.localeCompare(b.name)
}

/** The crag of a code if the viewer may see it, with consent and who looks after it; else null. */
export async function findCrag(db: Queryable, viewer: Viewer, code: string) {
  const [row] = await db
    .select({
      ...listed,
      sensitive: crags.sensitive,
      rock: crags.rock,
      seaKm: crags.seaKm,
      warmSea: crags.warmSea,
      aspect: crags.aspect,
      consent: crags.consent,
      policy: crags.policy,
      approach: crags.approach,
      timeZone: areas.timeZone,
    })
    .from(crags)
    .innerJoin(areas, eq(areas.id, crags.areaId))
    .leftJoin(regions, eq(regions.id, areas.parentId))
    .where(and(eq(crags.code, code), visibleCrags(viewer)))
    .limit(1)
  if (row === undefined) return null
  const counts = (await countAnchors(db, [row.id])).get(row.id) ?? noCounts()
  return { ...row, counts, organisations: await listKeepingOrganisations(db, row.id) }
}

/** Which organisations look after a crag, and with what remit. */
export async function listKeepingOrganisations(db: Queryable, cragId: string) {
  return await db
    .select({
      organisationId: cragOrganisations.organisationId,
      name: organisations.name,
      remit: cragOrganisations.remit,
      lead: cragOrganisations.lead,
    })
    .from(cragOrganisations)
    .innerJoin(organisations, eq(organisations.id, cragOrganisations.organisationId))
    .where(eq(cragOrganisations.cragId, cragId))
    .orderBy(asc(cragOrganisations.remit), asc(organisations.name))
    .limit(20)
}

/** What permission asks of a crag: its sensitivity and the organisations that look after it. */
export async function requireCragSubject(
  db: Queryable,
  cragId: string,
): Promise<Required<Pick<Subject, 'crag'>>> {
  const [row] = await db
    .select({ sensitive: crags.sensitive })
    .from(crags)
    .where(eq(crags.id, cragId))
    .limit(1)
  if (row === undefined) throw new Error(`no crag ${cragId}`)
  const held = await listKeepingOrganisations(db, cragId)
  return { crag: { sensitive: row.sensitive, organisations: held } }
}

/** The conditions an owner has set, newest first; private wording stays with members. */
export async function findConsent(db: Queryable, cragId: string) {
  const [row] = await db
    .select({ state: consents.state, untilOn: consents.untilOn, conditions: consents.conditions })
    .from(consents)
    .where(eq(consents.cragId, cragId))
    .limit(1)
  return row ?? null
}
