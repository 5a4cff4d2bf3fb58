import { Form, Link, redirect, useNavigation } from 'react-router'
import { requireCragSubject } from '~/crags/crags.server'
import { formatCode, parseCode, toSlug } from '~/lib/code'
import { formatBy, toLabel } from '~/notices/components/notice-bands'
import { confirmWarning, withdrawNotice } from '~/notices/end.server'
import { canWithdraw, noticeKindWords } from '~/notices/notice'
import { findNotice, listRevisions } from '~/notices/notices.server'
import { requireCan, requirePerson } from '~/people/guards.server'
import { can } from '~/people/viewer'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { Button } from '~/ui/button'
import { NoticeBand } from '~/ui/notice-band'
import { Page } from '~/ui/page'
import { Refused } from '~/ui/refused'
import { formatDay, formatMoment, formatZone } from '~/ui/when'
import { clockContext, databaseContext, wakeContext } from '~/web/context'
import { readForm } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { notFound, refuse } from '~/web/responses'
import type { Route } from './+types/$code'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.notice.headline ?? 'Notice'} · Cragfettle` },
  { name: 'description', content: loaderData?.notice.words ?? '' },
]

async function requireNotice({ params, context }: Pick<Route.LoaderArgs, 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const code = parseCode(params.code)
  const notice = code === null ? null : await findNotice(db, context.get(viewerContext), code)
  if (notice === null) throw notFound('No notice carries this code.')
  return { db, notice, subject: await requireCragSubject(db, notice.cragId) }
}

export async function loader({ params, context }: Route.LoaderArgs) {
  const { db, notice, subject } = await requireNotice({ params, context })
  const viewer = context.get(viewerContext)
  const stands = notice.state === 'published'
  const { publishedBy: _, ...shown } = notice
  return {
    notice: shown,
    revisions: await listRevisions(db, notice.id),
    may: {
      confirm:
        stands &&
        notice.kind === 'first_warning' &&
        notice.confirmedAt === null &&
        can(viewer, 'notice:manage', subject),
      withdraw: stands && canWithdraw(viewer, notice, subject),
    },
  }
}

export async function action({ request, params, context }: Route.ActionArgs) {
  const form = await readForm(request)
  return await keepTyped({}, async () => {
    const { db, notice, subject } = await requireNotice({ params, context })
    const viewer = requirePerson(context.get(viewerContext), request)
    const confirming = form.get('do') === 'confirm'
    if (confirming || !canWithdraw(viewer, notice, subject))
      requireCan(viewer, 'notice:manage', subject, { seen: true })
    const act = toAct(context.get(clockContext)(), { kind: 'person', personId: viewer.person.id })
    const given = { noticeId: notice.id, cragId: notice.cragId, act }
    const done = confirming ? await confirmWarning(db, given) : await withdrawNotice(db, given)
    if (!done.ok) return refuse(done.reason)
    context.get(wakeContext)()
    throw redirect(`/notices/${notice.code}`)
  })
}

export default function NoticePage({ loaderData, actionData }: Route.ComponentProps) {
  const { notice, revisions, may } = loaderData
  const busy = useNavigation().state === 'submitting'
  return (
    <Page
      title={notice.headline}
      lead={formatCode(notice.code)}
      crumbs={[
        { label: 'Notices', to: '/notices' },
        { label: notice.cragName, to: `/crags/${toSlug(notice.cragName, notice.cragCode)}` },
      ]}
    >
      {actionData?.reason && <Refused reason={actionData.reason} />}
      {notice.state === 'withdrawn' && (
        <NoticeBand
          tone="slate"
          label="Withdrawn"
          words="This notice no longer holds. It is kept so that it can be read."
          by={notice.withdrawnAt ? formatMoment(notice.withdrawnAt, notice.timeZone) : ''}
        />
      )}
      {notice.askedAt !== null && notice.state === 'published' && may.withdraw && (
        <NoticeBand
          tone="ochre"
          label="Does it still stand?"
          words="What it warns of has been mended and checked."
          by=""
        />
      )}
      <div className="mt-6 grid gap-x-8 gap-y-2 md:grid-cols-[10rem_1fr]">
        <b className={`font-semibold ${notice.state === 'published' ? 'text-oxide' : ''}`}>
          {toLabel(notice)}
        </b>
        <p className="max-w-[62ch] text-1" lang={notice.lang}>
          {notice.words}
        </p>
        <span className="text-stone">Kind</span>
        <span>{noticeKindWords[notice.kind]}</span>
        <span className="text-stone">Whose</span>
        <span>{formatBy(notice, notice.timeZone)}</span>
        {notice.decidedByWords && (
          <>
            <span className="text-stone">Decided by</span>
            <span>{notice.decidedByWords}</span>
          </>
        )}
        {notice.ground && (
          <>
            <span className="text-stone">Ground</span>
            <span>{notice.ground}</span>
          </>
        )}
        {notice.reviewOn && (
          <>
            <span className="text-stone">Looked at again</span>
            <span>{formatDay(notice.reviewOn)}</span>
          </>
        )}
        <span className="text-stone">Where</span>
        <span>
          {notice.climbCode && <Link to={`/climbs/${notice.climbCode}`}>{notice.climbName}</Link>}
          {notice.anchorCode && (
            <Link to={`/points/${notice.anchorCode}`}>{formatCode(notice.anchorCode)}</Link>
          )}
          {`, ${notice.cragName}`}
        </span>
        <span className="text-stone">Until</span>
        <span>
          {notice.kind === 'first_warning'
            ? `seven days, and while its hazard is open`
            : notice.endsAt
              ? formatMoment(notice.endsAt, notice.timeZone)
              : 'withdrawn'}
        </span>
      </div>
      {(may.confirm || may.withdraw) && (
        <Form method="post" noValidate className="mt-6 flex flex-wrap gap-3">
          {may.confirm && (
            <Button kind="action" name="do" value="confirm" pending={busy}>
              Confirm warning
            </Button>
          )}
          {may.withdraw && (
            <Button kind="danger" name="do" value="withdraw" pending={busy}>
              Withdraw notice
            </Button>
          )}
        </Form>
      )}
      <h2 className="mt-10 text-1 font-semibold">Wordings</h2>
      <ol className="mt-2 border-t border-slate">
        {revisions.map(revision => (
          <li key={revision.number} className="border-b border-rule py-3">
            <span className="text-stone">{`${revision.number}, ${formatMoment(revision.at, notice.timeZone)}`}</span>
            <p className="max-w-[62ch]">{revision.words}</p>
          </li>
        ))}
      </ol>
      <p className="mt-2 text-s text-stone">{`Times are ${formatZone(notice.timeZone)}.`}</p>
    </Page>
  )
}
