import { randomBytes } from 'node:crypto'
import { Form, redirect, useNavigation } from 'react-router'
import { listParts } from '~/crags/anchors.server'
import { findClimb } from '~/crags/climbs.server'
import { formatPart } from '~/crags/part'
import { parseCode } from '~/lib/code'
import { addDays, toDay } from '~/lib/dates'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { PhotoField } from '~/reports/components/photo-field'
import { ReportCaution } from '~/reports/components/report-caution'
import { ReportQuestions } from '~/reports/components/report-questions'
import { listHazardsAt } from '~/reports/hazards.server'
import { toReportLinks } from '~/reports/links.server'
import { readPhotoForm } from '~/reports/photo-form.server'
import { toFindings, toReportSchema } from '~/reports/report.schema'
import { sendReport } from '~/reports/send.server'
import '~/reports/reports.css'
import { uploadsContext } from '~/reports/uploads-context'
import { StepBar } from '~/ui/bar'
import { Button } from '~/ui/button'
import { FormErrors } from '~/ui/form-errors'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { parseForm } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { notFound } from '~/web/responses'
import type { Route } from './+types/$climb.$point'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `What is wrong? ${loaderData?.point.name ?? ''}, ${loaderData?.climb.name ?? ''} · Cragfettle` },
  {
    name: 'description',
    content: 'Say what is wrong with this fixed point, with a measure, a photo and a few words.',
  },
]

async function requirePlace({ params, context }: Pick<Route.LoaderArgs, 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const now = context.get(clockContext)()
  const code = parseCode(params.climb)
  const climb =
    code === null ? null : await findClimb(db, context.get(viewerContext), code, toDay(now, 'UTC'))
  const point = climb?.points.find(one => one.code === parseCode(params.point))
  if (climb === null || point === undefined)
    throw notFound('That fixed point is not on this route. Choose it on the line of the route.')
  return { climb, point, now, today: toDay(now, climb.timeZone) }
}

export async function loader({ params, context }: Route.LoaderArgs) {
  const db = context.get(databaseContext)
  const { climb, point, today } = await requirePlace({ params, context })
  const there = (await listParts(db, point.anchorId)).filter(part => part.removedOn === null)
  const known = (await listHazardsAt(db, [point.anchorId])).find(
    hazard => hazard.state === 'open' || hazard.state === 'warned',
  )
  return {
    climb: { code: climb.code, name: climb.name, cragName: climb.cragName },
    point: { code: point.code, name: point.name },
    parts: there.map(part => ({ id: part.id, words: formatPart(part) })),
    known: known === undefined ? null : { headline: known.headline, since: known.openedAt },
    guest: context.get(viewerContext).person === null,
    today,
    clientKey: randomBytes(24).toString('base64url'),
  }
}

export async function action({ request, params, context }: Route.ActionArgs) {
  const db = context.get(databaseContext)
  const viewer = context.get(viewerContext)
  const settings = context.get(settingsContext)
  const form = await readPhotoForm({
    request,
    db,
    uploads: context.get(uploadsContext),
    viewer,
    now: context.get(clockContext)(),
  })
  return await keepTyped(form.typed, async () => {
    const { climb, point, now, today } = await requirePlace({ params, context })
    const schema = toReportSchema({ today, earliest: addDays(today, -730), guest: viewer.person === null })
    const parsed = parseForm(schema, form.data)
    if (!parsed.ok) return form.invalid(parsed.errors)
    if (form.refused.length > 0) return form.invalid({})
    const { reportId: _, statusSecret } = await sendReport(db, {
      act: toAct(now, { kind: viewer.person ? 'person' : 'guest', personId: viewer.person?.id ?? null }),
      links: toReportLinks(settings),
      clientKey: parsed.value.clientKey,
      cragId: climb.cragId,
      climbId: climb.id,
      anchorId: point.anchorId,
      place: `the ${point.name.toLowerCase()} on ${climb.name}, ${climb.cragName}`,
      seenOn: parsed.value.seenOn,
      howSeen: parsed.value.howSeen,
      words: parsed.value.words ?? null,
      findings: toFindings(parsed.value),
      photoKeys: form.staged.map(photo => photo.key),
      stagedBy: viewer.sessionHash ?? viewer.guestHash,
      person: viewer.person,
      guestEmail: viewer.person === null ? (parsed.value.email ?? null) : null,
    })
    context.get(wakeContext)()
    throw redirect(`/status/${statusSecret}?sent=1`)
  })
}

/** Third step: what is wrong. One page, so that one press sends it. */
export default function ReportWhat({ loaderData, actionData }: Route.ComponentProps) {
  const { climb, point, parts, known, guest, today, clientKey } = loaderData
  const sending = useNavigation().state === 'submitting'
  const typed = actionData?.typed ?? {}
  const errors = actionData?.errors ?? {}
  return (
    <>
      <StepBar back={`/report/${climb.code}`} title={point.name} note={climb.name} />
      <main className="report-sheet">
        <p className="text-s text-stone">{`${climb.cragName}, ${climb.name}`}</p>
        <h1 className="mb-3 text-2 font-semibold">What is wrong?</h1>
        <Form method="post" noValidate encType="multipart/form-data">
          <FormErrors errors={errors} reason={actionData?.reason} also={actionData?.refused} />
          {known && (
            <p className="mt-2 text-s text-stone">{`Known already: ${known.headline}. Your look at it still helps.`}</p>
          )}
          <input type="hidden" name="clientKey" value={String(typed.clientKey ?? clientKey)} />
          <ReportQuestions parts={parts} typed={typed} errors={errors} today={today} guest={guest} />
          <PhotoField staged={actionData?.staged ?? []} refused={actionData?.refused ?? []} />
          <ReportCaution />
          <div className="report-send">
            <Button kind="action" pending={sending}>
              Send report
            </Button>
          </div>
        </Form>
      </main>
    </>
  )
}
