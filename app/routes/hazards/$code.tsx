import { Form, Link, redirect, useNavigation } from 'react-router'
import { requireCragSubject } from '~/crags/crags.server'
import { formatCode, parseCode, toSlug } from '~/lib/code'
import { NoticeBands } from '~/notices/components/notice-bands'
import { noticesInForce } from '~/notices/notices.server'
import { publishFirstWarning } from '~/notices/publish.server'
import { requireCan, requirePerson } from '~/people/guards.server'
import { can } from '~/people/viewer'
import { viewerContext } from '~/people/viewer-context'
import { Urgency } from '~/rating/components/band-word'
import { listActivities } from '~/record/activities.server'
import { toAct } from '~/record/acts.server'
import { formatActivity } from '~/reports/activity-words'
import { PhotoStrip } from '~/reports/components/photo-strip'
import { ReportLines } from '~/reports/components/report-lines'
import { UrgencyWords } from '~/reports/components/urgency-panel'
import { listFindings } from '~/reports/findings.server'
import { hazardStateWords } from '~/reports/hazard'
import { findHazard } from '~/reports/hazards.server'
import { findJudgement } from '~/reports/judgements.server'
import { listPhotos } from '~/reports/photos.server'
import { listReportsOf } from '~/reports/reports.server'
import { Button, ButtonLink } from '~/ui/button'
import { Page } from '~/ui/page'
import { Refused } from '~/ui/refused'
import { formatMoment, formatZone } from '~/ui/when'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { keepTyped } from '~/web/keep-typed.server'
import { notFound, refuse } from '~/web/responses'
import { orderStateWords } from '~/work/order'
import { listOrdersOf } from '~/work/orders.server'
import type { Route } from './+types/$code'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.hazard.headline ?? 'Hazard'} · Cragfettle` },
]

async function requireHazard({
  request,
  params,
  context,
}: Pick<Route.LoaderArgs, 'request' | 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const viewer = requirePerson(context.get(viewerContext), request)
  const code = parseCode(params.code)
  const hazard = code === null ? null : await findHazard(db, viewer, code)
  if (hazard === null) throw notFound('No hazard carries this code.')
  const subject = await requireCragSubject(db, hazard.cragId)
  requireCan(viewer, 'urgency:see', subject, { seen: false })
  return { db, viewer, hazard, subject, now: context.get(clockContext)() }
}

export async function loader(args: Route.LoaderArgs) {
  const { db, viewer, hazard, subject, now } = await requireHazard(args)
  const reports = await listReportsOf(db, hazard.id)
  const ids = reports.map(report => report.id)
  const seesNames = can(viewer, 'reporter:see', subject)
  return {
    hazard,
    judgement: hazard.ratingId === null ? null : await findJudgement(db, hazard.ratingId),
    reports: reports.map(report => ({
      ...report,
      personName: seesNames ? report.personName : null,
      personEmail: null,
      guestEmail: seesNames ? report.guestEmail : null,
    })),
    findings: await listFindings(db, ids),
    photos: await listPhotos(db, { reportIds: ids }),
    notices: await noticesInForce(db, viewer, {
      now,
      anchorIds: hazard.anchorId ? [hazard.anchorId] : [],
      climbId: hazard.climbId ?? undefined,
    }),
    orders: await listOrdersOf(db, hazard.id),
    history: (await listActivities(db, [hazard.id, ...ids], { publicOnly: false })).map(line => ({
      id: line.id,
      at: line.at,
      words: formatActivity(line),
    })),
    may: {
      warn: can(viewer, 'warning:publish', subject) && hazard.state === 'open',
      notice: can(viewer, 'notice:manage', subject) && ['open', 'warned'].includes(hazard.state),
      order: can(viewer, 'order:manage', subject) && ['open', 'warned'].includes(hazard.state),
    },
  }
}

export async function action(args: Route.ActionArgs) {
  return await keepTyped({}, async () => {
    const { db, viewer, hazard, subject, now } = await requireHazard(args)
    requireCan(viewer, 'warning:publish', subject, { seen: true })
    const act = toAct(now, { kind: 'person', personId: viewer.person.id })
    const done = await publishFirstWarning(db, {
      hazardCode: hazard.code,
      viewer,
      act,
      appUrl: args.context.get(settingsContext).appUrl,
    })
    if (!done.ok) return refuse(done.reason)
    args.context.get(wakeContext)()
    throw redirect(`/hazards/${hazard.code}`)
  })
}

export default function HazardPage({ loaderData, actionData }: Route.ComponentProps) {
  const { hazard, judgement, reports, findings, photos, notices, orders, history, may } = loaderData
  const busy = useNavigation().state === 'submitting'
  return (
    <Page
      title={hazard.headline}
      lead={`${formatCode(hazard.code)}, ${hazardStateWords[hazard.state]}`}
      crumbs={[
        { label: 'Hazards', to: '/hazards' },
        { label: hazard.cragName, to: `/crags/${toSlug(hazard.cragName, hazard.cragCode)}` },
        ...(hazard.climbCode
          ? [
              {
                label: hazard.climbName!,
                to: `/climbs/${toSlug(hazard.climbName!, hazard.climbCode)}?point=${hazard.anchorCode}`,
              },
            ]
          : []),
      ]}
    >
      {actionData?.reason && <Refused reason={actionData.reason} />}
      <NoticeBands notices={notices} timeZone={hazard.timeZone} />
      <div className="mt-6 grid gap-x-11 gap-y-8 lg:grid-cols-2">
        <div>
          {judgement !== null && (
            <>
              <h2 className="text-1">
                <Urgency band={judgement.band} bandHigh={judgement.bandHigh} />
              </h2>
              <UrgencyWords judgement={judgement} name={hazard.position ?? 'it'} />
            </>
          )}
          <div className="mt-6 flex flex-wrap gap-3">
            {may.order && orders.every(order => order.state === 'cancelled') && (
              <ButtonLink to={`/orders/new?hazard=${hazard.code}`}>Make order</ButtonLink>
            )}
            {may.warn && (
              <Form method="post" noValidate>
                <Button kind="quiet" pending={busy}>
                  Publish first warning
                </Button>
              </Form>
            )}
            {may.notice && (
              <ButtonLink kind="quiet" to={`/notices/new?hazard=${hazard.code}`}>
                Write notice
              </ButtonLink>
            )}
          </div>
          {may.warn && (
            <p className="mt-2 text-s text-stone">
              A first warning has fixed words, stands 7 days and while the hazard is open, and goes to an
              access officer.
            </p>
          )}
        </div>
        <div>
          <h2 className="text-1 font-semibold">
            {reports.length === 1 ? 'The report' : `${reports.length} reports`}
          </h2>
          <ReportLines reports={reports} findings={findings} />
          <PhotoStrip photos={photos} />
          <h2 className="mt-8 text-1 font-semibold">Orders</h2>
          <ul className="mt-2 border-t border-slate">
            {orders.map(order => (
              <li key={order.code} className="border-b border-rule py-2">
                <Link to={`/orders/${order.code}`}>{formatCode(order.code)}</Link>,{' '}
                {orderStateWords[order.state]}
              </li>
            ))}
            {orders.length === 0 && <li className="border-b border-rule py-2 text-stone">No order yet.</li>}
          </ul>
          <h2 className="mt-8 text-1 font-semibold">History</h2>
          <ul className="mt-2 border-t border-slate">
            {history.map(line => (
              <li key={line.id} className="flex gap-4 border-b border-rule py-2">
                <span className="w-40 shrink-0 text-stone">{formatMoment(line.at, hazard.timeZone)}</span>
                <span>{line.words}</span>
              </li>
            ))}
          </ul>
          <p className="mt-2 text-s text-stone">{`Times are ${formatZone(hazard.timeZone)}.`}</p>
        </div>
      </div>
    </Page>
  )
}
