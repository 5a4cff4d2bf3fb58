import { and, eq } from 'drizzle-orm'
import { formatPosition } from '~/crags/anchor'
import type { Transaction } from '~/db/client.server'
import { anchors, climbAnchors, climbs, crags } from '~/db/schema/crags'
import { people } from '~/db/schema/people'
import { findings, reports } from '~/db/schema/reports'
import { Refusal } from '~/db/transaction.server'
import { findMove } from '~/lib/moves'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { formatFinding } from './finding-words'
import type { ReportLinks } from './links.server'
import { toDecidedMail } from './mails'
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
export async function requireReport(tx: Transaction, reportId: string) {
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

export type PlacedReport = Awaited<ReturnType<typeof requireReport>>

export function requireMove(report: PlacedReport, to: ReportState): void {
  if (findMove(reportMoves, report.state, to) === null)
    throw new Refusal(
      `This report is ${reportStateWords[report.state]} already, so it cannot be ${reportStateWords[to]} now. Open it again to see what was decided.`,
    )
}

/** Moves a report by the table of moves; of two people at once the second reads what it has become. */
export async function moveReport(
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

export async function listFound(tx: Transaction, reportId: string) {
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

export async function tellReporter(
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
