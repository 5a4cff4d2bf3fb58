import type { ReactNode } from 'react'
import { Link } from 'react-router'
import { formatCode, toSlug } from '~/lib/code'
import { formatDay, formatMoment } from '~/ui/when'
import { noticeKindWords } from '../notice'
import type { Force } from '../notice-force'
import type { ShownNotice } from '../notices.server'
import { formatBy, toLabel } from './notice-bands'

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <>
      <dt className="text-stone">{name}</dt>
      <dd className="mb-2 md:mb-0">{children}</dd>
    </>
  )
}

/** A fixed point by its name on each of its climbs, the climb a notice is about, or the crag. */
function Where({ notice, climbs }: { notice: ShownNotice; climbs: PlacedClimb[] }) {
  const crag = (
    <Link to={`/crags/${toSlug(notice.cragName, notice.cragCode)}`} className="text-slate">
      {notice.cragName}
    </Link>
  )
  return (
    <>
      {notice.anchorCode && (
        <Link to={`/points/${notice.anchorCode}`} className="text-slate">
          {`${climbs[0]?.position ?? 'Fixed point'} ${formatCode(notice.anchorCode)}`}
        </Link>
      )}
      {climbs.map((climb, index) => (
        <span key={climb.code}>
          {notice.anchorCode && index === 0 ? ' on ' : index > 0 ? ', ' : ''}
          <Link to={`/climbs/${toSlug(climb.name, climb.code)}`} className="text-slate">
            {climb.name}
          </Link>
        </span>
      ))}
      {(notice.anchorCode || climbs.length > 0) && ', '}
      {crag}
    </>
  )
}

function formatUntil(notice: ShownNotice): string {
  if (notice.withdrawnAt !== null) return `withdrawn ${formatMoment(notice.withdrawnAt, notice.timeZone)}`
  if (notice.endsAt === null) return 'it is withdrawn'
  const until = formatMoment(notice.endsAt, notice.timeZone)
  return notice.whileOpen ? `${until}, and as long as its hazard is open` : until
}

export interface PlacedClimb {
  code: string
  name: string
  position?: string
}

/** What a notice says and everything about it that anybody may know. */
export function NoticeFacts(props: { notice: ShownNotice; force: Force; climbs: PlacedClimb[] }) {
  const { notice, force, climbs } = props
  return (
    <dl className="mt-6 grid gap-x-8 md:grid-cols-[10rem_1fr] md:gap-y-2">
      <dt className={`font-semibold ${force === 'in_force' ? 'text-oxide' : 'text-stone'}`}>
        {toLabel(notice)}
      </dt>
      <dd className="mb-2 max-w-[62ch] whitespace-pre-line text-1 md:mb-0" lang={notice.lang}>
        {notice.words}
      </dd>
      <Fact name="Kind">{noticeKindWords[notice.kind]}</Fact>
      <Fact name="Whose">{formatBy(notice, notice.timeZone)}</Fact>
      {notice.decidedByWords && <Fact name="Decided by">{notice.decidedByWords}</Fact>}
      {notice.ground && <Fact name="Ground">{notice.ground}</Fact>}
      {notice.reviewOn && <Fact name="Looked at again">{formatDay(notice.reviewOn)}</Fact>}
      <Fact name="Where">
        <Where notice={notice} climbs={climbs} />
      </Fact>
      <Fact name="Holds from">{formatMoment(notice.startsAt, notice.timeZone)}</Fact>
      <Fact name="Until">{formatUntil(notice)}</Fact>
    </dl>
  )
}
