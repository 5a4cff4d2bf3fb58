import { Link } from 'react-router'
import { toDay } from '~/lib/dates'
import { NoticeBand } from '~/ui/notice-band'
import { formatDay } from '~/ui/when'
import { noticeKindWords } from '../notice'
import type { ShownNotice } from '../notices.server'

/** The condition word a warning stands for, or what kind of notice it is. */
export function toLabel(notice: Pick<ShownNotice, 'kind'>): string {
  return notice.kind === 'hazard' || notice.kind === 'first_warning'
    ? 'Do not rely on it'
    : noticeKindWords[notice.kind]
}

const tones = {
  first_warning: 'oxide',
  hazard: 'oxide',
  works: 'slate',
  please_do_not_climb: 'ochre',
  owner_forbids: 'ochre',
  closed_in_law: 'oxide',
} as const

/** Whose notice it is and since when; a first warning nobody has confirmed says so. */
export function formatBy(notice: ShownNotice, timeZone: string): string {
  const day = notice.publishedAt === null ? '' : `, ${formatDay(toDay(notice.publishedAt, timeZone))}`
  const unreviewed =
    notice.kind === 'first_warning' && notice.confirmedAt === null ? ', first warning, not reviewed' : ''
  return `${notice.organisation}${day}${unreviewed}`
}

/** The notices in force where one is, strongest first. */
export function NoticeBands({ notices, timeZone }: { notices: ShownNotice[]; timeZone: string }) {
  return notices.map(notice => (
    <NoticeBand
      key={notice.code}
      tone={tones[notice.kind]}
      label={toLabel(notice)}
      words={<span lang={notice.lang}>{notice.words}</span>}
      by={
        <Link to={`/notices/${notice.code}`} className="text-stone">
          {formatBy(notice, timeZone)}
        </Link>
      }
    />
  ))
}
