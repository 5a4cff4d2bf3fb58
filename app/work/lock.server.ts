import { and, asc, eq, inArray, isNotNull } from 'drizzle-orm'
import type { Transaction } from '~/db/client.server'
import { anchors } from '~/db/schema/crags'
import { hazards } from '~/db/schema/reports'
import { orderHazards, orders } from '~/db/schema/work'
import { Refusal } from '~/db/transaction.server'
import { findOrderById, type Order } from './orders.server'

/** Locks hazards and, before them, the fixed points they are at, each lowest id first. Gives the fixed points. */
export async function lockHazards(tx: Transaction, hazardIds: string[]): Promise<string[]> {
  if (hazardIds.length === 0) return []
  const at = await tx
    .selectDistinct({ id: anchors.id })
    .from(hazards)
    .innerJoin(anchors, eq(anchors.id, hazards.anchorId))
    .where(and(inArray(hazards.id, hazardIds), isNotNull(hazards.anchorId)))
  const anchorIds = at.map(row => row.id).sort()
  if (anchorIds.length > 0)
    await tx
      .select({ id: anchors.id })
      .from(anchors)
      .where(inArray(anchors.id, anchorIds))
      .orderBy(asc(anchors.id))
      .for('update')
  await tx
    .select({ id: hazards.id })
    .from(hazards)
    .where(inArray(hazards.id, hazardIds))
    .orderBy(asc(hazards.id))
    .for('update')
  return anchorIds
}

/** The order as it stands, its row locked for the rest of the transaction. */
export async function requireOrder(tx: Transaction, orderId: string): Promise<Order> {
  await tx.select({ id: orders.id }).from(orders).where(eq(orders.id, orderId)).for('update')
  const order = await findOrderById(tx, orderId)
  if (order === null) throw new Refusal('This order is no longer on record.')
  return order
}

/** The order as it stands with its fixed points, all locked in the order every command keeps: points, hazards, order. */
export async function requireWork(tx: Transaction, orderId: string) {
  const of = await tx
    .select({ hazardId: orderHazards.hazardId })
    .from(orderHazards)
    .where(eq(orderHazards.orderId, orderId))
  const anchorIds = await lockHazards(
    tx,
    of.map(row => row.hazardId),
  )
  return { order: await requireOrder(tx, orderId), anchorIds }
}
