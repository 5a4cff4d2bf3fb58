import { Form, redirect, useNavigation } from 'react-router'
import { requireCan, requirePerson } from '~/people/guards.server'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { PhotoStrip } from '~/reports/components/photo-strip'
import { listPhotos } from '~/reports/photos.server'
import { Button } from '~/ui/button'
import { Choices } from '~/ui/choice'
import { TextArea } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'
import { Page } from '~/ui/page'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { parseForm, readForm, toTyped } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { invalid, refuse } from '~/web/responses'
import { checkWork } from '~/work/check.server'
import { WorkCaution } from '~/work/components/work-caution'
import { requireOrderOf } from '~/work/guards.server'
import { checkerKinds, checkMethods } from '~/work/order'
import { findRecord, listRecorders } from '~/work/order-details.server'
import { checkerWords, checkMethodWords } from '~/work/words'
import { checkSchema } from '~/work/work.schema'
import type { Route } from './+types/$code.check'

export const meta: Route.MetaFunction = () => [{ title: 'Check the work · Cragfettle' }]

async function requireWork({
  request,
  params,
  context,
}: Pick<Route.LoaderArgs, 'request' | 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const viewer = requirePerson(context.get(viewerContext), request)
  const { order, subject } = await requireOrderOf(db, viewer, params.code)
  requireCan(viewer, 'check:make', subject, { seen: true })
  return { db, viewer, order }
}

export async function loader(args: Route.LoaderArgs) {
  const { db, viewer, order } = await requireWork(args)
  const record = await findRecord(db, order.id)
  return {
    order: { code: order.code, title: order.title, state: order.state },
    own: (await listRecorders(db, order.id)).includes(viewer.person.id),
    words: record?.words ?? null,
    photos: record === null ? [] : await listPhotos(db, { workRecordIds: [record.id] }),
  }
}

export async function action(args: Route.ActionArgs) {
  const form = await readForm(args.request)
  const typed = toTyped(form)
  return await keepTyped(typed, async () => {
    const { db, viewer, order } = await requireWork(args)
    const parsed = parseForm(checkSchema, form)
    if (!parsed.ok) return invalid(parsed)
    const { words, ...check } = parsed.value
    const done = await checkWork(db, {
      orderId: order.id,
      ...check,
      words: words ?? null,
      who: viewer.person.name,
      act: toAct(args.context.get(clockContext)(), {
        kind: 'person',
        personId: viewer.person.id,
        organisationId: order.organisationId,
      }),
      appUrl: args.context.get(settingsContext).appUrl,
    })
    if (!done.ok) return refuse(done.reason, typed)
    args.context.get(wakeContext)()
    throw redirect(`/orders/${order.code}`)
  })
}

const options = <T extends string>(values: readonly T[], words: Record<T, string>) =>
  values.map(value => ({ value, label: words[value] }))

export default function CheckWork({ loaderData, actionData }: Route.ComponentProps) {
  const { order, own, words, photos } = loaderData
  const busy = useNavigation().state === 'submitting'
  const errors = actionData?.errors ?? {}
  const typed = actionData?.typed ?? {}
  const chosen = (name: string) => [typed[name] ?? []].flat()
  const closed = own || order.state !== 'done'
  return (
    <Page
      title="Check the work"
      lead={order.title}
      crumbs={[
        { label: 'Work', to: '/orders' },
        { label: order.title, to: `/orders/${order.code}` },
      ]}
    >
      <PhotoStrip photos={photos.map(photo => ({ ...photo, credit: null }))} label="The work" />
      {words && <p className="mt-4 max-w-[62ch]">{`“${words}”`}</p>}
      {closed ? (
        <p className="mt-5 max-w-[62ch]">
          {own
            ? 'You did this work, so somebody else checks it: your partner of the day, or somebody independent.'
            : 'Nothing waits for a check here now.'}
        </p>
      ) : (
        <Form method="post" noValidate className="mt-5 grid max-w-[62ch] gap-6">
          <FormErrors errors={errors} reason={actionData?.reason} />
          <Choices
            legend="Who are you to the work?"
            type="radio"
            name="whoKind"
            options={options(checkerKinds, checkerWords)}
            chosen={chosen('whoKind')}
            error={errors.whoKind}
          />
          <Choices
            legend="How did you check?"
            type="radio"
            name="how"
            options={options(checkMethods, checkMethodWords)}
            chosen={chosen('how')}
            error={errors.how}
          />
          <Choices
            legend="What did you find?"
            type="radio"
            name="outcome"
            options={[
              { value: 'good', label: 'In order', hint: 'no fault seen' },
              { value: 'returned', label: 'To be done again', hint: 'say what, below' },
            ]}
            chosen={chosen('outcome')}
            error={errors.outcome}
          />
          <TextArea
            label="In your words"
            name="words"
            rows={3}
            defaultValue={String(typed.words ?? '')}
            error={errors.words}
          />
          <WorkCaution />
          <p>
            <Button kind="action" pending={busy}>
              Record check
            </Button>
          </p>
        </Form>
      )}
    </Page>
  )
}
