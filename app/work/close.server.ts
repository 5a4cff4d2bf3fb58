import { and, eq, inArray, isNull } from 'drizzle-orm'
import { formatPart } from '~/crags/part'
import { addPart } from '~/crags/places.server'
import type { Database, Transaction } from '~/db/client.server'
import { parts } from '~/db/schema/parts'
import { findings, reports } from '~/db/schema/reports'
import { inCommand, Refusal } from '~/db/transaction.server'
import { toDay } from '~/lib/dates'
import { queueMail } from '~/mail/outbox.server'
import { endFirstWarnings } from '~/notices/end.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { recordCheck } from '~/reports/checks.server'
import { clearFindings } from '~/reports/findings.server'
import { type Hazard, listHazardReporters, moveHazard } from '~/reports/hazards.server'
import type { ReportLinks } from '~/reports/links.server'
import { listPhotos, publishPhotos } from '~/reports/photos.server'
import { refreshAnchors } from '~/reports/refresh.server'
import type { HowSeen } from '~/reports/report'
import { requireWork } from './lock.server'
import { toThanksMail } from './mails'
import { moveOrder } from './move.server'
import type { CheckMethod } from './order'
import { findRecord } from './order-details.server'
import { type Order, toPlace } from './orders.server'

type Recorded = NonNullable<Awaited<ReturnType<typeof findRecord>>>

/** What stood on record, without a hazard, about a part that was taken out goes with the part. */
async function clearFindingsOfPart(
  tx: Transaction,
  act: Act,
  { partId, byRecordId }: { partId: string; byRecordId: string },
): Promise<void> {
  const onRecord = tx
    .select({ id: reports.id })
    .from(reports)
    .where(and(eq(reports.state, 'on_record'), isNull(reports.hazardId)))
  await tx
    .update(findings)
    .set({ clearedAt: act.now, clearedByRecord: byRecordId })
    .where(and(eq(findings.partId, partId), isNull(findings.clearedAt), inArray(findings.reportId, onRecord)))
}

/** Takes replaced parts off the record and puts on it what was fitted, from the day of the work. */
async function renewParts(tx: Transaction, act: Act, record: Recorded): Promise<void> {
  for (const fitted of record.fitted) {
    if (fitted.replaces !== null) {
      await tx
        .update(parts)
        .set({ removedOn: record.doneOn, removedByRecord: record.id, updatedAt: act.now })
        .where(
          and(eq(parts.id, fitted.replaces), eq(parts.anchorId, record.anchorId), isNull(parts.removedOn)),
        )
      await clearFindingsOfPart(tx, act, { partId: fitted.replaces, byRecordId: record.id })
    }
    if (fitted.kind === null) continue
    await addPart(tx, act, record.anchorId, {
      kind: fitted.kind,
      material: fitted.material ?? 'unknown',
      side: fitted.side,
      sizeMm: fitted.sizeMm,
      marking: fitted.marking,
      fittedOn: record.doneOn,
      fittedPrecision: 'day',
      fittedByRecord: record.id,
    })
  }
}

const seen: Record<CheckMethod, HowSeen> = { on_the_rope: 'on_it', load_test: 'on_it', from_photos: 'photo' }

/** The check of the work stands at each of its points: somebody trained saw nothing wrong, on the day of the check. */
async function putCheckOnRecord(tx: Transaction, act: Act, order: Order, record: Recorded): Promise<void> {
  const check = record.checks[0]
  if (check?.outcome !== 'good') throw new Refusal('The work has not been checked yet.')
  const at = new Map(order.hazards.map(hazard => [hazard.anchorId, hazard]))
  for (const [anchorId, { cragId, climbId }] of at)
    if (anchorId !== null)
      await recordCheck(tx, act, {
        ...{ cragId, climbId, anchorId },
        personId: check.by,
        seenOn: toDay(check.at, order.timeZone),
        howSeen: seen[check.how],
      })
}

async function thankReporters(
  tx: Transaction,
  act: Act,
  hazard: Hazard,
  record: Recorded,
  picture: { storageKey: string } | null,
  links: ReportLinks,
): Promise<void> {
  const fitted = record.fitted
    .flatMap(part =>
      part.kind === null
        ? []
        : [{ kind: part.kind, material: part.material ?? ('unknown' as const), sizeMm: part.sizeMm }],
    )
    .map(formatPart)
    .join('; ')
  for (const to of await listHazardReporters(tx, hazard.id)) {
    const statusUrl = `${links.appUrl}/status/${links.toStatusSecret(to.reportId)}`
    const mail = toThanksMail({
      hazardId: hazard.id,
      reportId: to.reportId,
      to,
      place: toPlace(hazard),
      fitted,
      statusUrl,
      picture,
    })
    await queueMail(tx, act, mail)
  }
}

/**
 * Closes a checked order with everything that follows, or none of it: hazards cleared, what was found there cleared by
 * this work, parts renewed on record, the check put on record, conditions worked out anew, first warnings ended (of
 * other notices the access officer is asked), the photos chosen let out, reporters thanked with a picture.
 */
export async function closeOrder(
  db: Database,
  given: { orderId: string; act: Act; links: ReportLinks; publicPhotoKeys: string[] },
) {
  const { orderId, act, links } = given
  return await inCommand(db, async tx => {
    const { order, anchorIds } = await requireWork(tx, orderId)
    await moveOrder(tx, act, order, 'closed', { verb: 'closed', set: { closedAt: act.now }, public: true })
    const record = await findRecord(tx, orderId)
    if (record === null) throw new Refusal('Nothing has been recorded for this order yet.')
    const shown = (await listPhotos(tx, { workRecordIds: [record.id] })).filter(photo =>
      given.publicPhotoKeys.includes(photo.storageKey),
    )
    await publishPhotos(
      tx,
      act,
      shown.map(photo => photo.storageKey),
    )
    await renewParts(tx, act, record)
    for (const hazard of order.hazards) {
      await moveHazard(tx, act, hazard.id, { from: ['mended'], to: 'cleared', verb: 'cleared' })
      await clearFindings(tx, act, { hazardId: hazard.id, byRecordId: record.id })
      await thankReporters(tx, act, hazard, record, shown[0] ?? null, links)
    }
    await putCheckOnRecord(tx, act, order, record)
    await endFirstWarnings(tx, act, {
      hazardIds: order.hazards.map(hazard => hazard.id),
      appUrl: links.appUrl,
    })
    await refreshAnchors(tx, act, anchorIds)
    for (const anchorId of anchorIds)
      await writeActivity(tx, act, {
        verb: 'renewed',
        subjectKind: 'anchor',
        subjectId: anchorId,
        cragId: order.cragId,
        public: true,
      })
    return {}
  })
}
