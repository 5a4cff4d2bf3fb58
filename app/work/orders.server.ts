import { and, desc, eq, inArray } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { areas, crags } from '~/db/schema/crags'
import { organisations } from '~/db/schema/people'
import { orderHazards, orders } from '~/db/schema/work'
import type { Viewer } from '~/people/viewer'
import { type Hazard, listHazardsById } from '~/reports/hazards.server'
import { jobKindWords } from './job'
import { liveStates } from './order'

/** The organisations whose orders the viewer may see. */
export function listWorkingFor(viewer: Viewer): string[] {
  return viewer.memberships
    .filter(({ roles }) => roles.includes('rebolter') || roles.includes('coordinator'))
    .map(({ organisationId }) => organisationId)
}

const columns = {
  id: orders.id,
  code: orders.code,
  organisationId: orders.organisationId,
  organisation: organisations.name,
  cragId: orders.cragId,
  cragName: crags.name,
  cragCode: crags.code,
  areaCode: areas.code,
  timeZone: areas.timeZone,
  approach: crags.approach,
  kind: orders.kind,
  state: orders.state,
  aimOn: orders.aimOn,
  what: orders.what,
  consentReason: orders.consentReason,
  madeBy: orders.madeBy,
  workerId: orders.workerId,
  closedAt: orders.closedAt,
  createdAt: orders.createdAt,
}

function selectOrders(db: Queryable) {
  return db
    .select(columns)
    .from(orders)
    .innerJoin(organisations, eq(organisations.id, orders.organisationId))
    .innerJoin(crags, eq(crags.id, orders.cragId))
    .innerJoin(areas, eq(areas.id, crags.areaId))
}

type OrderRow = Awaited<ReturnType<ReturnType<typeof selectOrders>['limit']>>[number]

async function withHazards<Row extends OrderRow>(db: Queryable, rows: Row[]) {
  if (rows.length === 0) return []
  const links = await db
    .select({ orderId: orderHazards.orderId, hazardId: orderHazards.hazardId })
    .from(orderHazards)
    .where(
      inArray(
        orderHazards.orderId,
        rows.map(row => row.id),
      ),
    )
  const hazards = new Map(
    (
      await listHazardsById(
        db,
        links.map(link => link.hazardId),
      )
    ).map(one => [one.id, one]),
  )
  return rows.map(row => {
    const mine = links
      .filter(link => link.orderId === row.id)
      .flatMap(link => hazards.get(link.hazardId) ?? [])
    return { ...row, hazards: mine, title: toTitle(row, mine) }
  })
}

/** "Replace ring or link, lower-off of Slack Water, Gannet Wall". */
function toTitle(row: OrderRow, hazards: Hazard[]): string {
  return [jobKindWords[row.kind], hazards[0] && toPlace(hazards[0])].filter(Boolean).join(', ')
}

/** "lower-off of Slack Water, Gannet Wall". */
export function toPlace(hazard: Pick<Hazard, 'position' | 'climbName' | 'cragName'>): string {
  return `${(hazard.position ?? 'somewhere').toLowerCase()} of ${hazard.climbName ?? hazard.cragName}, ${hazard.cragName}`
}

/** The orders of the viewer's organisations, newest first, at most 300. */
export async function listOrders(db: Queryable, viewer: Viewer) {
  const mine = listWorkingFor(viewer)
  if (mine.length === 0) return []
  const rows = await selectOrders(db)
    .where(inArray(orders.organisationId, mine))
    .orderBy(desc(orders.createdAt))
    .limit(300)
  return await withHazards(db, rows)
}

/** The orders that stand or stood for a hazard, newest first. */
export async function listOrdersOf(db: Queryable, hazardId: string) {
  return await db
    .select({ code: orders.code, state: orders.state })
    .from(orderHazards)
    .innerJoin(orders, eq(orders.id, orderHazards.orderId))
    .where(eq(orderHazards.hazardId, hazardId))
    .orderBy(desc(orders.createdAt))
    .limit(50)
}

/** The order under way for a hazard, or null. */
export async function findLiveOrder(db: Queryable, hazardId: string) {
  const [row] = await db
    .select({ code: orders.code, state: orders.state })
    .from(orderHazards)
    .innerJoin(orders, eq(orders.id, orderHazards.orderId))
    .where(and(eq(orderHazards.hazardId, hazardId), inArray(orders.state, liveStates)))
    .limit(1)
  return row ?? null
}

/** The order of an id with its hazards, whoever asks: for commands and mailed links. Else null. */
export async function findOrderById(db: Queryable, id: string) {
  const [row] = await withHazards(db, await selectOrders(db).where(eq(orders.id, id)).limit(1))
  return row ?? null
}

export type Order = NonNullable<Awaited<ReturnType<typeof findOrderById>>>

/** The order of a code if it is one of the viewer's organisations', else null. */
export async function findOrder(db: Queryable, viewer: Viewer, code: string): Promise<Order | null> {
  const mine = listWorkingFor(viewer)
  if (mine.length === 0) return null
  const [row] = await withHazards(
    db,
    await selectOrders(db)
      .where(and(eq(orders.code, code), inArray(orders.organisationId, mine)))
      .limit(1),
  )
  return row ?? null
}
