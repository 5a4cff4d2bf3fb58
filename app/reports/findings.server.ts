import { and, asc, eq, inArray, isNull } from 'drizzle-orm'
import type { Queryable, Transaction } from '~/db/client.server'
import { parts } from '~/db/schema/parts'
import { findings, reports } from '~/db/schema/reports'
import type { Act } from '~/record/act'

/** Marks every finding of the hazard's reports as cleared by a work record (at closing, never before). */
export async function clearFindings(
  tx: Transaction,
  act: Act,
  cleared: { hazardId: string; byRecordId: string },
): Promise<void> {
  const of = await tx.select({ id: reports.id }).from(reports).where(eq(reports.hazardId, cleared.hazardId))
  if (of.length === 0) return
  await tx
    .update(findings)
    .set({ clearedAt: act.now, clearedByRecord: cleared.byRecordId })
    .where(
      and(
        inArray(
          findings.reportId,
          of.map(report => report.id),
        ),
        isNull(findings.clearedAt),
      ),
    )
}

/** The findings of the given reports, in the order they were given, each with the part it is about. */
export async function listFindings(db: Queryable, reportIds: string[]) {
  if (reportIds.length === 0) return []
  return await db
    .select({
      id: findings.id,
      reportId: findings.reportId,
      kind: findings.kind,
      unit: findings.unit,
      low: findings.low,
      high: findings.high,
      edge: findings.edge,
      triedByHand: findings.triedByHand,
      words: findings.words,
      clearedAt: findings.clearedAt,
      partId: findings.partId,
      partKind: parts.kind,
      sizeMm: parts.sizeMm,
    })
    .from(findings)
    .leftJoin(parts, eq(parts.id, findings.partId))
    .where(inArray(findings.reportId, reportIds))
    .orderBy(asc(findings.id))
    .limit(500)
}
