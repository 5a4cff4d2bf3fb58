import { eq } from 'drizzle-orm'
import type { Database } from '~/db/client.server'
import { reports } from '~/db/schema/reports'
import { inCommand } from '~/db/transaction.server'
import type { Act } from '~/record/act'
import { moveReport, requireReport } from './placed-report.server'

interface Reply {
  reportId: string
  act: Act
}

/** The reporter's answer to a question, added to what was said; the report is received again. */
export async function answerDetail(db: Database, { reportId, act, answer }: Reply & { answer: string }) {
  return await inCommand(db, async tx => {
    const report = await requireReport(tx, reportId)
    const [said] = await tx
      .select({ words: reports.words })
      .from(reports)
      .where(eq(reports.id, reportId))
      .limit(1)
    await moveReport(tx, act, report, 'received')
    await tx
      .update(reports)
      .set({ words: [said?.words, answer].filter(Boolean).join('\n\n'), updatedAt: act.now })
      .where(eq(reports.id, reportId))
    return {}
  })
}

/** The author takes a report back, before it is taken in. */
export async function withdrawReport(db: Database, { reportId, act }: Reply) {
  return await inCommand(db, async tx => {
    const report = await requireReport(tx, reportId)
    await moveReport(tx, act, report, 'withdrawn')
    return {}
  })
}
