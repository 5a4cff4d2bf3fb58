import { eq } from 'drizzle-orm'
import { listParts } from '~/crags/anchors.server'
import type { PartKind } from '~/crags/part'
import type { Database } from '~/db/client.server'
import { workChecks, workRecords } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { moveHazard } from '~/reports/hazards.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { toProgressMail } from './mails'
import { moveOrder, requireOrder } from './move.server'
import { tellMaker } from './offer.server'
import type { CheckerKind, CheckMethod } from './order'
import { findAddress, findRecord } from './order-details.server'
import { findOrderById, lockAnchors } from './orders.server'

const bonded: readonly PartKind[] = ['bonded_eye', 'bonded_staple', 'bonded_stud']

export interface NewCheck {
  orderId: string
  whoKind: CheckerKind
  how: CheckMethod
  outcome: 'good' | 'returned'
  words: string | null
  who: string
}

/**
 * Checks recorded work, by somebody who did not do it. Photos alone never check a bonded bolt. Good work can be closed;
 * returned work goes back to its worker, and its hazards are open again.
 */
export async function checkWork(db: Database, given: NewCheck & { act: Act; appUrl: string }) {
  const { act, appUrl, orderId, who, ...check } = given
  return await inCommand(db, async tx => {
    const before = await findOrderById(tx, orderId)
    if (before === null) throw new Refusal('This order is no longer on record.')
    const anchorIds = await lockAnchors(tx, before.hazards)
    const order = await requireOrder(tx, orderId)
    const record = await findRecord(tx, orderId)
    if (record === null) throw new Refusal('Nothing has been recorded for this order yet.')
    if (record.by === act.by.personId)
      throw new Refusal(
        'Work is checked by somebody who did not do it. Ask your partner of the day, or somebody independent.',
      )
    const there = (await listParts(tx, record.anchorId)).filter(part => part.removedOn === null)
    const kinds = [
      ...record.fitted.map(part => part.kind),
      ...(record.fitted.length === 0 ? there.map(part => part.kind) : []),
    ]
    if (check.how === 'from_photos' && kinds.some(kind => kind !== null && bonded.includes(kind)))
      throw new Refusal(
        'Photos alone do not check a bonded bolt. Check it on the rope, or by a load test after the cure.',
      )
    await tx
      .insert(workChecks)
      .values({ id: act.newId(), workRecordId: record.id, by: act.by.personId!, at: act.now, ...check })
    const returned = check.outcome === 'returned'
    await moveOrder(tx, act, order, returned ? 'accepted' : 'checked', {
      verb: returned ? 'returned' : 'checked',
      public: true,
    })
    if (returned) {
      await tx
        .update(workRecords)
        .set({ outcome: 'returned', updatedAt: act.now })
        .where(eq(workRecords.id, record.id))
      for (const hazard of order.hazards)
        await moveHazard(tx, act, hazard.id, { from: ['mended'], to: 'open', verb: 'reopened' })
      await refreshAnchors(tx, act, anchorIds)
      const to = await findAddress(tx, order.workerId)
      const key = `${record.id}:worker`
      const url = `${appUrl}/orders/${order.code}`
      if (to !== null)
        await queueMail(
          tx,
          act,
          toProgressMail({
            orderId,
            to,
            title: order.title,
            key,
            who,
            did: 'returned',
            words: check.words,
            url,
          }),
        )
    }
    const did = returned ? 'returned' : 'checked'
    await tellMaker(tx, act, order, { key: record.id, who, did, words: check.words, appUrl })
    return {}
  })
}
