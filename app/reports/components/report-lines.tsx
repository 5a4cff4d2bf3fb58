import { formatDay } from '~/ui/when'
import { formatFinding } from '../finding-words'
import type { listFindings } from '../findings.server'
import { howSeenWords } from '../report'
import type { Report } from '../reports.server'

/** Reports as they were told, newest first: what, when and how, the words, and by whom where one may know. */
export function ReportLines(props: {
  reports: Report[]
  findings: Awaited<ReturnType<typeof listFindings>>
}) {
  return (
    <ul className="mt-2 border-t border-slate">
      {props.reports.map(report => {
        const found = props.findings.filter(finding => finding.reportId === report.id)
        const by = report.personName ?? report.guestEmail
        return (
          <li key={report.id} className="border-b border-rule py-3">
            {found.map(finding => formatFinding(finding)).join('; ')}
            <br />
            <span className="text-s text-stone">
              {[`seen ${formatDay(report.seenOn)}`, howSeenWords[report.howSeen], by && `told by ${by}`]
                .filter(Boolean)
                .join(', ')}
              {report.confirmedAt === null && ', address not confirmed'}
            </span>
            {report.words && (
              <p className="mt-1 max-w-[62ch] whitespace-pre-line" lang="">
                {report.words}
              </p>
            )}
          </li>
        )
      })}
    </ul>
  )
}
