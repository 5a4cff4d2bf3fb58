import { and, eq, inArray, isNull, notExists, sql } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { holdingRevision, isInForceAt } from '~/db/notices-in-force'
import { noticeHazards, noticeRevisions, notices } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'
import { inCommand, Refusal } from '~/db/transaction.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { moveHazard } from '~/reports/hazards.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { listAnchorsOf, lockHazardsOf } from './lock.server'
import { noticeMoves } from './notice'

/** States a notice can be withdrawn from, by the table of moves. */
const withdrawable = noticeMoves.filter(move => move.to === 'withdrawn').map(move => move.from)

interface Given {
  noticeId: string
  cragId: string
}

const writeNoticeLine = async (
  tx: Transaction,
  act: Act,
  { noticeId, cragId, verb }: Given & { verb: string },
) => await writeActivity(tx, act, { verb, subjectKind: 'notice', subjectId: noticeId, cragId, public: true })

/** Takes a notice back, with its line of record; refuses when that has been done already. */
export async function markWithdrawn(tx: Transaction, act: Act, given: Given): Promise<void> {
  const [done] = await tx
    .update(notices)
    .set({ state: 'withdrawn', withdrawnAt: act.now, withdrawnBy: act.by.personId, updatedAt: act.now })
    .where(and(eq(notices.id, given.noticeId), inArray(notices.state, withdrawable)))
  if (done.affectedRows === 0) throw new Refusal('This notice has been withdrawn already.')
  await writeNoticeLine(tx, act, { ...given, verb: 'withdrawn' })
}

/** Those of some hazards that count as warned of though no notice about them is in force are open again. */
export async function reopenUnwarned(tx: Transaction, act: Act, hazardIds: string[]): Promise<void> {
  if (hazardIds.length === 0) return
  const standing = tx
    .select({ one: sql`1` })
    .from(notices)
    .innerJoin(noticeRevisions, holdingRevision)
    .innerJoin(noticeHazards, eq(noticeHazards.noticeId, notices.id))
    .where(and(sql`${noticeHazards.hazardId} = ${hazards.id}`, isInForceAt(act.now)))
  const left = await tx
    .select({ id: hazards.id })
    .from(hazards)
    .where(and(inArray(hazards.id, hazardIds), eq(hazards.state, 'warned'), notExists(standing)))
  for (const { id } of left) await moveHazard(tx, act, id, { from: ['warned'], to: 'open', verb: 'unwarned' })
}

/** Withdraws a notice; hazards that no other notice in force warns of are open again. */
export async function withdrawNotice(db: Database, { act, ...given }: Given & { act: Act }) {
  return await inCommand(db, async tx => {
    const hazardIds = await lockHazardsOf(tx, given.noticeId)
    await markWithdrawn(tx, act, given)
    await reopenUnwarned(tx, act, hazardIds)
    await refreshAnchors(tx, act, await listAnchorsOf(tx, given.noticeId))
    return {}
  })
}

/** An access officer stands behind a first warning: it is no longer marked "not reviewed". */
export async function confirmWarning(db: Database, { act, ...given }: Given & { act: Act }) {
  return await inCommand(db, async tx => {
    const [done] = await tx
      .update(notices)
      .set({ confirmedBy: act.by.personId, confirmedAt: act.now, updatedAt: act.now })
      .where(
        and(
          eq(notices.id, given.noticeId),
          eq(notices.kind, 'first_warning'),
          eq(notices.state, 'published'),
          isNull(notices.confirmedAt),
        ),
      )
    if (done.affectedRows === 0) throw new Refusal('This warning has been confirmed or withdrawn already.')
    await writeNoticeLine(tx, act, { ...given, verb: 'confirmed' })
    return {}
  })
}
