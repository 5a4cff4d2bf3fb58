import { redirect, useNavigation } from 'react-router'
import { findConsent } from '~/crags/crags.server'
import { formatCode, toSlug } from '~/lib/code'
import { requireCan, requirePerson } from '~/people/guards.server'
import { can } from '~/people/viewer'
import { viewerContext } from '~/people/viewer-context'
import { listActivities } from '~/record/activities.server'
import { toAct } from '~/record/acts.server'
import { formatActivity } from '~/reports/activity-words'
import { toReportLinks } from '~/reports/links.server'
import { listPhotos } from '~/reports/photos.server'
import { Page } from '~/ui/page'
import { Refused } from '~/ui/refused'
import { formatMoment, formatZone } from '~/ui/when'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { parseForm, readForm, toTyped } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { invalid, refuse } from '~/web/responses'
import { closeOrder } from '~/work/close.server'
import { JobFacts } from '~/work/components/job-facts'
import { OfferList } from '~/work/components/offer-list'
import { OrderMoves } from '~/work/components/order-moves'
import { OrderRecord } from '~/work/components/order-record'
import { WorkCaution } from '~/work/components/work-caution'
import { requireOrderOf } from '~/work/guards.server'
import { cancelOrder, handBack } from '~/work/hand-back.server'
import { offerOrder } from '~/work/offer.server'
import { canMoveOrder, type OrderState, orderStateWords } from '~/work/order'
import { offerSchema, wordsSchema } from '~/work/order.schema'
import { findRecord, listNeededParts, listOffers, listRecorders } from '~/work/order-details.server'
import { closeSchema } from '~/work/work.schema'
import { listRebolters } from '~/work/workers.server'
import type { Route } from './+types/$code'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.order.title ?? 'Order'} · Cragfettle` },
]

async function requireOrder({
  request,
  params,
  context,
}: Pick<Route.LoaderArgs, 'request' | 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const viewer = requirePerson(context.get(viewerContext), request)
  return { db, viewer, ...(await requireOrderOf(db, viewer, params.code)) }
}

export async function loader(args: Route.LoaderArgs) {
  const { db, viewer, order, subject } = await requireOrder(args)
  const record = await findRecord(db, order.id)
  const recorders = await listRecorders(db, order.id)
  const mine = order.workerId === viewer.person.id
  const canMove = (to: OrderState) => canMoveOrder(order.state, to, action => can(viewer, action, subject))
  const may = {
    offer: canMove('offered'),
    record: canMove('done') && mine,
    check: canMove('checked') && !recorders.includes(viewer.person.id) && record !== null,
    close: canMove('closed'),
    cancel: canMove('cancelled'),
  }
  return {
    order,
    needed: await listNeededParts(db, order.id),
    consent: (await findConsent(db, order.cragId))?.conditions ?? null,
    offers: await listOffers(db, order.id),
    rebolters: may.offer ? await listRebolters(db, order.organisationId) : [],
    record,
    photos: record === null ? [] : await listPhotos(db, { workRecordIds: [record.id] }),
    history: (await listActivities(db, [order.id], { publicOnly: false })).map(line => ({
      id: line.id,
      at: line.at,
      words: formatActivity(line),
      said: typeof line.details?.words === 'string' ? line.details.words : null,
    })),
    may,
  }
}

export async function action(args: Route.ActionArgs) {
  const form = await readForm(args.request)
  const typed = toTyped(form)
  return await keepTyped(typed, async () => {
    const { db, viewer, order, subject } = await requireOrder(args)
    const { person } = viewer
    const act = toAct(args.context.get(clockContext)(), {
      kind: 'person',
      personId: person.id,
      organisationId: order.organisationId,
    })
    const { appUrl } = args.context.get(settingsContext)
    const orderId = order.id
    const manage = () => requireCan(viewer, 'order:manage', subject, { seen: true })
    const doing = String(form.get('do') ?? '')
    async function doIt() {
      if (doing === 'hand_back') {
        requireCan(viewer, 'work:record', subject, { seen: true })
        const parsed = parseForm(wordsSchema, form)
        return parsed.ok
          ? await handBack(db, { orderId, words: parsed.value.words, who: person.name, act, appUrl })
          : parsed
      }
      manage()
      if (doing === 'cancel') return await cancelOrder(db, { orderId, act })
      if (doing === 'close') {
        const parsed = parseForm(closeSchema, form)
        const links = toReportLinks(args.context.get(settingsContext))
        return parsed.ok
          ? await closeOrder(db, { orderId, act, links, publicPhotoKeys: parsed.value.photo })
          : parsed
      }
      const parsed = parseForm(offerSchema, form)
      return parsed.ok
        ? await offerOrder(db, { orderId, personId: parsed.value.personId, act, appUrl })
        : parsed
    }
    const done = await doIt()
    if (!done.ok) return 'errors' in done ? invalid(done) : refuse(done.reason, typed)
    args.context.get(wakeContext)()
    throw redirect(`/orders/${order.code}`)
  })
}

export default function OrderPage({ loaderData, actionData }: Route.ComponentProps) {
  const { order, needed, consent, offers, rebolters, record, photos, history, may } = loaderData
  const busy = useNavigation().state === 'submitting'
  return (
    <Page
      title={order.title}
      lead={`${formatCode(order.code)}, ${orderStateWords[order.state]}`}
      crumbs={[
        { label: 'Work', to: '/orders' },
        { label: order.cragName, to: `/crags/${toSlug(order.cragName, order.cragCode)}` },
        ...order.hazards.slice(0, 1).map(hazard => ({ label: 'Hazard', to: `/hazards/${hazard.code}` })),
      ]}
    >
      {actionData?.reason && <Refused reason={actionData.reason} />}
      <div className="mt-2 grid gap-x-11 gap-y-8 lg:grid-cols-[1.2fr_1fr]">
        <div>
          <JobFacts job={order} needed={needed} consent={consent} />
          <WorkCaution />
          {record !== null && <OrderRecord record={record} photos={photos} timeZone={order.timeZone} />}
        </div>
        <div>
          <OrderMoves
            code={order.code}
            may={may}
            rebolters={rebolters.map(({ id, name }) => ({ id, name }))}
            photos={photos}
            errors={actionData?.errors ?? {}}
            typed={actionData?.typed ?? {}}
            busy={busy}
          />
          <OfferList offers={offers} timeZone={order.timeZone} />
          <h2 className="mt-8 text-1 font-semibold">History</h2>
          <ul className="mt-2 border-t border-slate">
            {history.map(line => (
              <li key={line.id} className="flex gap-4 border-b border-rule py-2">
                <span className="w-40 shrink-0 text-stone">{formatMoment(line.at, order.timeZone)}</span>
                <span>
                  {line.words}
                  {line.said && <span className="block text-stone">{`“${line.said}”`}</span>}
                </span>
              </li>
            ))}
          </ul>
          <p className="mt-2 text-s text-stone">{`Times are ${formatZone(order.timeZone)}.`}</p>
        </div>
      </div>
    </Page>
  )
}
