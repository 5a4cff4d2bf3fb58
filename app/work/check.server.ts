import { eq } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { workChecks, workRecords } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { moveHazard } from '~/reports/hazards.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { hasBonded } from './fitted.server'
import { requireWork } from './lock.server'
import { toProgressMail } from './mails'
import { moveOrder } from './move.server'
import type { CheckerKind, CheckMethod } from './order'
import { findRecord, listRecorders } from './order-details.server'
import type { Order } from './orders.server'
import { tellMaker } from './tell.server'
import { findAddress, requireWorking } from './workers.server'

export interface NewCheck {
  orderId: string
  whoKind: CheckerKind
  how: CheckMethod
  outcome: 'good' | 'returned'
  words: string | null
  who: string
}

type Given = NewCheck & { act: Act; appUrl: string }

/** The record that waits for a check, if this person may check it in this way. */
async function requireCheckable(tx: Transaction, { orderId, act, how, outcome }: Given) {
  const record = await findRecord(tx, orderId)
  if (record === null) throw new Refusal('Nothing has been recorded for this order yet.')
  if ((await listRecorders(tx, orderId)).includes(act.by.personId!))
    throw new Refusal(
      'Work is checked by somebody who did not do it. Ask your partner of the day, or somebody independent.',
    )
  const photosOnly = how === 'from_photos' && outcome === 'good'
  if (photosOnly && (await hasBonded(tx, record.anchorId, record.fitted)))
    throw new Refusal(
      'Photos alone do not check a bonded bolt. Check it on the rope, or by a load test after the cure.',
    )
  return record
}

/**
 * Checks recorded work, by somebody who did not do it. Photos alone never check a bonded bolt. Good work can be closed;
 * returned work goes back to its worker, and its hazards are open again.
 */
export async function checkWork(db: Database, given: Given) {
  const { act, appUrl, orderId, who, ...check } = given
  return await inCommand(db, async tx => {
    const { order, anchorIds } = await requireWork(tx, orderId)
    const returned = check.outcome === 'returned'
    const did = returned ? 'returned' : 'checked'
    await requireWorking(tx, order, act.by.personId, 'Another checks this work.')
    const record = await requireCheckable(tx, given)
    await moveOrder(tx, act, order, returned ? 'accepted' : 'checked', { verb: did, public: true })
    await tx
      .insert(workChecks)
      .values({ id: act.newId(), workRecordId: record.id, by: act.by.personId!, at: act.now, ...check })
    if (returned) {
      await reopen(tx, act, order, record.id)
      await refreshAnchors(tx, act, anchorIds)
      await tellWorker(tx, order, given, record.id)
    }
    await tellMaker(tx, act, order, { key: record.id, who, did, words: check.words, appUrl })
    return {}
  })
}

async function reopen(tx: Transaction, act: Act, order: Order, recordId: string): Promise<void> {
  await tx
    .update(workRecords)
    .set({ outcome: 'returned', updatedAt: act.now })
    .where(eq(workRecords.id, recordId))
  for (const hazard of order.hazards)
    await moveHazard(tx, act, hazard.id, { from: ['mended'], to: 'open', verb: 'reopened' })
}

async function tellWorker(tx: Transaction, order: Order, given: Given, recordId: string): Promise<void> {
  const { act, who, words, appUrl } = given
  const to = await findAddress(tx, order.workerId)
  if (to === null) return
  const url = `${appUrl}/orders/${order.code}`
  const mail = { orderId: order.id, to, title: order.title, key: `${recordId}:worker`, who, words, url }
  await queueMail(tx, act, toProgressMail({ ...mail, did: 'returned' }))
}
