import { and, eq } from 'drizzle-orm'
import type { Transaction } from '~/db/client.server'
import { orders } from '~/db/schema/work'
import { Refusal } from '~/db/transaction.server'
import { findMove } from '~/lib/moves'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { type OrderState, orderMoves, orderStateWords } from './order'
import { findOrderById, type Order } from './orders.server'

/** The order as it stands, its row locked for the rest of the transaction. */
export async function requireOrder(tx: Transaction, orderId: string): Promise<Order> {
  await tx.select({ id: orders.id }).from(orders).where(eq(orders.id, orderId)).for('update')
  const order = await findOrderById(tx, orderId)
  if (order === null) throw new Refusal('This order is no longer on record.')
  return order
}

/** Moves an order by the table of moves and writes the line of record; refuses naming what it is now. */
export async function moveOrder(
  tx: Transaction,
  act: Act,
  order: Order,
  to: OrderState,
  move: { verb: string; set?: Partial<typeof orders.$inferInsert>; public?: boolean },
): Promise<void> {
  if (findMove(orderMoves, order.state, to) === null)
    throw new Refusal(
      `This order is ${orderStateWords[order.state]} now, so that can no longer be done. Open it again to see what happened.`,
    )
  await tx
    .update(orders)
    .set({ ...move.set, state: to, updatedAt: act.now })
    .where(and(eq(orders.id, order.id), eq(orders.state, order.state)))
  await writeActivity(tx, act, {
    verb: move.verb,
    subjectKind: 'order',
    subjectId: order.id,
    cragId: order.cragId,
    public: move.public ?? false,
  })
}
