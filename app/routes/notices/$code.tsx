import { Form, redirect, useNavigation } from 'react-router'
import { listClimbsOf } from '~/crags/anchors.server'
import { requireCragSubject } from '~/crags/crags.server'
import { formatCode, parseCode, toSlug } from '~/lib/code'
import { ForceBand } from '~/notices/components/force-band'
import { NoticeFacts } from '~/notices/components/notice-facts'
import { canWithdraw } from '~/notices/notice'
import { toForce } from '~/notices/notice-force'
import { findNotice, listHazardsOf, listRevisions } from '~/notices/notices.server'
import { confirmWarning, withdrawNotice } from '~/notices/withdraw.server'
import { requireCan, requirePerson } from '~/people/guards.server'
import { can } from '~/people/viewer'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { Button, ButtonLink } from '~/ui/button'
import { Page } from '~/ui/page'
import { Refused } from '~/ui/refused'
import { formatMoment, formatZone } from '~/ui/when'
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
  const hazards = await listHazardsOf(db, notice.id)
  const hazardOpen = hazards.some(hazard => hazard.open)
  const stands = notice.state === 'published'
  const first = stands && notice.kind === 'first_warning'
  const manages = can(viewer, 'notice:manage', subject)
  const { publishedBy: _, ...shown } = notice
  const ofClimb = notice.climbCode === null ? [] : [{ code: notice.climbCode, name: notice.climbName! }]
  return {
    notice: shown,
    force: toForce({ ...notice, hazardOpen }, context.get(clockContext)()),
    climbs: notice.anchorId === null ? ofClimb : await listClimbsOf(db, notice.anchorId),
    revisions: await listRevisions(db, notice.id),
    may: {
      confirm: first && manages && notice.confirmedAt === null,
      withdraw: stands && canWithdraw(viewer, notice, subject),
      revise: first && manages ? (hazards.find(hazard => hazard.open)?.code ?? null) : null,
    },
  }
}

const commands = { confirm: confirmWarning, withdraw: withdrawNotice }

export async function action({ request, params, context }: Route.ActionArgs) {
  const form = await readForm(request)
  return await keepTyped({}, async () => {
    const { db, notice, subject } = await requireNotice({ params, context })
    const viewer = requirePerson(context.get(viewerContext), request)
    const what = form.get('do')
    if (what !== 'withdraw' || !canWithdraw(viewer, notice, subject))
      requireCan(viewer, 'notice:manage', subject, { seen: true })
    if (what !== 'confirm' && what !== 'withdraw')
      return refuse('Nothing was changed: choose Confirm warning or Withdraw notice.')
    const act = toAct(context.get(clockContext)(), { kind: 'person', personId: viewer.person.id })
    const done = await commands[what](db, { noticeId: notice.id, cragId: notice.cragId, act })
    if (!done.ok) return refuse(done.reason)
    context.get(wakeContext)()
    throw redirect(`/notices/${notice.code}`)
  })
}

export default function NoticePage({ loaderData, actionData }: Route.ComponentProps) {
  const { notice, force, climbs, revisions, may } = loaderData
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
      <ForceBand notice={notice} force={force} asks={may.withdraw} />
      <NoticeFacts notice={notice} force={force} climbs={climbs} />
      <Moves may={may} />
      <h2 className="mt-10 text-1 font-semibold">Wordings</h2>
      <ol className="mt-2 border-t border-slate">
        {revisions.map(revision => (
          <li key={revision.number} className="border-b border-rule py-3">
            <span className="text-stone">{`${revision.number}, ${formatMoment(revision.at, notice.timeZone)}`}</span>
            <p className="max-w-[62ch] whitespace-pre-line" lang={notice.lang}>
              {revision.words}
            </p>
          </li>
        ))}
      </ol>
      <p className="mt-2 text-s text-stone">{`Times are ${formatZone(notice.timeZone)}.`}</p>
    </Page>
  )
}

function Moves({ may }: { may: Route.ComponentProps['loaderData']['may'] }) {
  const busy = useNavigation().state === 'submitting'
  if (!may.confirm && !may.withdraw) return null
  return (
    <Form method="post" noValidate className="mt-6 flex flex-wrap gap-3">
      {may.confirm && (
        <Button kind="action" name="do" value="confirm" pending={busy}>
          Confirm warning
        </Button>
      )}
      {may.revise && (
        <ButtonLink kind="quiet" to={`/notices/new?hazard=${may.revise}`}>
          Write notice in its place
        </ButtonLink>
      )}
      {may.withdraw && (
        <Button kind="danger" name="do" value="withdraw" pending={busy}>
          Withdraw notice
        </Button>
      )}
    </Form>
  )
}
