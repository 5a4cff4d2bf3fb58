import { and, eq } from 'drizzle-orm'
import type { Database } from '~/db/client.server'
import { offers } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { requireOrder } from './lock.server'
import { toCancelledMail } from './mails'
import { moveOrder } from './move.server'
import { endSheets } from './sheets.server'
import { tellMaker } from './tell.server'
import { findAddress } from './workers.server'

/** The worker gives an accepted job back, with a word why; it is a draft again and its maker hears of it. */
export async function handBack(
  db: Database,
  given: { orderId: string; words: string; who: string; act: Act; appUrl: string },
) {
  const { orderId, words, who, act, appUrl } = given
  return await inCommand(db, async tx => {
    const order = await requireOrder(tx, orderId)
    if (order.state === 'accepted' && order.workerId !== act.by.personId)
      throw new Refusal('Only whoever has accepted the job can hand it back.')
    await moveOrder(tx, act, order, 'draft', { verb: 'handed_back', set: { workerId: null }, words })
    await endSheets(tx, act, orderId)
    await tellMaker(tx, act, order, {
      key: `${orderId}:${act.now.getTime()}`,
      who,
      did: 'handed_back',
      words,
      appUrl,
    })
    return {}
  })
}

/** Cancels an order before it is done: live offers are withdrawn, and whoever had one, or the job, is told. */
export async function cancelOrder(db: Database, { orderId, act }: { orderId: string; act: Act }) {
  return await inCommand(db, async tx => {
    const order = await requireOrder(tx, orderId)
    await moveOrder(tx, act, order, 'cancelled', { verb: 'cancelled' })
    await endSheets(tx, act, orderId)
    const live = await tx
      .select({ id: offers.id, personId: offers.personId })
      .from(offers)
      .where(and(eq(offers.orderId, orderId), eq(offers.state, 'sent')))
    await tx
      .update(offers)
      .set({ state: 'withdrawn', answeredAt: act.now, updatedAt: act.now })
      .where(and(eq(offers.orderId, orderId), eq(offers.state, 'sent')))
    const told = new Set([...live.map(offer => offer.personId), ...(order.workerId ? [order.workerId] : [])])
    for (const personId of told) {
      const to = await findAddress(tx, personId)
      if (to !== null)
        await queueMail(tx, act, toCancelledMail({ orderId, to, title: order.title, key: orderId }))
    }
    return {}
  })
}
