import { Form, redirect, useNavigation } from 'react-router'
import { requireCragSubject } from '~/crags/crags.server'
import { toSlug } from '~/lib/code'
import { isUuid } from '~/lib/uuid'
import { requireCan, requirePerson } from '~/people/guards.server'
import { can } from '~/people/viewer'
import { viewerContext } from '~/people/viewer-context'
import { Urgency } from '~/rating/components/band-word'
import { toAct } from '~/record/acts.server'
import { ReportDecision } from '~/reports/components/report-decision'
import { ReportLines } from '~/reports/components/report-lines'
import { UrgencyWords } from '~/reports/components/urgency-panel'
import { askDetail, declineReport, putOnRecord, takeIn } from '~/reports/decide.server'
import { decisionSchema } from '~/reports/decision.schema'
import { listFindings } from '~/reports/findings.server'
import { findJudgement } from '~/reports/judgements.server'
import { toReportLinks } from '~/reports/links.server'
import { listPhotos } from '~/reports/photos.server'
import { reportStateWords } from '~/reports/report'
import { findReport } from '~/reports/reports.server'
import { Page } from '~/ui/page'
import { Refused } from '~/ui/refused'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { parseForm, readForm, toTyped } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { invalid, notFound, refuse } from '~/web/responses'
import type { Route } from './+types/$id'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  {
    title: `Report: ${loaderData?.report.position ?? ''}, ${loaderData?.report.climbName ?? ''} · Cragfettle`,
  },
]

async function requireReport({
  request,
  params,
  context,
}: Pick<Route.LoaderArgs, 'request' | 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const viewer = requirePerson(context.get(viewerContext), request)
  const report = isUuid(params.id) ? await findReport(db, viewer, params.id) : null
  if (report === null) throw notFound('No report stands at this address.')
  const subject = await requireCragSubject(db, report.cragId)
  requireCan(viewer, 'report:decide', subject, { seen: can(viewer, 'urgency:see', subject) })
  return { db, viewer, report, subject }
}

export async function loader(args: Route.LoaderArgs) {
  const { db, viewer, report, subject } = await requireReport(args)
  const seesNames = can(viewer, 'reporter:see', subject)
  return {
    report: {
      ...report,
      personName: seesNames ? report.personName : null,
      personEmail: null,
      guestEmail: seesNames ? report.guestEmail : null,
    },
    judgement: report.ratingId === null ? null : await findJudgement(db, report.ratingId),
    findings: await listFindings(db, [report.id]),
    photos: await listPhotos(db, { reportIds: [report.id] }),
    undecided: report.state === 'received' || report.state === 'needs_detail',
  }
}

export async function action(args: Route.ActionArgs) {
  const form = await readForm(args.request)
  const typed = toTyped(form)
  return await keepTyped(typed, async () => {
    const { db, viewer, report } = await requireReport(args)
    const parsed = parseForm(decisionSchema, form)
    if (!parsed.ok) return invalid(parsed)
    const { decision, question, reason, photo } = parsed.value
    const given = {
      reportId: report.id,
      act: toAct(args.context.get(clockContext)(), { kind: 'person', personId: viewer.person.id }),
      links: toReportLinks(args.context.get(settingsContext)),
    }
    const decide = {
      take_in: () => takeIn(db, { ...given, publicPhotoKeys: photo }),
      on_record: () => putOnRecord(db, given),
      ask: () => askDetail(db, { ...given, question: question ?? '' }),
      decline: () => declineReport(db, { ...given, reason: reason ?? '' }),
    }[decision]
    const done = await decide()
    if (!done.ok) return refuse(done.reason, typed)
    args.context.get(wakeContext)()
    throw redirect('hazardCode' in done ? `/hazards/${done.hazardCode}` : '/hazards')
  })
}

export default function ReportPage({ loaderData, actionData }: Route.ComponentProps) {
  const { report, judgement, findings, photos, undecided } = loaderData
  const busy = useNavigation().state === 'submitting'
  return (
    <Page
      title={`${report.position ?? 'Report'}, ${report.climbName ?? report.cragName}`}
      lead={`report, ${reportStateWords[report.state]}`}
      crumbs={[
        { label: 'Hazards', to: '/hazards' },
        { label: report.cragName, to: `/crags/${toSlug(report.cragName, report.cragCode)}` },
        ...(report.climbCode
          ? [
              {
                label: report.climbName!,
                to: `/climbs/${toSlug(report.climbName!, report.climbCode)}?point=${report.anchorCode}`,
              },
            ]
          : []),
      ]}
    >
      {actionData?.reason && <Refused reason={actionData.reason} />}
      <div className="mt-6 grid gap-x-11 gap-y-8 lg:grid-cols-2">
        <div>
          <h2 className="text-1 font-semibold">What was reported</h2>
          <ReportLines reports={[report]} findings={findings} />
          <Form method="post" noValidate className="mt-4">
            <ReportDecision
              undecided={undecided}
              reason={report.reason}
              hazardCode={report.hazardCode}
              photos={photos}
              typed={actionData?.typed ?? {}}
              errors={actionData?.errors ?? {}}
              busy={busy}
            />
          </Form>
        </div>
        <div>
          {judgement !== null && (
            <>
              <h2 className="text-1">
                <Urgency band={judgement.band} bandHigh={judgement.bandHigh} />{' '}
                <span className="text-stone">provisional</span>
              </h2>
              <UrgencyWords judgement={judgement} name={report.position ?? 'it'} />
            </>
          )}
        </div>
      </div>
    </Page>
  )
}
