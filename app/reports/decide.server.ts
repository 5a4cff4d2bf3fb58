import { and, eq, inArray } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { anchors } from '~/db/schema/crags'
import { parts } from '~/db/schema/parts'
import { hazards } from '~/db/schema/reports'
import { inCommand, Refusal } from '~/db/transaction.server'
import { toCode } from '~/lib/code'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { toFailureMode } from './failure-mode'
import { formatHeadline } from './finding-words'
import { dangerousStates } from './hazard'
import { rateHazard } from './judging.server'
import type { ReportLinks } from './links.server'
import { choosePart } from './part-for-finding'
import { publishPhotos } from './photos.server'
import {
  listFound,
  moveReport,
  type PlacedReport,
  requireMove,
  requireReport,
  tellReporter,
} from './placed-report.server'
import { refreshAnchors } from './refresh.server'

/** The open hazard of the same failure mode at the same fixed point, or a new one. Its id and code. */
async function joinOrOpen(tx: Transaction, act: Act, report: PlacedReport) {
  if (report.anchorId === null) throw new Refusal('Say first which fixed point this is about.')
  // two reports of one fault taken in at the same moment must meet in one hazard
  await tx.select({ id: anchors.id }).from(anchors).where(eq(anchors.id, report.anchorId)).for('update')
  const found = await listFound(tx, report.id)
  const mode = toFailureMode(found[0]!.kind)
  const [same] = await tx
    .select({ id: hazards.id, code: hazards.code })
    .from(hazards)
    .where(
      and(
        eq(hazards.anchorId, report.anchorId),
        eq(hazards.mode, mode),
        inArray(hazards.state, dangerousStates),
      ),
    )
    .limit(1)
    .for('update')
  if (same !== undefined) return { ...same, joined: true }
  const there = await tx
    .select({ id: parts.id, kind: parts.kind })
    .from(parts)
    .where(eq(parts.anchorId, report.anchorId))
  const part = there.find(one => one.id === found[0]!.partId) ?? choosePart(found[0]!.kind, there)
  const id = act.newId()
  const code = toCode(report.cragCode.slice(0, 2), act.random)
  await tx.insert(hazards).values({
    id,
    code,
    cragId: report.cragId,
    anchorId: report.anchorId,
    climbId: report.climbId,
    partId: part?.id ?? null,
    mode,
    headline: formatHeadline(report.position, part?.kind ?? null, found),
    state: 'open',
    openedAt: act.now,
    createdAt: act.now,
    updatedAt: act.now,
  })
  await writeActivity(tx, act, {
    verb: 'opened',
    subjectKind: 'hazard',
    subjectId: id,
    cragId: report.cragId,
    public: true,
  })
  return { id, code, joined: false }
}

interface Decision {
  reportId: string
  act: Act
  links: ReportLinks
}

/**
 * Takes a report in: it joins the open hazard of the same problem or opens one; the hazard is rated from all its
 * reports, the point's condition follows, the photos chosen are let out, the reporter is told.
 */
export async function takeIn(
  db: Database,
  { reportId, act, links, publicPhotoKeys }: Decision & { publicPhotoKeys: string[] },
) {
  return await inCommand(db, async tx => {
    const report = await requireReport(tx, reportId)
    requireMove(report, 'taken_in')
    const hazard = await joinOrOpen(tx, act, report)
    await moveReport(tx, act, report, 'taken_in', { hazardId: hazard.id, reason: null })
    await rateHazard(tx, act, hazard.id, report.anchorId!, hazard.joined ? 'joined' : 'opened')
    await publishPhotos(tx, act, publicPhotoKeys)
    await refreshAnchors(tx, act, [report.anchorId!])
    await tellReporter(tx, act, report, links, 'taken_in', null)
    return { hazardCode: hazard.code, joined: hazard.joined }
  })
}

/** Puts a report on record without a hazard: what was seen counts for the point's condition, nothing is to be mended. */
export async function putOnRecord(db: Database, { reportId, act, links }: Decision) {
  return await inCommand(db, async tx => {
    const report = await requireReport(tx, reportId)
    await moveReport(tx, act, report, 'on_record', { reason: null })
    if (report.anchorId !== null) await refreshAnchors(tx, act, [report.anchorId])
    await tellReporter(tx, act, report, links, 'on_record', null)
    return {}
  })
}

/** Asks the reporter a question; the report comes back as received when it is answered. */
export async function askDetail(
  db: Database,
  { reportId, act, links, question }: Decision & { question: string },
) {
  return await inCommand(db, async tx => {
    const report = await requireReport(tx, reportId)
    await moveReport(tx, act, report, 'needs_detail', { reason: question })
    await tellReporter(tx, act, report, links, 'needs_detail', question)
    return {}
  })
}

/** Declines a report with a reason the reporter reads. */
export async function declineReport(
  db: Database,
  { reportId, act, links, reason }: Decision & { reason: string },
) {
  return await inCommand(db, async tx => {
    const report = await requireReport(tx, reportId)
    await moveReport(tx, act, report, 'declined', { reason })
    await tellReporter(tx, act, report, links, 'declined', reason)
    return {}
  })
}
