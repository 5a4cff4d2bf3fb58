import { and, desc, eq, inArray } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { activities } from '~/db/schema/record'
import type { Act } from './act'
import type { SubjectKind } from './activity'

export interface ActivityLine {
  verb: string
  subjectKind: SubjectKind
  subjectId: string
  cragId?: string | null
  /** whether the public record may show the line (it never carries a name) */
  public?: boolean
  details?: Record<string, unknown>
}

/** Writes one line of the record in the command's transaction. No name and no address belongs in `details`. */
export async function writeActivity(tx: Queryable, act: Act, line: ActivityLine): Promise<void> {
  await tx.insert(activities).values({
    id: act.newId(),
    at: act.now,
    organisationId: act.by.organisationId ?? null,
    cragId: line.cragId ?? null,
    byPersonId: act.by.personId,
    byKind: act.by.kind,
    verb: line.verb,
    subjectKind: line.subjectKind,
    subjectId: line.subjectId,
    public: line.public ?? false,
    details: line.details ?? null,
  })
}

/** The record of the given subjects, newest first, at most `limit` lines; the public sees public lines only. */
export async function listActivities(
  db: Queryable,
  subjectIds: string[],
  { publicOnly, limit = 100 }: { publicOnly: boolean; limit?: number },
) {
  if (subjectIds.length === 0) return []
  return await db
    .select({
      id: activities.id,
      at: activities.at,
      verb: activities.verb,
      subjectKind: activities.subjectKind,
      subjectId: activities.subjectId,
      organisationId: activities.organisationId,
      byPersonId: activities.byPersonId,
      byKind: activities.byKind,
      details: activities.details,
    })
    .from(activities)
    .where(
      and(inArray(activities.subjectId, subjectIds), publicOnly ? eq(activities.public, true) : undefined),
    )
    .orderBy(desc(activities.at), desc(activities.id))
    .limit(limit)
}
