import type { Queryable } from '~/db/client.server'
import { groupBy } from '~/lib/group-by'
import { formatFinding } from './finding-words'
import { listFindings } from './findings.server'
import { listStandingReports } from './reports.server'

/** What is wrong at fixed points in a few words each, newest look first: "nut loose", "groove 3.3 mm, sharp edge". */
export async function listPointWords(db: Queryable, anchorIds: string[]): Promise<Map<string, string>> {
  const reports = await listStandingReports(db, anchorIds)
  const found = groupBy(
    (
      await listFindings(
        db,
        reports.map(report => report.id),
      )
    ).filter(finding => finding.clearedAt === null && finding.kind !== 'no_fault'),
    finding => finding.reportId,
  )
  const words = new Map<string, string>()
  for (const report of reports) {
    const newest = found.get(report.id)
    if (newest === undefined || report.anchorId === null || words.has(report.anchorId)) continue
    words.set(report.anchorId, newest.map(finding => formatFinding({ ...finding, sizeMm: null })).join(', '))
  }
  return words
}
