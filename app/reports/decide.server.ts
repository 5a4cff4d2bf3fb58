import { and, eq, inArray } from 'drizzle-orm'
import { formatPosition } from '~/crags/anchor'
import type { Database, Transaction } from '~/db/client.server'
import { anchors, climbAnchors, climbs, crags } from '~/db/schema/crags'
import { parts } from '~/db/schema/parts'
import { people } from '~/db/schema/people'
import { findings, hazards, reports } from '~/db/schema/reports'
import { inCommand, Refusal } from '~/db/transaction.server'
import { toCode } from '~/lib/code'
import { findMove } from '~/lib/moves'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { toFailureMode } from './failure-mode'
import { formatFinding, formatHeadline } from './finding-words'
import { dangerousStates } from './hazard'
import { rateHazard } from './judging.server'
import type { ReportLinks } from './links.server'
import { toDecidedMail } from './mails'
import { choosePart } from './part-for-finding'
import { publishPhotos } from './photos.server'
import { refreshAnchors } from './refresh.server'
import { type ReportState, reportMoves, reportStateWords } from './report'

const columns = {
  id: reports.id,
  state: reports.state,
  cragId: reports.cragId,
  cragName: crags.name,
  cragCode: crags.code,
  climbId: reports.climbId,
  climbName: climbs.name,
  anchorId: reports.anchorId,
  anchorKind: anchors.kind,
  ordinal: climbAnchors.ordinal,
  personId: reports.personId,
  personEmail: people.email,
  guestEmail: reports.guestEmail,
  confirmedAt: reports.confirmedAt,
}

/** The report with its place, its row locked for the rest of the transaction. */
async function requireReport(tx: Transaction, reportId: string) {
  const [row] = await tx
    .select(columns)
    .from(reports)
    .innerJoin(crags, eq(crags.id, reports.cragId))
    .leftJoin(climbs, eq(climbs.id, reports.climbId))
    .leftJoin(anchors, eq(anchors.id, reports.anchorId))
    .leftJoin(
      climbAnchors,
      and(eq(climbAnchors.climbId, reports.climbId), eq(climbAnchors.anchorId, reports.anchorId)),
    )
    .leftJoin(people, eq(people.id, reports.personId))
    .where(eq(reports.id, reportId))
    .limit(1)
    .for('update')
  if (row === undefined) throw new Refusal('This report is no longer on record.')
  const position = formatPosition(row.anchorKind ?? 'bolt', row.ordinal ?? 1)
  return { ...row, position, place: `${position.toLowerCase()} on ${row.climbName}, ${row.cragName}` }
}

type PlacedReport = Awaited<ReturnType<typeof requireReport>>

function requireMove(report: PlacedReport, to: ReportState): void {
  if (findMove(reportMoves, report.state, to) === null)
    throw new Refusal(
      `This report is ${reportStateWords[report.state]} already, so it cannot be ${reportStateWords[to]} now. Open it again to see what was decided.`,
    )
}

/** Moves a report by the table of moves; of two people at once the second reads what it has become. */
async function moveReport(
  tx: Transaction,
  act: Act,
  report: PlacedReport,
  to: ReportState,
  set: { reason?: string | null; hazardId?: string } = {},
): Promise<void> {
  requireMove(report, to)
  const decided = act.by.personId === null ? {} : { decidedBy: act.by.personId, decidedAt: act.now }
  await tx
    .update(reports)
    .set({ state: to, ...set, ...decided, updatedAt: act.now })
    .where(and(eq(reports.id, report.id), eq(reports.state, report.state)))
  await writeActivity(tx, act, {
    verb: to,
    subjectKind: 'report',
    subjectId: report.id,
    cragId: report.cragId,
  })
}

async function listFound(tx: Transaction, reportId: string) {
  return await tx
    .select({
      kind: findings.kind,
      unit: findings.unit,
      low: findings.low,
      high: findings.high,
      edge: findings.edge,
      partId: findings.partId,
    })
    .from(findings)
    .where(eq(findings.reportId, reportId))
    .orderBy(findings.id)
}

async function tellReporter(
  tx: Transaction,
  act: Act,
  report: PlacedReport,
  links: ReportLinks,
  verb: 'taken_in' | 'on_record' | 'declined' | 'needs_detail',
  words: string | null,
) {
  const to = report.personEmail ?? report.guestEmail
  if (to === null || report.confirmedAt === null) return
  const found = (await listFound(tx, report.id)).map(formatFinding).join('; ')
  const mail = toDecidedMail({
    reportId: report.id,
    to,
    personId: report.personId,
    place: `the ${report.place}`,
    found,
    statusUrl: `${links.appUrl}/status/${links.toStatusSecret(report.id)}`,
    verb,
    words,
  })
  await queueMail(tx, act, mail)
}

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

/** The reporter's answer to a question, added to what was said; the report is received again. */
export async function answerDetail(
  db: Database,
  { reportId, act, answer }: Omit<Decision, 'links'> & { answer: string },
) {
  return await inCommand(db, async tx => {
    const report = await requireReport(tx, reportId)
    const [said] = await tx
      .select({ words: reports.words })
      .from(reports)
      .where(eq(reports.id, reportId))
      .limit(1)
    await moveReport(tx, act, report, 'received')
    await tx
      .update(reports)
      .set({ words: [said?.words, answer].filter(Boolean).join('\n\n'), updatedAt: act.now })
      .where(eq(reports.id, reportId))
    return {}
  })
}

/** The author takes a report back, before it is taken in. */
export async function withdrawReport(db: Database, { reportId, act }: Omit<Decision, 'links'>) {
  return await inCommand(db, async tx => {
    const report = await requireReport(tx, reportId)
    await moveReport(tx, act, report, 'withdrawn')
    return {}
  })
}
