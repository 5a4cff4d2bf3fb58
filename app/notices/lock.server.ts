import { asc, eq, inArray } from 'drizzle-orm'
import type { Transaction } from '~/db/client.server'
import { anchors, climbAnchors } from '~/db/schema/crags'
import { noticeHazards, noticePlaces } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'

/** Locks hazards and, before them, the fixed points they are at, each lowest id first, as every command does. */
export async function lockHazards(tx: Transaction, hazardIds: string[]): Promise<void> {
  if (hazardIds.length === 0) return
  const at = await tx
    .select({ anchorId: hazards.anchorId })
    .from(hazards)
    .where(inArray(hazards.id, hazardIds))
  const anchorIds = at.flatMap(row => row.anchorId ?? [])
  if (anchorIds.length > 0)
    await tx
      .select({ id: anchors.id })
      .from(anchors)
      .where(inArray(anchors.id, anchorIds))
      .orderBy(asc(anchors.id))
      .for('update')
  await tx
    .select({ id: hazards.id })
    .from(hazards)
    .where(inArray(hazards.id, hazardIds))
    .orderBy(asc(hazards.id))
    .for('update')
}

/** The hazards a notice warns of, locked with their fixed points. */
export async function lockHazardsOf(tx: Transaction, noticeId: string): Promise<string[]> {
  const rows = await tx
    .select({ id: noticeHazards.hazardId })
    .from(noticeHazards)
    .where(eq(noticeHazards.noticeId, noticeId))
  const ids = rows.map(row => row.id)
  await lockHazards(tx, ids)
  return ids
}

/** The fixed points that carry a notice: its own, and all of a climb it is about. */
export async function listAnchorsOf(tx: Transaction, noticeId: string): Promise<string[]> {
  const rows = await tx
    .select({ own: noticePlaces.anchorId, ofClimb: climbAnchors.anchorId })
    .from(noticePlaces)
    .leftJoin(climbAnchors, eq(climbAnchors.climbId, noticePlaces.climbId))
    .where(eq(noticePlaces.noticeId, noticeId))
  return [...new Set(rows.flatMap(row => row.own ?? row.ofClimb ?? []))]
}
