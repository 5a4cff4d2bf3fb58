import { asc, desc, eq } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { people } from '~/db/schema/people'
import { offers, orderParts, workChecks, workParts, workRecords } from '~/db/schema/work'

/** The parts an order needs. */
export async function listNeededParts(db: Queryable, orderId: string) {
  return await db
    .select({
      kind: orderParts.kind,
      material: orderParts.material,
      sizeMm: orderParts.sizeMm,
      quantity: orderParts.quantity,
    })
    .from(orderParts)
    .where(eq(orderParts.orderId, orderId))
    .orderBy(asc(orderParts.id))
    .limit(50)
}

/** Every offer of an order, newest first, with whom it went to. */
export async function listOffers(db: Queryable, orderId: string) {
  return await db
    .select({
      id: offers.id,
      personId: offers.personId,
      name: people.name,
      state: offers.state,
      expiresAt: offers.expiresAt,
      words: offers.words,
    })
    .from(offers)
    .innerJoin(people, eq(people.id, offers.personId))
    .where(eq(offers.orderId, orderId))
    .orderBy(desc(offers.createdAt))
    .limit(50)
}

/** The newest record of work on an order with what was fitted and its checks, or null. */
export async function findRecord(db: Queryable, orderId: string) {
  const [record] = await db
    .select({
      id: workRecords.id,
      anchorId: workRecords.anchorId,
      by: workRecords.by,
      name: people.name,
      doneOn: workRecords.doneOn,
      minutes: workRecords.minutes,
      words: workRecords.words,
      noPhotoReason: workRecords.noPhotoReason,
      outcome: workRecords.outcome,
    })
    .from(workRecords)
    .innerJoin(people, eq(people.id, workRecords.by))
    .where(eq(workRecords.orderId, orderId))
    .orderBy(desc(workRecords.createdAt))
    .limit(1)
  if (record === undefined) return null
  const fitted = await db
    .select({
      replaces: workParts.replaces,
      side: workParts.side,
      kind: workParts.kind,
      material: workParts.material,
      sizeMm: workParts.sizeMm,
      marking: workParts.marking,
    })
    .from(workParts)
    .where(eq(workParts.workRecordId, record.id))
    .orderBy(asc(workParts.id))
  const checks = await db
    .select({
      by: workChecks.by,
      name: people.name,
      whoKind: workChecks.whoKind,
      how: workChecks.how,
      outcome: workChecks.outcome,
      words: workChecks.words,
      at: workChecks.at,
    })
    .from(workChecks)
    .innerJoin(people, eq(people.id, workChecks.by))
    .where(eq(workChecks.workRecordId, record.id))
    .orderBy(desc(workChecks.at))
  return { ...record, fitted, checks }
}

/** Everybody who ever recorded work on an order. */
export async function listRecorders(db: Queryable, orderId: string): Promise<string[]> {
  const rows = await db
    .selectDistinct({ by: workRecords.by })
    .from(workRecords)
    .where(eq(workRecords.orderId, orderId))
  return rows.map(row => row.by)
}
