import { and, eq, inArray, notExists, sql } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { anchors } from '~/db/schema/crags'
import { noticeHazards, noticePlaces, noticeRevisions, notices } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { moveHazard } from '~/reports/hazards.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { toStillTrueMail } from './mails'
import { noticeMoves } from './notice'
import { listAccessOfficers } from './officers.server'

/** The notices in force in name on some hazards of which none is open, warned or waiting for a check any more. */
async function listOver(tx: Transaction, hazardIds: string[]) {
  const open = tx
    .select({ one: sql`1` })
    .from(noticeHazards)
    .innerJoin(hazards, eq(hazards.id, noticeHazards.hazardId))
    .where(and(eq(noticeHazards.noticeId, notices.id), inArray(hazards.state, ['open', 'warned', 'mended'])))
  return await tx
    .selectDistinct({
      id: notices.id,
      code: notices.code,
      kind: notices.kind,
      headline: noticeRevisions.headline,
      cragId: hazards.cragId,
      anchorId: hazards.anchorId,
    })
    .from(notices)
    .innerJoin(
      noticeRevisions,
      and(eq(noticeRevisions.noticeId, notices.id), eq(noticeRevisions.number, notices.revision)),
    )
    .innerJoin(noticeHazards, eq(noticeHazards.noticeId, notices.id))
    .innerJoin(hazards, eq(hazards.id, noticeHazards.hazardId))
    .where(and(inArray(hazards.id, hazardIds), eq(notices.state, 'published'), notExists(open)))
}

/**
 * When hazards are cleared: first warnings of nothing else end by themselves; of any other notice the access officers
 * are asked whether it still stands. The caller refreshes the points.
 */
export async function endFirstWarnings(
  tx: Transaction,
  act: Act,
  { hazardIds, appUrl }: { hazardIds: string[]; appUrl: string },
): Promise<void> {
  if (hazardIds.length === 0) return
  for (const notice of await listOver(tx, hazardIds)) {
    if (notice.kind === 'first_warning') {
      await withdraw(tx, act, notice.id, notice.cragId)
      continue
    }
    await tx.update(notices).set({ askedAt: act.now, updatedAt: act.now }).where(eq(notices.id, notice.id))
    for (const officer of await listAccessOfficers(tx, notice.cragId))
      await queueMail(tx, act, toStillTrueMail({ ...notice, officer, appUrl }))
  }
}

/** States a notice can be withdrawn from, by the table of moves. */
const withdrawable = noticeMoves.filter(move => move.to === 'withdrawn').map(move => move.from)

async function withdraw(tx: Transaction, act: Act, noticeId: string, cragId: string): Promise<void> {
  const [done] = await tx
    .update(notices)
    .set({ state: 'withdrawn', withdrawnAt: act.now, withdrawnBy: act.by.personId, updatedAt: act.now })
    .where(and(eq(notices.id, noticeId), inArray(notices.state, withdrawable)))
  if (done.affectedRows === 0) throw new Refusal('This notice has been withdrawn already.')
  await writeActivity(tx, act, {
    verb: 'withdrawn',
    subjectKind: 'notice',
    subjectId: noticeId,
    cragId,
    public: true,
  })
}

/** The fixed points a notice is about. */
async function listAnchorsOf(tx: Transaction, noticeId: string): Promise<string[]> {
  const rows = await tx
    .select({ id: anchors.id })
    .from(noticePlaces)
    .innerJoin(anchors, eq(anchors.id, noticePlaces.anchorId))
    .where(eq(noticePlaces.noticeId, noticeId))
  return rows.map(row => row.id)
}

/** Hazards a withdrawn notice leaves without any warning go back to open. */
async function reopenUnwarned(tx: Transaction, act: Act, noticeId: string): Promise<void> {
  const left = await tx
    .select({ id: hazards.id })
    .from(noticeHazards)
    .innerJoin(hazards, eq(hazards.id, noticeHazards.hazardId))
    .where(
      and(
        eq(noticeHazards.noticeId, noticeId),
        eq(hazards.state, 'warned'),
        sql`not exists (select 1 from notice_hazards other join notices n on n.id = other.notice_id where other.hazard_id = ${hazards.id} and n.state = 'published')`,
      ),
    )
  for (const { id } of left) await moveHazard(tx, act, id, { from: ['warned'], to: 'open', verb: 'unwarned' })
}

/** Withdraws a notice; hazards that no other notice warns of are open again. */
export async function withdrawNotice(
  db: Database,
  { noticeId, cragId, act }: { noticeId: string; cragId: string; act: Act },
) {
  return await inCommand(db, async tx => {
    await withdraw(tx, act, noticeId, cragId)
    await reopenUnwarned(tx, act, noticeId)
    await refreshAnchors(tx, act, await listAnchorsOf(tx, noticeId))
    return {}
  })
}

/** An access officer stands behind a first warning: it is no longer marked "not reviewed". */
export async function confirmWarning(
  db: Database,
  { noticeId, cragId, act }: { noticeId: string; cragId: string; act: Act },
) {
  return await inCommand(db, async tx => {
    const [done] = await tx
      .update(notices)
      .set({ confirmedBy: act.by.personId, confirmedAt: act.now, updatedAt: act.now })
      .where(
        and(eq(notices.id, noticeId), eq(notices.state, 'published'), sql`${notices.confirmedAt} is null`),
      )
    if (done.affectedRows === 0) throw new Refusal('This warning has been confirmed or withdrawn already.')
    await writeActivity(tx, act, {
      verb: 'confirmed',
      subjectKind: 'notice',
      subjectId: noticeId,
      cragId,
      public: true,
    })
    return {}
  })
}
