import { Form, redirect, useNavigation } from 'react-router'
import { listClimbsOf } from '~/crags/anchors.server'
import { requireCragSubject } from '~/crags/crags.server'
import { parseCode } from '~/lib/code'
import { addMonths, toDay, toDayEnd } from '~/lib/dates'
import { toFirstWarning, toWarnedPlace } from '~/notices/first-warning'
import { findPublisher, noticeKindWords, writtenKinds } from '~/notices/notice'
import { toNoticeSchema } from '~/notices/notice.schema'
import { publishNotice } from '~/notices/publish.server'
import { requireCan, requirePerson } from '~/people/guards.server'
import { can } from '~/people/viewer'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { findHazard } from '~/reports/hazards.server'
import { Button } from '~/ui/button'
import { DateField, Field, Select, TextArea } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'
import { Page } from '~/ui/page'
import { clockContext, databaseContext, wakeContext } from '~/web/context'
import { parseForm, readForm, toTyped } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { invalid, notFound, refuse } from '~/web/responses'
import type { Route } from './+types/new'

export const meta: Route.MetaFunction = () => [{ title: 'Write notice · Cragfettle' }]

async function requireHazard({ request, context }: Pick<Route.LoaderArgs, 'request' | 'context'>) {
  const db = context.get(databaseContext)
  const viewer = requirePerson(context.get(viewerContext), request)
  const code = parseCode(new URL(request.url).searchParams.get('hazard') ?? '')
  const hazard = code === null ? null : await findHazard(db, viewer, code)
  if (hazard === null) throw notFound('Notices are written from a hazard’s page. Open the hazard first.')
  const subject = await requireCragSubject(db, hazard.cragId)
  requireCan(viewer, 'notice:manage', subject, { seen: can(viewer, 'urgency:see', subject) })
  const now = context.get(clockContext)()
  return { db, viewer, hazard, subject, now, today: toDay(now, hazard.timeZone) }
}

export async function loader(args: Route.LoaderArgs) {
  const { db, viewer, hazard, subject, today } = await requireHazard(args)
  const climbs = hazard.anchorId === null ? [] : await listClimbsOf(db, hazard.anchorId)
  const { headline, words } = toFirstWarning(toWarnedPlace(hazard, climbs))
  return {
    hazard: { code: hazard.code, headline: hazard.headline, cragName: hazard.cragName },
    draft: {
      kind: 'hazard',
      headline,
      words,
      decidedByWords: findPublisher(viewer, 'notice:manage', subject)?.organisationName ?? '',
      ground: hazard.headline,
      reviewOn: addMonths(today, 2),
      endsOn: '',
    },
  }
}

export async function action(args: Route.ActionArgs) {
  const form = await readForm(args.request)
  const typed = toTyped(form)
  return await keepTyped(typed, async () => {
    const { db, viewer, hazard, now, today } = await requireHazard(args)
    const parsed = parseForm(toNoticeSchema(today), form)
    if (!parsed.ok) return invalid(parsed)
    const { endsOn, ...notice } = parsed.value
    const done = await publishNotice(db, {
      hazardCode: hazard.code,
      viewer,
      act: toAct(now, { kind: 'person', personId: viewer.person.id }),
      notice: { ...notice, endsAt: endsOn === undefined ? null : toDayEnd(endsOn, hazard.timeZone) },
    })
    if (!done.ok) return refuse(done.reason, typed)
    args.context.get(wakeContext)()
    throw redirect(`/notices/${done.noticeCode}`)
  })
}

export default function NewNotice({ loaderData, actionData }: Route.ComponentProps) {
  const { hazard, draft } = loaderData
  const busy = useNavigation().state === 'submitting'
  const errors = actionData?.errors ?? {}
  const value = (name: keyof typeof draft) => String(actionData?.typed[name] ?? draft[name])
  return (
    <Page
      title="Write notice"
      lead={hazard.headline}
      crumbs={[{ label: hazard.cragName }, { label: 'Hazard', to: `/hazards/${hazard.code}` }]}
    >
      <Form method="post" noValidate className="mt-5 grid max-w-[62ch] gap-5">
        <FormErrors errors={errors} reason={actionData?.reason} />
        <Select
          label="Kind"
          name="kind"
          defaultValue={value('kind')}
          options={writtenKinds.map(kind => ({ value: kind, label: noticeKindWords[kind] }))}
          error={errors.kind}
        />
        <Field label="Headline" name="headline" defaultValue={value('headline')} error={errors.headline} />
        <TextArea
          label="What people are to know and do"
          hint="Say what not to rely on. Recommend no other fixed point unless it was checked, with the date."
          name="words"
          rows={4}
          defaultValue={value('words')}
          error={errors.words}
        />
        <Field
          label="Whose decision"
          name="decidedByWords"
          defaultValue={value('decidedByWords')}
          error={errors.decidedByWords}
        />
        <Field label="On what ground" name="ground" defaultValue={value('ground')} error={errors.ground} />
        <div className="grid items-start gap-5 sm:grid-cols-2">
          <DateField
            label="Looked at again on"
            name="reviewOn"
            defaultValue={value('reviewOn')}
            error={errors.reviewOn}
          />
          <DateField
            label="Last day, if there is one"
            name="endsOn"
            defaultValue={value('endsOn')}
            error={errors.endsOn}
          />
        </div>
        <p>
          <Button kind="action" pending={busy}>
            Publish notice
          </Button>
        </p>
      </Form>
    </Page>
  )
}
