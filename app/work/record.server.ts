import { and, eq } from 'drizzle-orm'
import type { Database, Queryable, Transaction } from '~/db/client.server'
import { workRecords } from '~/db/schema/work'
import { inCommand, isDuplicate, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { moveHazard } from '~/reports/hazards.server'
import { claimPhotos } from '~/reports/photos.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { type FittedPart, insertFitted } from './fitted.server'
import { requireWork } from './lock.server'
import { toCheckDueMail } from './mails'
import { moveOrder } from './move.server'
import type { Order } from './orders.server'
import { tellMaker } from './tell.server'
import { listRebolters, requireWorking } from './workers.server'

export interface NewRecord {
  orderId: string
  /** made by the form: sending it twice is one record */
  clientKey: string
  doneOn: string
  minutes: number | null
  words: string | null
  /** a stated reason when there is no photo */
  noPhotoReason: string | null
  photoKeys: string[]
  stagedBy: string | null
  /** everything fitted by this order, also what an earlier record of it that came back named */
  fitted: FittedPart[]
  /** who records, for the mail to the coordinator */
  who: string
}

type Given = NewRecord & { act: Act; appUrl: string }

/** Whether this very form has been recorded already, by the same person for the same order. */
async function isRecorded(db: Queryable, { clientKey, orderId, act }: Given): Promise<boolean> {
  const rows = await db
    .select({ id: workRecords.id })
    .from(workRecords)
    .where(
      and(
        eq(workRecords.clientKey, clientKey),
        eq(workRecords.orderId, orderId),
        eq(workRecords.by, act.by.personId!),
      ),
    )
    .limit(1)
  return rows.length > 0
}

/**
 * Records an accepted job as done: what was fitted, with a photo or a reason for none. Its hazards are mended and wait
 * for a check; the coordinator is told, and so are those who could check. The same client key records once.
 */
export async function recordWork(db: Database, given: Given) {
  const { act } = given
  if (await isRecorded(db, given)) return { ok: true as const }
  const done = inCommand(db, async tx => {
    const { order, anchorIds } = await requireWork(tx, given.orderId)
    if (await isRecorded(tx, given)) return {}
    if (order.state === 'accepted' && order.workerId !== act.by.personId)
      throw new Refusal(
        'Only whoever has accepted the job can record it. Ask the coordinator to offer it to you.',
      )
    await requireWorking(tx, order, act.by.personId, 'Tell its coordinator what was done.')
    await moveOrder(tx, act, order, 'done', { verb: 'done', public: true })
    const [anchorId] = anchorIds
    if (anchorId === undefined) throw new Refusal('Work off a fixed point cannot be recorded here yet.')
    const recordId = await insertRecord(tx, given, anchorId)
    for (const hazard of order.hazards)
      await moveHazard(tx, act, hazard.id, { from: ['open', 'warned'], to: 'mended', verb: 'mended' })
    await refreshAnchors(tx, act, anchorIds)
    await tellAll(tx, order, given, recordId)
    return {}
  })
  return await done.catch(error => {
    if (!isDuplicate(error)) throw error
    const reason = 'This form was sent before, for another job. Open the record form of this job again.'
    return isRecorded(db, given).then(same => (same ? { ok: true as const } : { ok: false as const, reason }))
  })
}

async function insertRecord(tx: Transaction, given: Given, anchorId: string): Promise<string> {
  const { act, photoKeys: keys, stagedBy, fitted } = given
  const { orderId, clientKey, doneOn, minutes, words, noPhotoReason } = given
  const id = act.newId()
  const by = act.by.personId!
  await tx.insert(workRecords).values({
    id,
    ...{ orderId, clientKey, anchorId, by, doneOn, minutes, words, noPhotoReason },
    outcome: 'done',
    createdAt: act.now,
    updatedAt: act.now,
  })
  await insertFitted(tx, act, { recordId: id, anchorId, fitted })
  const target = { workRecordId: id }
  const kept = stagedBy === null ? 0 : await claimPhotos(tx, act, { keys, stagedBy, target })
  if (kept === 0 && noPhotoReason === null)
    throw new Refusal('Add a photo of the work, or say why there is none, for example “the camera fell”.')
  await writeActivity(tx, act, { verb: 'mended', subjectKind: 'anchor', subjectId: anchorId, public: true })
  return id
}

/** The coordinator hears that it is done; the organisation's other rebolters that a check is due. */
async function tellAll(tx: Transaction, order: Order, given: Given, recordId: string): Promise<void> {
  const { act, who, words, appUrl } = given
  await tellMaker(tx, act, order, { key: recordId, who, did: 'done', words, appUrl })
  const url = `${appUrl}/orders/${order.code}`
  for (const to of await listRebolters(tx, order.organisationId))
    if (to.id !== act.by.personId)
      await queueMail(tx, act, toCheckDueMail({ orderId: order.id, to, title: order.title, recordId, url }))
}
