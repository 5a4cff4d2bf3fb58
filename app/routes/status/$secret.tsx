import { Form, Link, useNavigation } from 'react-router'
import { z } from 'zod'
import { toSlug } from '~/lib/code'
import { toAct } from '~/record/acts.server'
import { formatFinding } from '~/reports/finding-words'
import { listFindings } from '~/reports/findings.server'
import { hazardStateWords } from '~/reports/hazard'
import { findLinkedReport } from '~/reports/links.server'
import { answerDetail, withdrawReport } from '~/reports/reply.server'
import { reportMoves } from '~/reports/report'
import { findReportById } from '~/reports/reports.server'
import { Button } from '~/ui/button'
import { TextArea } from '~/ui/field'
import { Page } from '~/ui/page'
import { Refused } from '~/ui/refused'
import { formatDay, formatMoment, formatZone } from '~/ui/when'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { textField } from '~/web/fields.server'
import { parseForm, readForm, toTyped } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { invalid, notFound, refuse } from '~/web/responses'
import type { Route } from './+types/$secret'

export const meta: Route.MetaFunction = () => [
  { title: 'Your report · Cragfettle' },
  { name: 'robots', content: 'noindex' },
]

async function requireReport({ params, context }: Pick<Route.LoaderArgs, 'params' | 'context'>) {
  const now = context.get(clockContext)()
  const id = findLinkedReport(params.secret, context.get(settingsContext).appSecret)
  const report = id === null ? null : await findReportById(context.get(databaseContext), id)
  if (report === null) throw notFound('This link opens no report. Use the whole link from the mail.')
  return { report, now }
}

export async function loader({ params, request, context }: Route.LoaderArgs) {
  const { report } = await requireReport({ params, context })
  const found = await listFindings(context.get(databaseContext), [report.id])
  const {
    state,
    reason,
    seenOn,
    receivedAt,
    words,
    position,
    climbName,
    climbCode,
    cragName,
    timeZone,
    hazardState,
  } = report
  return {
    report: {
      state,
      reason,
      seenOn,
      receivedAt,
      words,
      position,
      climbName,
      climbCode,
      cragName,
      timeZone,
      hazardState,
    },
    confirmed: report.confirmedAt !== null,
    found: found.map(finding => formatFinding(finding)).join('; '),
    sent: new URL(request.url).searchParams.has('sent'),
    canWithdraw: reportMoves.some(move => move.from === report.state && move.to === 'withdrawn'),
  }
}

const answerSchema = z.object({
  answer: textField({ what: 'your answer', example: '“it was the left ring”', max: 2000, lines: true }),
})

export async function action({ request, params, context }: Route.ActionArgs) {
  const db = context.get(databaseContext)
  const form = await readForm(request)
  const typed = toTyped(form)
  return await keepTyped(typed, async () => {
    const { report, now } = await requireReport({ params, context })
    const act = toAct(now, { kind: 'link', personId: report.personId })
    if (form.get('do') === 'withdraw') {
      const done = await withdrawReport(db, { reportId: report.id, act })
      return done.ok ? null : refuse(done.reason)
    }
    const parsed = parseForm(answerSchema, form)
    if (!parsed.ok) return invalid(parsed)
    const done = await answerDetail(db, { reportId: report.id, act, answer: parsed.value.answer })
    context.get(wakeContext)()
    return done.ok ? null : refuse(done.reason, typed)
  })
}

type Shown = Route.ComponentProps['loaderData']['report']

/** What becomes of a report, in one sentence each. */
function toStatus(report: Shown): string {
  switch (report.state) {
    case 'received':
      return 'It is here. A coordinator looks at it and decides what happens next.'
    case 'needs_detail':
      return 'A coordinator has a question before going on.'
    case 'on_record':
      return 'It is on record. Nothing has to be mended for now.'
    case 'declined':
      return 'It was not taken in.'
    case 'withdrawn':
      return 'You took it back.'
    case 'taken_in':
      return report.hazardState === 'cleared'
        ? 'It has been mended and checked. Thank you.'
        : `It was taken in as a hazard, which is ${hazardStateWords[report.hazardState ?? 'open']} now.`
  }
}

export default function Status({ loaderData, actionData }: Route.ComponentProps) {
  const { report, found, sent, confirmed, canWithdraw } = loaderData
  const busy = useNavigation().state === 'submitting'
  return (
    <Page
      title={sent ? 'Thank you, your report is here' : 'Your report'}
      lead={`${report.position} on ${report.climbName}, ${report.cragName}`}
    >
      {actionData?.reason && <Refused reason={actionData.reason} />}
      <p className="mt-4 max-w-[62ch] text-1 font-medium">{toStatus(report)}</p>
      {report.reason && (
        <blockquote className="mt-3 max-w-[62ch] border-l-3 border-rule pl-3">{report.reason}</blockquote>
      )}
      {!confirmed && (
        <p className="mt-3 max-w-[62ch]">
          We have mailed you a link to confirm your address. Until then we cannot tell you what becomes of it,
          but it is not lost: this page shows it too. Keep its address.
        </p>
      )}
      {report.state === 'needs_detail' && (
        <Form method="post" noValidate className="mt-5 max-w-[62ch]">
          <TextArea
            label="Your answer"
            name="answer"
            rows={4}
            defaultValue={String(actionData?.typed.answer ?? '')}
            error={actionData?.errors.answer}
          />
          <p className="mt-3">
            <Button kind="action" pending={busy}>
              Send answer
            </Button>
          </p>
        </Form>
      )}
      <h2 className="mt-8 text-1 font-semibold">What you told us</h2>
      <p className="mt-1 max-w-[62ch]">{`${found}. Seen on ${formatDay(report.seenOn)}, received ${formatMoment(report.receivedAt, report.timeZone)} (${formatZone(report.timeZone)}).`}</p>
      {report.words && <p className="mt-2 max-w-[62ch] whitespace-pre-line">{report.words}</p>}
      {report.climbCode && (
        <p className="mt-4">
          <Link
            to={`/climbs/${toSlug(report.climbName ?? '', report.climbCode)}`}
          >{`See ${report.climbName}`}</Link>
        </p>
      )}
      {canWithdraw && (
        <Form method="post" noValidate className="mt-6">
          <Button kind="quiet" name="do" value="withdraw" pending={busy}>
            Take this report back
          </Button>
        </Form>
      )}
    </Page>
  )
}
