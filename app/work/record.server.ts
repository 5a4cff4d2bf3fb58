import { eq } from 'drizzle-orm'
import type { Material, PartKind, Side } from '~/crags/part'
import type { Database, Transaction } from '~/db/client.server'
import { workParts, workRecords } from '~/db/schema/work'
import { inCommand, isDuplicate, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { moveHazard } from '~/reports/hazards.server'
import { claimPhotos } from '~/reports/photos.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { toCheckDueMail } from './mails'
import { moveOrder, requireOrder } from './move.server'
import { tellMaker } from './offer.server'
import { listRebolters } from './order-details.server'
import { findOrderById, lockAnchors, type Order } from './orders.server'

/** One part fitted, in the place of another or beside what is there. */
export interface FittedPart {
  replaces: string | null
  side: Side | null
  kind: PartKind
  material: Material
  sizeMm: number | null
  marking: string | null
}

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
  fitted: FittedPart[]
  /** who records, for the mail to the coordinator */
  who: string
}

async function findRecorded(tx: Pick<Transaction, 'select'>, clientKey: string): Promise<boolean> {
  const rows = await tx
    .select({ id: workRecords.id })
    .from(workRecords)
    .where(eq(workRecords.clientKey, clientKey))
    .limit(1)
  return rows.length > 0
}

/**
 * Records an accepted job as done: what was fitted, with a photo or a reason for none. Its hazards are mended and wait
 * for a check; the coordinator is told, and so are those who could check. The same client key records once.
 */
export async function recordWork(db: Database, given: NewRecord & { act: Act; appUrl: string }) {
  const { act, appUrl, ...record } = given
  if (await findRecorded(db, record.clientKey)) return { ok: true as const }
  const done = inCommand(db, async tx => {
    const before = await findOrderById(tx, record.orderId)
    if (before === null) throw new Refusal('This order is no longer on record.')
    const anchorIds = await lockAnchors(tx, before.hazards)
    const order = await requireOrder(tx, record.orderId)
    if (await findRecorded(tx, record.clientKey)) return {}
    if (order.state === 'accepted' && order.workerId !== act.by.personId)
      throw new Refusal(
        'Only whoever has accepted the job can record it. Ask the coordinator to offer it to you.',
      )
    if (record.photoKeys.length === 0 && record.noPhotoReason === null)
      throw new Refusal('Add a photo of the work, or say why there is none.')
    await moveOrder(tx, act, order, 'done', { verb: 'done', public: true })
    const recordId = await insertRecord(tx, act, record, anchorIds[0] ?? null)
    for (const hazard of order.hazards)
      await moveHazard(tx, act, hazard.id, { from: ['open', 'warned'], to: 'mended', verb: 'mended' })
    await refreshAnchors(tx, act, anchorIds)
    await tellAll(tx, act, order, record, recordId, appUrl)
    return {}
  })
  return await done.catch(error => {
    if (isDuplicate(error)) return { ok: true as const }
    throw error
  })
}

async function insertRecord(
  tx: Transaction,
  act: Act,
  record: NewRecord,
  anchorId: string | null,
): Promise<string> {
  if (anchorId === null) throw new Refusal('Work off a fixed point cannot be recorded here yet.')
  const id = act.newId()
  await tx.insert(workRecords).values({
    id,
    clientKey: record.clientKey,
    orderId: record.orderId,
    anchorId,
    by: act.by.personId!,
    doneOn: record.doneOn,
    minutes: record.minutes,
    words: record.words,
    noPhotoReason: record.noPhotoReason,
    outcome: 'done',
    createdAt: act.now,
    updatedAt: act.now,
  })
  for (const part of record.fitted)
    await tx.insert(workParts).values({ id: act.newId(), workRecordId: id, ...part })
  const { photoKeys: keys, stagedBy } = record
  if (stagedBy !== null) await claimPhotos(tx, act, { keys, stagedBy, target: { workRecordId: id } })
  await writeActivity(tx, act, { verb: 'mended', subjectKind: 'anchor', subjectId: anchorId, public: true })
  return id
}

async function tellAll(
  tx: Transaction,
  act: Act,
  order: Order,
  record: NewRecord,
  recordId: string,
  appUrl: string,
) {
  await tellMaker(tx, act, order, {
    key: recordId,
    who: record.who,
    did: 'done',
    words: record.words,
    appUrl,
  })
  for (const to of await listRebolters(tx, order.organisationId)) {
    if (to.id === act.by.personId) continue
    const mail = toCheckDueMail({
      orderId: order.id,
      to,
      title: order.title,
      recordId,
      url: `${appUrl}/orders/${order.code}`,
    })
    await queueMail(tx, act, mail)
  }
}
