import { Link } from 'react-router'
import { ConditionMark } from '~/crags/components/condition-mark'
import { type ConditionState, conditionWords } from '~/crags/condition-state'
import { formatPart } from '~/crags/part'
import { formatFitted } from '~/crags/part-words'
import { formatCode } from '~/lib/code'
import { formatDay } from '~/ui/when'
import { formatFinding } from '../finding-words'
import type { PointRecord } from '../point-record.server'
import { howSeenWords } from '../report'

export interface ShownPoint {
  code: string
  name: string
  state: ConditionState
  sharedBy: string
}

/** One fixed point: its condition, its parts with what was last seen on each. */
export function PointPanel({ point, record }: { point: ShownPoint; record: PointRecord }) {
  const there = record.parts.filter(part => part.removedOn === null)
  return (
    <section aria-labelledby="point">
      <div className="flex flex-wrap items-baseline gap-x-2.5">
        <ConditionMark state={point.state} size={20} decorative />
        <h2 id="point" className="text-2 font-semibold">
          {point.name}
        </h2>
        <Link to={`/points/${point.code}`} className="text-stone">
          {formatCode(point.code)}
        </Link>
        <span className="text-stone">{point.sharedBy}</span>
      </div>
      <p className="mt-1">{conditionWords[point.state]}</p>
      <table className="ruled mt-3">
        <thead>
          <tr>
            <th scope="col">Part</th>
            <th scope="col">Fitted</th>
            <th scope="col">Last seen</th>
          </tr>
        </thead>
        <tbody>
          {there.map(part => (
            <tr key={part.id}>
              <td data-label="Part">{formatPart(part)}</td>
              <td data-label="Fitted">{formatFitted(part, formatDay)}</td>
              <td data-label="Last seen">
                <LastSeen partId={part.id} only={there.length === 1} record={record} />
              </td>
            </tr>
          ))}
          {there.length === 0 && (
            <tr>
              <td colSpan={3} className="text-stone">
                No part is on record here yet.
              </td>
            </tr>
          )}
        </tbody>
      </table>
    </section>
  )
}

/** The newest look that says something of this part (or of the whole point). */
function LastSeen({ partId, only, record }: { partId: string; only: boolean; record: PointRecord }) {
  for (const look of record.seen) {
    const about = look.findings.filter(
      finding =>
        finding.partId === partId || (finding.partId === null && (only || finding.kind === 'no_fault')),
    )
    if (about.length === 0) continue
    const words = about.map(formatFinding).join('; ')
    return (
      <>
        <span className={about.some(finding => finding.kind !== 'no_fault') ? 'font-medium' : ''}>
          {words.charAt(0).toUpperCase() + words.slice(1)}
          {about.some(finding => finding.clearedAt !== null) && ' (mended since)'}
        </span>
        <br />
        <span className="text-s text-stone">{`${formatDay(look.seenOn)}, ${howSeenWords[look.howSeen]}`}</span>
      </>
    )
  }
  return <span className="text-stone">not looked at</span>
}
