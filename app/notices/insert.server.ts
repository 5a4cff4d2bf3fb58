import type { Transaction } from '~/db/client.server'
import { noticeHazards, noticePlaces, noticeRevisions, notices } from '~/db/schema/notices'
import { toCode } from '~/lib/code'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { type Hazard, moveHazard } from '~/reports/hazards.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { listAnchorsOf } from './lock.server'
import type { NoticeKind } from './notice'

export interface NewNotice {
  kind: NoticeKind
  headline: string
  words: string
  startsAt: Date
  endsAt: Date | null
  whileOpen: boolean
  decidedByWords: string | null
  ground: string | null
  reviewOn: string | null
  /** an access officer stands behind it from the first */
  confirmed: boolean
}

async function insertRows(
  tx: Transaction,
  act: Act,
  { id, code, hazard, organisationId }: { id: string; code: string; hazard: Hazard; organisationId: string },
  notice: NewNotice,
): Promise<void> {
  const { kind, decidedByWords, ground, reviewOn, headline, words, startsAt, endsAt, whileOpen } = notice
  const by = act.by.personId
  await tx.insert(notices).values({
    ...{ id, code, organisationId, kind, decidedByWords, ground, reviewOn },
    state: 'published',
    publishedBy: by,
    publishedAt: act.now,
    ...(notice.confirmed ? { confirmedBy: by, confirmedAt: act.now } : {}),
    createdAt: act.now,
    updatedAt: act.now,
  })
  await tx.insert(noticeRevisions).values({
    ...{ noticeId: id, number: 1, headline, words, lang: 'en', startsAt, endsAt, whileOpen },
    by,
    at: act.now,
  })
  await tx.insert(noticeHazards).values({ noticeId: id, hazardId: hazard.id })
  const place = hazard.anchorId !== null ? { anchorId: hazard.anchorId } : { climbId: hazard.climbId }
  await tx.insert(noticePlaces).values({ id: act.newId(), noticeId: id, ...place })
}

/** Publishes a notice where its hazard is: the hazard counts as warned of, the points and climbs count the notice. */
export async function insertNotice(
  tx: Transaction,
  act: Act,
  of: { hazard: Hazard; organisationId: string },
  notice: NewNotice,
): Promise<{ id: string; code: string }> {
  const { hazard } = of
  const made = { id: act.newId(), code: toCode(hazard.areaCode, act.random) }
  await insertRows(tx, act, { ...made, ...of }, notice)
  if (hazard.state === 'open')
    await moveHazard(tx, act, hazard.id, { from: ['open'], to: 'warned', verb: 'warned' })
  await writeActivity(tx, act, {
    verb: 'published',
    subjectKind: 'notice',
    subjectId: made.id,
    cragId: hazard.cragId,
    public: true,
  })
  await refreshAnchors(tx, act, await listAnchorsOf(tx, made.id))
  return made
}
