import { and, eq, inArray, sql } from 'drizzle-orm'
import { listClimbsOf } from '~/crags/anchors.server'
import { listKeepingOrganisations } from '~/crags/crags.server'
import type { Database, Transaction } from '~/db/client.server'
import { noticeHazards, noticePlaces, noticeRevisions, notices } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'
import { inCommand, Refusal } from '~/db/transaction.server'
import { toCode } from '~/lib/code'
import { queueMail } from '~/mail/outbox.server'
import { rules } from '~/people/permission'
import type { Viewer } from '~/people/viewer'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { hazardStateWords } from '~/reports/hazard'
import { findHazard, type Hazard, moveHazard } from '~/reports/hazards.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { toFirstWarning } from './first-warning'
import { toReviewMail } from './mails'
import type { NoticeKind } from './notice'
import { listAccessOfficers } from './officers.server'

const week = 7 * 86_400_000

interface Publishing {
  hazardCode: string
  viewer: Viewer
  act: Act
  appUrl: string
}

/** The hazard, its row locked, if a notice may be published about it; else refuses in a sentence. */
async function requireWarnable(tx: Transaction, viewer: Viewer, code: string): Promise<Hazard> {
  await tx.select({ id: hazards.id }).from(hazards).where(eq(hazards.code, code)).for('update')
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
) {
  const rule = rules[action]
  const held = await listKeepingOrganisations(tx, hazard.cragId)
  const mine = viewer.memberships.find(
    membership =>
      rule.to === 'roles' &&
      membership.roles.some(role => rule.roles.includes(role)) &&
      held.some(
        one =>
          one.organisationId === membership.organisationId &&
          (rule.remit === 'any' || one.remit === rule.remit),
      ),
  )
  if (mine === undefined) throw new Refusal('Your organisation does not look after this crag.')
  return mine.organisationId
}

interface NewNotice {
  kind: NoticeKind
  headline: string
  words: string
  startsAt: Date
  endsAt: Date | null
  whileOpen: boolean
  decidedByWords: string | null
  ground: string | null
  reviewOn: string | null
  confirmed: boolean
}

async function insertNotice(
  tx: Transaction,
  act: Act,
  hazard: Hazard,
  organisationId: string,
  notice: NewNotice,
) {
  const id = act.newId()
  const code = toCode(hazard.areaCode, act.random)
  const stamps = { createdAt: act.now, updatedAt: act.now }
  await tx.insert(notices).values({
    id,
    code,
    organisationId,
    kind: notice.kind,
    state: 'published',
    decidedByWords: notice.decidedByWords,
    ground: notice.ground,
    reviewOn: notice.reviewOn,
    publishedBy: act.by.personId,
    publishedAt: act.now,
    ...(notice.confirmed ? { confirmedBy: act.by.personId, confirmedAt: act.now } : {}),
    ...stamps,
  })
  const { headline, words, startsAt, endsAt, whileOpen } = notice
  await tx.insert(noticeRevisions).values({
    noticeId: id,
    number: 1,
    headline,
    words,
    lang: 'en',
    startsAt,
    endsAt,
    whileOpen,
    by: act.by.personId,
    at: act.now,
  })
  await tx.insert(noticeHazards).values({ noticeId: id, hazardId: hazard.id })
  const place = hazard.anchorId !== null ? { anchorId: hazard.anchorId } : { climbId: hazard.climbId }
  await tx.insert(noticePlaces).values({ id: act.newId(), noticeId: id, ...place })
  if (hazard.state === 'open')
    await moveHazard(tx, act, hazard.id, { from: ['open'], to: 'warned', verb: 'warned' })
  await writeActivity(tx, act, {
    verb: 'published',
    subjectKind: 'notice',
    subjectId: id,
    cragId: hazard.cragId,
    public: true,
  })
  if (hazard.anchorId !== null) await refreshAnchors(tx, act, [hazard.anchorId])
  return { id, code }
}

async function refuseSecondWarning(tx: Transaction, hazardId: string): Promise<void> {
  const [standing] = await tx
    .select({ code: notices.code })
    .from(notices)
    .innerJoin(noticeHazards, eq(noticeHazards.noticeId, notices.id))
    .where(
      and(
        eq(noticeHazards.hazardId, hazardId),
        eq(notices.state, 'published'),
        inArray(notices.kind, ['first_warning', 'hazard']),
      ),
    )
    .limit(1)
  if (standing !== undefined) throw new Refusal('A warning of this hazard stands already; it is shown above.')
}

/**
 * Publishes a first warning of one hazard: fixed words, seven days and while the hazard is open. The hazard is warned
 * about from then on; every access officer of the crag is asked by mail to confirm, revise or withdraw it.
 */
export async function publishFirstWarning(db: Database, { hazardCode, viewer, act, appUrl }: Publishing) {
  return await inCommand(db, async tx => {
    const hazard = await requireWarnable(tx, viewer, hazardCode)
    await refuseSecondWarning(tx, hazard.id)
    const organisationId = await requireOrganisation(tx, viewer, hazard, 'warning:publish')
    const climbs = hazard.anchorId === null ? [] : await listClimbsOf(tx, hazard.anchorId)
    const warning = toFirstWarning({
      kind: hazard.anchorKind ?? 'bolt',
      mode: hazard.mode,
      position: hazard.position ?? 'route',
      climbs: climbs.length > 0 ? climbs.map(climb => climb.name) : [hazard.climbName ?? ''],
      cragName: hazard.cragName,
    })
    const notice = await insertNotice(tx, act, hazard, organisationId, {
      kind: 'first_warning',
      ...warning,
      startsAt: act.now,
      endsAt: new Date(act.now.getTime() + week),
      whileOpen: true,
      decidedByWords: null,
      ground: null,
      reviewOn: null,
      confirmed: false,
    })
    for (const officer of await listAccessOfficers(tx, hazard.cragId))
      await queueMail(tx, act, toReviewMail({ ...notice, ...warning, officer, appUrl }))
    return { noticeCode: notice.code }
  })
}

/** Publishes an access officer's notice of a hazard in their own words; a first warning of it ends with it. */
export async function publishNotice(
  db: Database,
  given: Publishing & { notice: Omit<NewNotice, 'confirmed' | 'startsAt' | 'whileOpen'> },
) {
  const { hazardCode, viewer, act, notice } = given
  return await inCommand(db, async tx => {
    const hazard = await requireWarnable(tx, viewer, hazardCode)
    const organisationId = await requireOrganisation(tx, viewer, hazard, 'notice:manage')
    await tx
      .update(notices)
      .set({ state: 'withdrawn', withdrawnAt: act.now, withdrawnBy: act.by.personId, updatedAt: act.now })
      .where(
        and(
          eq(notices.kind, 'first_warning'),
          eq(notices.state, 'published'),
          sql`${notices.id} in (select ${noticeHazards.noticeId} from ${noticeHazards} where ${noticeHazards.hazardId} = ${hazard.id})`,
        ),
      )
    const made = await insertNotice(tx, act, hazard, organisationId, {
      ...notice,
      startsAt: act.now,
      whileOpen: false,
      confirmed: true,
    })
    return { noticeCode: made.code }
  })
}
