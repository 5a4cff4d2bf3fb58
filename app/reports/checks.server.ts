import type { Transaction } from '~/db/client.server'
import { findings, reports } from '~/db/schema/reports'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import type { HowSeen } from './report'

/**
 * Puts a trained person's check on record: nothing wrong seen at the fixed point on that day. The caller refreshes
 * the point. Gives the report's id.
 */
export async function recordCheck(
  tx: Transaction,
  act: Act,
  check: {
    cragId: string
    climbId: string | null
    anchorId: string
    personId: string
    seenOn: string
    howSeen: HowSeen
  },
): Promise<string> {
  const id = act.newId()
  await tx.insert(reports).values({
    id,
    clientKey: `check-${id}`,
    cragId: check.cragId,
    climbId: check.climbId,
    anchorId: check.anchorId,
    seenOn: check.seenOn,
    recordedAt: act.now,
    receivedAt: act.now,
    howSeen: check.howSeen,
    personId: check.personId,
    confirmedAt: act.now,
    isCheck: true,
    state: 'on_record',
    createdAt: act.now,
    updatedAt: act.now,
  })
  await tx.insert(findings).values({ id: act.newId(), reportId: id, kind: 'no_fault', createdAt: act.now })
  await writeActivity(tx, act, {
    verb: 'checked',
    subjectKind: 'anchor',
    subjectId: check.anchorId,
    cragId: check.cragId,
    public: true,
  })
  return id
}
