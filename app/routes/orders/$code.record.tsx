import { randomBytes } from 'node:crypto'
import { Form, redirect, useNavigation } from 'react-router'
import { listParts } from '~/crags/anchors.server'
import { requireCragSubject } from '~/crags/crags.server'
import { formatPart } from '~/crags/part'
import { parseCode } from '~/lib/code'
import { toDay } from '~/lib/dates'
import { requireCan, requirePerson } from '~/people/guards.server'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { PhotoField } from '~/reports/components/photo-field'
import { readPhotoForm } from '~/reports/photo-form.server'
import '~/reports/reports.css'
import { uploadsContext } from '~/reports/uploads-context'
import { Button } from '~/ui/button'
import { DateField, Field, Select, TextArea } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'
import { Page } from '~/ui/page'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { parseForm } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { notFound } from '~/web/responses'
import { PartFields } from '~/work/components/part-fields'
import { WorkCaution } from '~/work/components/work-caution'
import { orderStateWords } from '~/work/order'
import { toRecordSchema } from '~/work/order.schema'
import { listNeededParts } from '~/work/order-details.server'
import { findOrder } from '~/work/orders.server'
import { recordWork } from '~/work/record.server'
import type { Route } from './+types/$code.record'

export const meta: Route.MetaFunction = () => [{ title: 'Record work · Cragfettle' }]

async function requireJob({
  request,
  params,
  context,
}: Pick<Route.LoaderArgs, 'request' | 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const viewer = requirePerson(context.get(viewerContext), request)
  const code = parseCode(params.code)
  const order = code === null ? null : await findOrder(db, viewer, code)
  if (order === null) throw notFound('No order of your organisation carries this code.')
  requireCan(viewer, 'work:record', await requireCragSubject(db, order.cragId), { seen: true })
  const now = context.get(clockContext)()
  return { db, viewer, order, now, today: toDay(now, order.timeZone) }
}

export async function loader(args: Route.LoaderArgs) {
  const { db, viewer, order, today } = await requireJob(args)
  const anchorId = order.hazards[0]?.anchorId
  const there =
    anchorId == null ? [] : (await listParts(db, anchorId)).filter(part => part.removedOn === null)
  const [needed] = await listNeededParts(db, order.id)
  return {
    order: {
      code: order.code,
      title: order.title,
      state: order.state,
      mine: order.workerId === viewer.person.id,
    },
    parts: there.map(part => ({ id: part.id, words: formatPart(part) })),
    worn: order.hazards[0]?.partId ?? '',
    needed: needed ?? null,
    today,
    clientKey: randomBytes(24).toString('base64url'),
  }
}

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
    const { db, viewer, order, now, today } = await requireJob(args)
    const parsed = parseForm(toRecordSchema({ today, photos: form.staged.length }), form.data)
    if (!parsed.ok) return form.invalid(parsed.errors)
    if (form.refused.length > 0) return form.invalid({})
    const {
      partKind,
      partMaterial,
      partSize,
      partSide,
      partMarking,
      replaces,
      photo: _,
      ...record
    } = parsed.value
    const side = partSide ?? null
    const done = await recordWork(db, {
      orderId: order.id,
      clientKey: record.clientKey,
      doneOn: record.doneOn,
      minutes: record.minutes ?? null,
      words: record.words ?? null,
      noPhotoReason: record.noPhotoReason ?? null,
      photoKeys: form.staged.map(one => one.key),
      stagedBy: viewer.sessionHash,
      fitted:
        partKind === undefined
          ? []
          : [
              {
                replaces: replaces ?? null,
                side,
                kind: partKind,
                material: partMaterial!,
                sizeMm: partSize ?? null,
                marking: partMarking ?? null,
              },
            ],
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
  const { order, parts, worn, needed, today, clientKey } = loaderData
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
          <input type="hidden" name="clientKey" value={value('clientKey', clientKey)} />
          <div className="grid gap-5 sm:grid-cols-2">
            <DateField
              label="Done on"
              name="doneOn"
              max={today}
              defaultValue={value('doneOn', today)}
              error={errors.doneOn}
            />
            <Field
              label="Minutes on the wall"
              name="minutes"
              inputMode="numeric"
              defaultValue={value('minutes')}
              error={errors.minutes}
            />
          </div>
          <h2 className="text-1 font-semibold">What was fitted</h2>
          <PartFields typed={typed} errors={errors} preset={needed ?? undefined} none="nothing fitted" />
          <Select
            label="In the place of"
            name="replaces"
            defaultValue={value('replaces', worn)}
            options={[
              { value: '', label: 'nothing, it is new' },
              ...parts.map(part => ({ value: part.id, label: part.words })),
            ]}
            error={errors.replaces}
          />
          <Field
            label="Stamped on it"
            hint="If you can read it, for example EN 959"
            name="partMarking"
            defaultValue={value('partMarking')}
            error={errors.partMarking}
          />
          <TextArea
            label="In your words"
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
            label="No photo? Say why"
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
