import { and, eq, isNotNull, lte, not, or, sql } from 'drizzle-orm'
import type { Database } from '~/db/client.server'
import { holdingRevision, isInForceAt } from '~/db/notices-in-force'
import { anchors } from '~/db/schema/crags'
import { noticeHazards, noticePlaces, noticeRevisions, notices } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'
import { inTransaction } from '~/db/transaction.server'
import type { Act } from '~/record/act'
import { refreshAnchors } from '~/reports/refresh.server'
import { listAnchorsOf, lockHazardsOf } from './lock.server'
import { reopenUnwarned } from './withdraw.server'

/** Notices past their end that a hazard still counts as its warning, or a fixed point still counts as in force. */
async function listJustOver(db: Database, now: Date) {
  const otherStanding = (on: ReturnType<typeof sql>) =>
    sql`from ${notices} join ${noticeRevisions} on ${holdingRevision} ${on} and ${isInForceAt(now)}`
  const onPoint = otherStanding(
    sql`join notice_places p on p.notice_id = ${notices.id} where p.anchor_id = ${anchors.id}`,
  )
  const ofHazard = otherStanding(
    sql`join notice_hazards h on h.notice_id = ${notices.id} where h.hazard_id = ${hazards.id}`,
  )
  return await db
    .selectDistinct({ id: notices.id })
    .from(notices)
    .innerJoin(noticeRevisions, holdingRevision)
    .leftJoin(noticeHazards, eq(noticeHazards.noticeId, notices.id))
    .leftJoin(hazards, eq(hazards.id, noticeHazards.hazardId))
    .leftJoin(noticePlaces, eq(noticePlaces.noticeId, notices.id))
    .leftJoin(anchors, eq(anchors.id, noticePlaces.anchorId))
    .where(
      and(
        eq(notices.state, 'published'),
        isNotNull(noticeRevisions.endsAt),
        lte(noticeRevisions.endsAt, now),
        not(isInForceAt(now)),
        or(
          and(eq(hazards.state, 'warned'), sql`not exists (select 1 ${ofHazard})`),
          sql`${anchors.notices} > (select count(distinct p.notice_id) ${onPoint})`,
        ),
      ),
    )
    .limit(20)
}

/**
 * Follows up notices that have come to their end by the clock: hazards without another warning are open again, points,
 * climbs and crags stop counting them. Gives how many that were.
 */
export async function expireNotices(db: Database, act: Act): Promise<number> {
  const over = await listJustOver(db, act.now)
  for (const { id } of over)
    await inTransaction(db, async tx => {
      await reopenUnwarned(tx, act, await lockHazardsOf(tx, id))
      await refreshAnchors(tx, act, await listAnchorsOf(tx, id))
    })
  return over.length
}
