import { NoticeBand } from '~/ui/notice-band'
import { formatMoment } from '~/ui/when'
import type { Force } from '../notice-force'
import type { ShownNotice } from '../notices.server'

const kept = 'It is kept so that it can be read. That it ended says nothing about any fixed gear.'

/** The band over a notice that does not hold, and, for who may end it, over one that may have done its work. */
export function ForceBand(props: { notice: ShownNotice; force: Force; asks: boolean }) {
  const { notice, force, asks } = props
  const at = (moment: Date | null) => (moment === null ? '' : formatMoment(moment, notice.timeZone))
  if (force === 'withdrawn')
    return (
      <NoticeBand
        tone="slate"
        label="Withdrawn"
        words={`This notice no longer holds. ${kept}`}
        by={at(notice.withdrawnAt)}
      />
    )
  if (force === 'over')
    return (
      <NoticeBand
        tone="slate"
        label="Ended"
        words={`This notice has come to its last day. ${kept}`}
        by={at(notice.endsAt)}
      />
    )
  if (force === 'ahead')
    return (
      <NoticeBand
        tone="slate"
        label="Not yet"
        words="This notice does not hold yet."
        by={at(notice.startsAt)}
      />
    )
  if (force !== 'in_force' || !asks || notice.askedAt === null) return null
  return (
    <NoticeBand
      tone="ochre"
      label="Does it still stand?"
      words="What it warns of has been mended and checked. Withdraw it, or leave it if there is another reason for it."
      by={at(notice.askedAt)}
    />
  )
}
