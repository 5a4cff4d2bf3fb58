import { and, eq, inArray } from 'drizzle-orm'
import { listClimbsOf } from '~/crags/anchors.server'
import { requireCragSubject } from '~/crags/crags.server'
import type { Database, Transaction } from '~/db/client.server'
import { holdingRevision, isInForceAt } from '~/db/notices-in-force'
import { noticeHazards, noticeRevisions, notices } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Viewer } from '~/people/viewer'
import type { Act } from '~/record/act'
import { hazardStateWords } from '~/reports/hazard'
import { findHazard, type Hazard } from '~/reports/hazards.server'
import { toFirstWarning, toWarnedPlace } from './first-warning'
import { insertNotice, type NewNotice } from './insert.server'
import { lockHazards } from './lock.server'
import { toReviewMail } from './mails'
import { findPublisher, type NoticeKind, noticeKindWords } from './notice'
import { listAccessOfficers } from './officers.server'
import { markWithdrawn } from './withdraw.server'

const week = 7 * 86_400_000

interface Publishing {
  hazardCode: string
  viewer: Viewer
  act: Act
  appUrl: string
}

/** The hazard, its row locked, if a notice may be published about it; else refuses in a sentence. */
async function requireWarnable(tx: Transaction, viewer: Viewer, code: string): Promise<Hazard> {
  const [row] = await tx.select({ id: hazards.id }).from(hazards).where(eq(hazards.code, code)).limit(1)
  if (row !== undefined) await lockHazards(tx, [row.id])
  const hazard = await findHazard(tx, viewer, code)
  if (hazard === null) throw new Refusal('This hazard is no longer on record.')
  if (hazard.state !== 'open' && hazard.state !== 'warned')
    throw new Refusal(
      `This hazard is ${hazardStateWords[hazard.state]} now, so nobody needs a warning of it.`,
    )
  if (hazard.band === 'turn' || hazard.band === 'watch')
    throw new Refusal(
      'Its urgency is In turn or lower; notices are kept for what is to be mended first or soon.',
    )
  return hazard
}

/** The organisation in whose name the viewer publishes at this hazard's crag. */
async function requireOrganisation(
  tx: Transaction,
  viewer: Viewer,
  hazard: Hazard,
  action: 'warning:publish' | 'notice:manage',
): Promise<string> {
  const publisher = findPublisher(viewer, action, await requireCragSubject(tx, hazard.cragId))
  if (publisher === null) throw new Refusal('Your organisation does not look after this crag.')
  return publisher.organisationId
}

/** The notices of some kinds in force about a hazard. */
async function listStanding(tx: Transaction, act: Act, hazardId: string, kinds: readonly NoticeKind[]) {
  return await tx
    .select({ id: notices.id })
    .from(notices)
    .innerJoin(noticeRevisions, holdingRevision)
    .innerJoin(noticeHazards, eq(noticeHazards.noticeId, notices.id))
    .where(and(eq(noticeHazards.hazardId, hazardId), isInForceAt(act.now), inArray(notices.kind, [...kinds])))
}

/**
 * Publishes a first warning of one hazard: fixed words, seven days and while the hazard is open. The hazard is warned
 * about from then on; every access officer of the crag is asked by mail to confirm, revise or withdraw it.
 */
export async function publishFirstWarning(db: Database, { hazardCode, viewer, act, appUrl }: Publishing) {
  return await inCommand(db, async tx => {
    const hazard = await requireWarnable(tx, viewer, hazardCode)
    if ((await listStanding(tx, act, hazard.id, ['first_warning', 'hazard'])).length > 0)
      throw new Refusal('A warning of this hazard stands already; it is shown above.')
    const organisationId = await requireOrganisation(tx, viewer, hazard, 'warning:publish')
    const climbs = hazard.anchorId === null ? [] : await listClimbsOf(tx, hazard.anchorId)
    const warning = toFirstWarning(toWarnedPlace(hazard, climbs))
    const made = await insertNotice(
      tx,
      act,
      { hazard, organisationId },
      {
        kind: 'first_warning',
        ...warning,
        startsAt: act.now,
        endsAt: new Date(act.now.getTime() + week),
        whileOpen: true,
        decidedByWords: null,
        ground: null,
        reviewOn: null,
        confirmed: false,
      },
    )
    for (const officer of await listAccessOfficers(tx, hazard.cragId))
      await queueMail(tx, act, toReviewMail({ ...made, ...warning, officer, appUrl }))
    return { noticeCode: made.code }
  })
}

/**
 * Publishes an access officer's notice of a hazard in their own words. A hazard notice takes the place of the first
 * warning; any other kind stands beside it. Of two of one kind about one hazard the second is refused.
 */
export async function publishNotice(
  db: Database,
  given: Omit<Publishing, 'appUrl'> & { notice: Omit<NewNotice, 'confirmed' | 'startsAt' | 'whileOpen'> },
) {
  const { hazardCode, viewer, act, notice } = given
  return await inCommand(db, async tx => {
    const hazard = await requireWarnable(tx, viewer, hazardCode)
    const organisationId = await requireOrganisation(tx, viewer, hazard, 'notice:manage')
    if ((await listStanding(tx, act, hazard.id, [notice.kind])).length > 0)
      throw new Refusal(
        `A notice of the kind “${noticeKindWords[notice.kind]}” about this hazard stands already. Withdraw it first to write it anew.`,
      )
    if (notice.kind === 'hazard')
      for (const { id } of await listStanding(tx, act, hazard.id, ['first_warning']))
        await markWithdrawn(tx, act, { noticeId: id, cragId: hazard.cragId })
    const made = await insertNotice(
      tx,
      act,
      { hazard, organisationId },
      { ...notice, startsAt: act.now, whileOpen: false, confirmed: true },
    )
    return { noticeCode: made.code }
  })
}
