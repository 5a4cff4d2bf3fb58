import { and, eq } from 'drizzle-orm'
import type { Transaction } from '~/db/client.server'
import { orders } from '~/db/schema/work'
import { Refusal } from '~/db/transaction.server'
import { findMove } from '~/lib/moves'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { type OrderState, orderMoves, orderStateWords } from './order'
import type { Order } from './orders.server'

/**
 * Moves an order, locked before, by the table of moves and writes the line of record; refuses naming what it is now.
 * `words` are what somebody said with it.
 */
export async function moveOrder(
  tx: Transaction,
  act: Act,
  order: Order,
  to: OrderState,
  move: { verb: string; set?: Partial<typeof orders.$inferInsert>; public?: boolean; words?: string },
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
    details: move.words === undefined ? undefined : { words: move.words },
  })
}
