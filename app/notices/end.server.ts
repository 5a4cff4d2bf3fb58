import { and, eq, inArray, notExists, sql } from 'drizzle-orm'
import type { Transaction } from '~/db/client.server'
import { holdingRevision } from '~/db/notices-in-force'
import { noticeHazards, noticeRevisions, notices } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { toStillTrueMail } from './mails'
import { isInForce } from './notice-force'
import { listAccessOfficers } from './officers.server'
import { markWithdrawn } from './withdraw.server'

/** The published notices of some hazards of which none is open, warned or waiting for a check any more. */
async function listSettled(tx: Transaction, hazardIds: string[]) {
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
      state: notices.state,
      headline: noticeRevisions.headline,
      startsAt: noticeRevisions.startsAt,
      endsAt: noticeRevisions.endsAt,
      whileOpen: noticeRevisions.whileOpen,
      cragId: hazards.cragId,
    })
    .from(notices)
    .innerJoin(noticeRevisions, holdingRevision)
    .innerJoin(noticeHazards, eq(noticeHazards.noticeId, notices.id))
    .innerJoin(hazards, eq(hazards.id, noticeHazards.hazardId))
    .where(and(inArray(hazards.id, hazardIds), eq(notices.state, 'published'), notExists(open)))
}

type Settled = Awaited<ReturnType<typeof listSettled>>[number]

async function askWhetherItStands(tx: Transaction, act: Act, notice: Settled, appUrl: string): Promise<void> {
  await tx.update(notices).set({ askedAt: act.now, updatedAt: act.now }).where(eq(notices.id, notice.id))
  const { id, code, headline } = notice
  for (const officer of await listAccessOfficers(tx, notice.cragId))
    await queueMail(tx, act, toStillTrueMail({ id, code, headline, officer, appUrl, askedAt: act.now }))
}

/**
 * When hazards are cleared: first warnings of nothing else end by themselves; of any other notice still in force the
 * access officers are asked whether it stands. The caller refreshes the points.
 */
export async function endFirstWarnings(
  tx: Transaction,
  act: Act,
  { hazardIds, appUrl }: { hazardIds: string[]; appUrl: string },
): Promise<void> {
  if (hazardIds.length === 0) return
  for (const notice of await listSettled(tx, hazardIds)) {
    if (notice.kind === 'first_warning')
      await markWithdrawn(tx, act, { noticeId: notice.id, cragId: notice.cragId })
    else if (isInForce({ ...notice, hazardOpen: false }, act.now))
      await askWhetherItStands(tx, act, notice, appUrl)
  }
}
