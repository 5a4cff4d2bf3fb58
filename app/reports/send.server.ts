import { and, asc, eq } from 'drizzle-orm'
import type { Database, Queryable, Transaction } from '~/db/client.server'
import { cragKeepers } from '~/db/schema/crags'
import { people } from '~/db/schema/people'
import { findings, reports } from '~/db/schema/reports'
import { linkTokens } from '~/db/schema/work'
import { inTransaction, isDuplicate } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { hashSecret } from '~/record/acts.server'
import { formatFinding } from './finding-words'
import { rateReport } from './judging.server'
import type { ReportLinks } from './links.server'
import { toDutyMail, toReceivedMail } from './mails'
import { claimPhotos } from './photos.server'
import type { HowSeen } from './report'
import type { NewFinding } from './report.schema'

export interface NewReport {
  /** made by the form: sending it twice is one report */
  clientKey: string
  cragId: string
  climbId: string
  anchorId: string
  /** "the lower-off on Slack Water, Gannet Wall" */
  place: string
  seenOn: string
  howSeen: HowSeen
  words: string | null
  findings: NewFinding[]
  photoKeys: string[]
  stagedBy: string | null
  person: { id: string; email: string } | null
  guestEmail: string | null
}

/** The people on duty for a crag who are not away on that day, keeper first. */
export async function listOnDuty(db: Queryable, cragId: string, today: string) {
  const rows = await db
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      awayFrom: cragKeepers.awayFrom,
      awayTo: cragKeepers.awayTo,
    })
    .from(cragKeepers)
    .innerJoin(people, eq(people.id, cragKeepers.personId))
    .where(eq(cragKeepers.cragId, cragId))
    .orderBy(asc(cragKeepers.rank))
    .limit(20)
  const isAway = (row: (typeof rows)[number]) =>
    row.awayFrom !== null && row.awayFrom <= today && (row.awayTo === null || row.awayTo >= today)
  return rows.flatMap(row => (row.email === null || isAway(row) ? [] : [{ ...row, email: row.email }]))
}

async function findSent(db: Queryable, clientKey: string) {
  const [row] = await db
    .select({ id: reports.id })
    .from(reports)
    .where(eq(reports.clientKey, clientKey))
    .limit(1)
  return row ?? null
}

async function insertReport(tx: Transaction, act: Act, id: string, report: NewReport): Promise<void> {
  await tx.insert(reports).values({
    id,
    clientKey: report.clientKey,
    cragId: report.cragId,
    climbId: report.climbId,
    anchorId: report.anchorId,
    seenOn: report.seenOn,
    recordedAt: act.now,
    receivedAt: act.now,
    howSeen: report.howSeen,
    personId: report.person?.id ?? null,
    guestEmail: report.guestEmail,
    confirmedAt: report.person === null ? null : act.now,
    words: report.words,
    state: 'received',
    createdAt: act.now,
    updatedAt: act.now,
  })
  for (const finding of report.findings)
    await tx.insert(findings).values({ id: act.newId(), reportId: id, ...finding, createdAt: act.now })
}

async function makeLinks(tx: Transaction, act: Act, id: string, links: ReportLinks, guest: boolean) {
  const statusUrl = `${links.appUrl}/status/${links.toStatusSecret(id)}`
  if (!guest) return { statusUrl, confirmUrl: null }
  const confirm = act.newSecret()
  await tx.insert(linkTokens).values({
    tokenHash: hashSecret(confirm),
    purpose: 'report_confirm',
    reportId: id,
    expiresAt: new Date(act.now.getTime() + 30 * 86_400_000),
    createdAt: act.now,
  })
  return { statusUrl, confirmUrl: `${links.appUrl}/status/confirm/${confirm}` }
}

async function tellDuty(
  tx: Transaction,
  act: Act,
  id: string,
  report: NewReport,
  found: string,
  appUrl: string,
) {
  const [first] = await listOnDuty(tx, report.cragId, act.now.toISOString().slice(0, 10))
  if (first === undefined) return
  const mail = toDutyMail({
    reportId: id,
    to: first.email,
    personId: first.id,
    place: report.place,
    found,
    confirmed: report.person !== null,
    url: `${appUrl}/reports/${id}`,
  })
  await queueMail(tx, act, mail)
}

/**
 * Receives a report with its findings and photos, rates it provisionally, makes its private link, writes the record
 * and queues the mails: all of it or nothing. The same client key gives the same report again.
 */
export async function sendReport(
  db: Database,
  given: NewReport & { act: Act; links: ReportLinks },
): Promise<{ reportId: string; statusSecret: string }> {
  const { act, links, ...report } = given
  const reportId = await inTransaction(db, tx => receive(tx, act, report, links)).catch(async error => {
    // the same form sent twice at the same moment: the other one won
    const sent = isDuplicate(error) ? await findSent(db, report.clientKey) : null
    if (sent === null) throw error
    return sent.id
  })
  return { reportId, statusSecret: links.toStatusSecret(reportId) }
}

async function receive(tx: Transaction, act: Act, report: NewReport, links: ReportLinks): Promise<string> {
  const sent = await findSent(tx, report.clientKey)
  if (sent !== null) return sent.id
  const id = act.newId()
  await insertReport(tx, act, id, report)
  const { photoKeys: keys, stagedBy } = report
  if (stagedBy !== null) await claimPhotos(tx, act, { keys, stagedBy, target: { reportId: id } })
  const judgement = await rateReport(tx, act, id, report.anchorId)
  const urls = await makeLinks(tx, act, id, links, report.person === null)
  const found = report.findings.map(formatFinding).join('; ')
  await tellReporter(tx, act, id, report, found, urls)
  if (judgement?.band === 'first') await tellDuty(tx, act, id, report, found, links.appUrl)
  await writeActivity(tx, act, {
    verb: 'received',
    subjectKind: 'report',
    subjectId: id,
    cragId: report.cragId,
  })
  return id
}

async function tellReporter(
  tx: Transaction,
  act: Act,
  reportId: string,
  report: NewReport,
  found: string,
  urls: { statusUrl: string; confirmUrl: string | null },
): Promise<void> {
  const to = report.person?.email ?? report.guestEmail
  if (to === null) return
  const personId = report.person?.id ?? null
  await queueMail(tx, act, toReceivedMail({ reportId, to, personId, place: report.place, found, ...urls }))
}

/** Confirms a guest's address by the link mailed to it; null when the link is unknown or has run out. */
export async function confirmGuest(
  db: Database,
  act: Act,
  secret: string,
): Promise<{ reportId: string } | null> {
  return await inTransaction(db, async tx => {
    const [link] = await tx
      .select({ reportId: linkTokens.reportId, expiresAt: linkTokens.expiresAt, usedAt: linkTokens.usedAt })
      .from(linkTokens)
      .where(and(eq(linkTokens.tokenHash, hashSecret(secret)), eq(linkTokens.purpose, 'report_confirm')))
      .limit(1)
    if (link?.reportId == null || (link.expiresAt !== null && link.expiresAt < act.now)) return null
    if (link.usedAt !== null) return { reportId: link.reportId }
    await tx
      .update(linkTokens)
      .set({ usedAt: act.now })
      .where(eq(linkTokens.tokenHash, hashSecret(secret)))
    await tx
      .update(reports)
      .set({ confirmedAt: act.now, updatedAt: act.now })
      .where(eq(reports.id, link.reportId))
    await writeActivity(tx, act, { verb: 'confirmed', subjectKind: 'report', subjectId: link.reportId })
    return { reportId: link.reportId }
  })
}
