import { randomBytes } from 'node:crypto'
import { data, Form, redirect, useNavigation } from 'react-router'
import { toDay } from '~/lib/dates'
import { requireCan, requirePerson } from '~/people/guards.server'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { PhotoField } from '~/reports/components/photo-field'
import { type PhotoForm, type PhotoFormAnswer, readPhotoForm } from '~/reports/photo-form.server'
import '~/reports/reports.css'
import { uploadsContext } from '~/reports/uploads-context'
import { Button } from '~/ui/button'
import { DateField, Field, TextArea } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'
import { Page } from '~/ui/page'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { parseForm } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { FirstButton } from '~/work/components/first-button'
import { PartRows } from '~/work/components/part-rows'
import { WorkCaution } from '~/work/components/work-caution'
import { listInPlace } from '~/work/fitted.server'
import { requireOrderOf } from '~/work/guards.server'
import { orderStateWords } from '~/work/order'
import { findRecord, listNeededParts } from '~/work/order-details.server'
import { toPartChoices, toPresetRows, withOneMore } from '~/work/part-rows'
import { recordWork } from '~/work/record.server'
import { recordLabels } from '~/work/words'
import { toRecordSchema } from '~/work/work.schema'
import type { Route } from './+types/$code.record'

export const meta: Route.MetaFunction = () => [{ title: 'Record work · Cragfettle' }]

async function requireJob({
  request,
  params,
  context,
}: Pick<Route.LoaderArgs, 'request' | 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const viewer = requirePerson(context.get(viewerContext), request)
  const { order, subject } = await requireOrderOf(db, viewer, params.code)
  requireCan(viewer, 'work:record', subject, { seen: true })
  const now = context.get(clockContext)()
  const anchorId = order.hazards[0]?.anchorId ?? null
  const there = anchorId === null ? [] : await listInPlace(db, anchorId)
  return { db, viewer, order, now, there, today: toDay(now, order.timeZone) }
}

export async function loader(args: Route.LoaderArgs) {
  const { db, viewer, order, there, today } = await requireJob(args)
  const before = (await findRecord(db, order.id))?.fitted ?? []
  return {
    order: {
      code: order.code,
      title: order.title,
      state: order.state,
      mine: order.workerId === viewer.person.id,
    },
    choices: toPartChoices(there),
    preset: toPresetRows({
      needed: await listNeededParts(db, order.id),
      before: before.flatMap(({ kind, material, ...part }) =>
        kind === null ? [] : [{ ...part, kind, material: material ?? ('unknown' as const) }],
      ),
      there,
      faulty: order.hazards[0]?.partId ?? null,
    }),
    again: before.length > 0,
    today,
    clientKey: randomBytes(24).toString('base64url'),
  }
}

/** The form as it was sent, its photos kept, with room for one more part. */
const toMore = ({ typed, staged, refused }: PhotoForm) =>
  data<PhotoFormAnswer>({ errors: {}, typed: withOneMore(typed), staged, refused })

export async function action(args: Route.ActionArgs) {
  const { context } = args
  const form = await readPhotoForm({
    request: args.request,
    db: context.get(databaseContext),
    uploads: context.get(uploadsContext),
    viewer: context.get(viewerContext),
    now: context.get(clockContext)(),
  })
  return await keepTyped(form.typed, async () => {
    const { db, viewer, order, now, there, today } = await requireJob(args)
    if (form.data.get('do') === 'more') return toMore(form)
    const ids = there.map(part => part.id)
    const schema = toRecordSchema({ today, photos: form.staged.length, there: ids })
    const parsed = parseForm(schema, form.data)
    if (!parsed.ok) return form.invalid(parsed.errors)
    if (form.refused.length > 0) return form.invalid({})
    const { minutes = null, words = null, noPhotoReason = null, ...record } = parsed.value
    const done = await recordWork(db, {
      orderId: order.id,
      ...record,
      ...{ minutes, words, noPhotoReason },
      photoKeys: form.staged.map(one => one.key),
      stagedBy: viewer.sessionHash,
      who: viewer.person.name,
      act: toAct(now, { kind: 'person', personId: viewer.person.id, organisationId: order.organisationId }),
      appUrl: context.get(settingsContext).appUrl,
    })
    if (!done.ok) return form.refuse(done.reason)
    context.get(wakeContext)()
    throw redirect(`/orders/${order.code}`)
  })
}

export default function RecordWork({ loaderData, actionData }: Route.ComponentProps) {
  const { order, choices, preset, again, today, clientKey } = loaderData
  const busy = useNavigation().state === 'submitting'
  const typed = actionData?.typed ?? {}
  const errors = actionData?.errors ?? {}
  const value = (name: string, before = '') => String(typed[name] ?? before)
  return (
    <Page
      title="Record work"
      lead={order.title}
      crumbs={[
        { label: 'Work', to: '/orders' },
        { label: order.title, to: `/orders/${order.code}` },
      ]}
    >
      {order.state !== 'accepted' || !order.mine ? (
        <p className="mt-5 max-w-[62ch]">
          {order.state === 'accepted'
            ? 'Somebody else has accepted this job and records it. Ask the coordinator if it should be you.'
            : `This order is ${orderStateWords[order.state]}, so there is nothing to record.`}
        </p>
      ) : (
        <Form method="post" noValidate encType="multipart/form-data" className="mt-5 grid max-w-[62ch] gap-5">
          <FormErrors errors={errors} reason={actionData?.reason} also={actionData?.refused} />
          <FirstButton />
          <input type="hidden" name="clientKey" value={value('clientKey', clientKey)} />
          <div className="grid gap-5 sm:grid-cols-2">
            <DateField
              label={recordLabels.doneOn}
              name="doneOn"
              max={today}
              defaultValue={value('doneOn', today)}
              error={errors.doneOn}
            />
            <Field
              label={recordLabels.minutes}
              name="minutes"
              inputMode="numeric"
              defaultValue={value('minutes')}
              error={errors.minutes}
            />
          </div>
          <h2 className="text-1 font-semibold">What was fitted</h2>
          {again && (
            <p className="text-s text-stone">
              All that this order has put there, also what was recorded before the work came back.
            </p>
          )}
          <PartRows name="fitted" {...{ typed, errors, preset, choices, busy }} none="nothing fitted" />
          <TextArea
            label={recordLabels.words}
            name="words"
            rows={3}
            defaultValue={value('words')}
            error={errors.words}
          />
          <PhotoField
            staged={actionData?.staged ?? []}
            refused={actionData?.refused ?? []}
            hint="At least one of the finished work. It may be shown to who reported it; leave faces out."
          />
          <Field
            label={recordLabels.noPhotoReason}
            name="noPhotoReason"
            defaultValue={value('noPhotoReason')}
            error={errors.noPhotoReason}
          />
          <WorkCaution />
          <p>
            <Button kind="action" pending={busy}>
              Record as done
            </Button>
          </p>
        </Form>
      )}
    </Page>
  )
}
