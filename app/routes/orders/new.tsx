import { data, Form, Link, redirect, useNavigation } from 'react-router'
import { requireCragSubject } from '~/crags/crags.server'
import { parseCode } from '~/lib/code'
import { toDay } from '~/lib/dates'
import { requireCan, requirePerson } from '~/people/guards.server'
import { can } from '~/people/viewer'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { findHazard } from '~/reports/hazards.server'
import { Button } from '~/ui/button'
import { DateField, Select, TextArea } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'
import { Page } from '~/ui/page'
import { clockContext, databaseContext } from '~/web/context'
import { parseForm, readForm, toTyped } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { type FormAnswer, invalid, notFound, refuse } from '~/web/responses'
import { FirstButton } from '~/work/components/first-button'
import { PartRows } from '~/work/components/part-rows'
import { jobKinds, jobKindWords, toUsualJob } from '~/work/job'
import { findObstacle, makeOrder } from '~/work/make.server'
import { toOrderSchema } from '~/work/order.schema'
import { findLiveOrder } from '~/work/orders.server'
import { withOneMore } from '~/work/part-rows'
import { toOrderSubject } from '~/work/subject'
import type { Route } from './+types/new'

export const meta: Route.MetaFunction = () => [{ title: 'Make order · Cragfettle' }]

async function requireHazard({ request, context }: Pick<Route.LoaderArgs, 'request' | 'context'>) {
  const db = context.get(databaseContext)
  const viewer = requirePerson(context.get(viewerContext), request)
  const code = parseCode(new URL(request.url).searchParams.get('hazard') ?? '')
  const hazard = code === null ? null : await findHazard(db, viewer, code)
  if (hazard === null) throw notFound('Orders are made from a hazard’s page. Open the hazard first.')
  const subject = await requireCragSubject(db, hazard.cragId)
  requireCan(viewer, 'order:manage', subject, { seen: can(viewer, 'urgency:see', subject) })
  // of several organisations one works for, the order is of the first whose coordinator one is there
  const { organisationId } = viewer.memberships.find(membership =>
    can(viewer, 'order:manage', toOrderSubject(subject, membership.organisationId)),
  )!
  return { db, viewer, hazard, organisationId, today: toDay(context.get(clockContext)(), hazard.timeZone) }
}

export async function loader(args: Route.LoaderArgs) {
  const { db, hazard } = await requireHazard(args)
  const obstacle = await findObstacle(db, hazard)
  return {
    obstacle,
    live: obstacle === null ? null : await findLiveOrder(db, hazard.id),
    hazard: {
      code: hazard.code,
      headline: hazard.headline,
      cragName: hazard.cragName,
      climbName: hazard.climbName,
    },
    kind: toUsualJob(hazard.mode, hazard.anchorKind),
    consentUnknown: hazard.consent === 'unknown',
  }
}

export async function action(args: Route.ActionArgs) {
  const form = await readForm(args.request)
  const typed = toTyped(form)
  return await keepTyped(typed, async () => {
    const { db, viewer, hazard, organisationId, today } = await requireHazard(args)
    if (form.get('do') === 'more') return data<FormAnswer>({ errors: {}, typed: withOneMore(typed) })
    const parsed = parseForm(toOrderSchema({ today, consentUnknown: hazard.consent === 'unknown' }), form)
    if (!parsed.ok) return invalid(parsed)
    const { aimOn = null, consentReason = null, needed: parts, ...order } = parsed.value
    const done = await makeOrder(db, {
      hazardId: hazard.id,
      organisationId,
      ...order,
      ...{ aimOn, consentReason, parts },
      act: toAct(args.context.get(clockContext)(), {
        kind: 'person',
        personId: viewer.person.id,
        organisationId,
      }),
    })
    if (!done.ok) return refuse(done.reason, typed)
    throw redirect(`/orders/${done.code}`)
  })
}

export default function NewOrder({ loaderData, actionData }: Route.ComponentProps) {
  const { hazard, kind, consentUnknown, obstacle, live } = loaderData
  const busy = useNavigation().state === 'submitting'
  const errors = actionData?.errors ?? {}
  const typed = actionData?.typed ?? {}
  const value = (name: string, before = '') => String(typed[name] ?? before)
  return (
    <Page
      title="Make order"
      lead={[hazard.climbName, hazard.cragName].filter(Boolean).join(', ')}
      crumbs={[
        { label: 'Hazards', to: '/hazards' },
        { label: hazard.headline, to: `/hazards/${hazard.code}` },
      ]}
    >
      {obstacle !== null ? (
        <p className="mt-5 max-w-[62ch]">
          {obstacle} {live && <Link to={`/orders/${live.code}`}>Open the order</Link>}
        </p>
      ) : (
        <Form method="post" noValidate className="mt-5 grid max-w-[62ch] gap-5">
          <FirstButton />
          <FormErrors errors={errors} reason={actionData?.reason} />
          <Select
            label="Kind of job"
            name="kind"
            defaultValue={value('kind', kind)}
            options={jobKinds.map(one => ({ value: one, label: jobKindWords[one] }))}
            error={errors.kind}
          />
          <TextArea
            label="What is to be done"
            hint="As it stands on the sheet, for example: Replace the worn ring by a titanium ring of 12 mm."
            name="what"
            rows={3}
            defaultValue={value('what')}
            error={errors.what}
          />
          <h2 className="text-1 font-semibold">Parts</h2>
          <PartRows name="needed" {...{ typed, errors, busy }} preset={[]} none="no part needed" />
          <div className="grid gap-5 sm:grid-cols-2">
            <DateField
              label="To be done by"
              name="aimOn"
              defaultValue={value('aimOn')}
              error={errors.aimOn}
            />
          </div>
          {consentUnknown && (
            <TextArea
              label="Why the work goes on although consent is not known"
              hint="Prints on the sheet."
              name="consentReason"
              rows={2}
              defaultValue={value('consentReason')}
              error={errors.consentReason}
            />
          )}
          <p>
            <Button kind="action" pending={busy}>
              Make order
            </Button>
          </p>
        </Form>
      )}
    </Page>
  )
}
