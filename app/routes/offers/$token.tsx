import { data, Form, Link, useNavigation } from 'react-router'
import { findConsent } from '~/crags/crags.server'
import { toAct } from '~/record/acts.server'
import { Button } from '~/ui/button'
import { TextArea } from '~/ui/field'
import { Page } from '~/ui/page'
import { formatMoment, formatZone } from '~/ui/when'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { parseForm, readForm, toTyped } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { notFound } from '~/web/responses'
import { acceptOffer, declineOffer, findOffered } from '~/work/answer.server'
import { JobFacts } from '~/work/components/job-facts'
import { WorkCaution } from '~/work/components/work-caution'
import { maybeWordsSchema } from '~/work/order.schema'
import { listNeededParts } from '~/work/order-details.server'
import { findOrderById } from '~/work/orders.server'
import { answeredWords } from '~/work/words'
import type { Route } from './+types/$token'

export const meta: Route.MetaFunction = () => [
  { title: 'A job for you · Cragfettle' },
  { name: 'robots', content: 'noindex' },
]

async function requireOffer({ params, context }: Pick<Route.LoaderArgs, 'params' | 'context'>) {
  const db = context.get(databaseContext)
  const now = context.get(clockContext)()
  const offer = await findOffered(db, params.token, now)
  const order = offer === null ? null : await findOrderById(db, offer.orderId)
  if (offer === null || order === null)
    throw notFound('This link opens no offer. Use the whole link from the mail.')
  return { db, offer, order, now }
}

export async function loader({ params, context }: Route.LoaderArgs) {
  const { db, offer, order } = await requireOffer({ params, context })
  const { cragName, approach, aimOn, what, consentReason, hazards, title, organisation, timeZone } = order
  const gone = ['declined', 'expired', 'withdrawn'].includes(offer.state)
  const shown = {
    name: offer.name,
    state: offer.state,
    expiresAt: offer.expiresAt,
    closedWords: offer.state === 'sent' ? null : answeredWords[offer.state],
    job: {
      cragName,
      approach,
      aimOn,
      what,
      consentReason,
      title,
      organisation,
      timeZone,
      hazards: hazards.map(({ code, headline, position, climbName, alongM }) => ({
        code,
        headline,
        position,
        climbName,
        alongM,
      })),
    },
    needed: await listNeededParts(db, order.id),
    consent: (await findConsent(db, order.cragId))?.conditions ?? null,
  }
  // 410: there was an offer here, and it is over for good
  return data(shown, { status: gone ? 410 : 200 })
}

interface Answered {
  accepted: boolean
  sheetUrl: string | null
  reason: string | null
  errors: Record<string, string>
  words: string
}

const answered = (body: Partial<Answered>, status = 200) =>
  data<Answered>(
    { accepted: false, sheetUrl: null, reason: null, errors: {}, words: '', ...body },
    { status },
  )

export async function action({ request, params, context }: Route.ActionArgs) {
  const form = await readForm(request)
  const typed = toTyped(form)
  return await keepTyped(typed, async () => {
    const { db, offer, now } = await requireOffer({ params, context })
    const { appUrl } = context.get(settingsContext)
    const given = {
      secret: params.token,
      act: toAct(now, { kind: 'link', personId: offer.personId }),
      appUrl,
    }
    if (form.get('do') === 'accept') {
      const done = await acceptOffer(db, given)
      context.get(wakeContext)()
      return done.ok
        ? answered({ accepted: true, sheetUrl: `/sheet/${done.sheetSecret}` })
        : answered({ reason: done.reason }, 409)
    }
    const parsed = parseForm(maybeWordsSchema, form)
    if (!parsed.ok) return answered({ errors: parsed.errors, words: String(typed.words ?? '') }, 400)
    const done = await declineOffer(db, { ...given, words: parsed.value.words ?? null })
    context.get(wakeContext)()
    return done.ok ? answered({}) : answered({ reason: done.reason }, 409)
  })
}

/** An offer as the mail's link opens it: signed in as nobody, it may only be accepted or declined. */
export default function Offer({ loaderData, actionData }: Route.ComponentProps) {
  const { name, state, expiresAt, closedWords, job, needed, consent } = loaderData
  const busy = useNavigation().state === 'submitting'
  return (
    <Page title={job.title} lead={`${job.organisation} asks ${name}`}>
      {actionData?.accepted && actionData.sheetUrl && (
        <p role="status" className="mt-5 border-t-2 border-verdigris bg-verdigris-wash px-4 py-3">
          Thank you, {name}. The job is yours. <Link to={actionData.sheetUrl}>Open the job sheet</Link>; it
          came by mail too.
        </p>
      )}
      {!actionData?.accepted && (actionData?.reason ?? closedWords) && (
        <p role="status" className="mt-5 border-t-2 border-ochre bg-ochre-wash px-4 py-3">
          {actionData?.reason ?? closedWords}
        </p>
      )}
      <JobFacts job={job} needed={needed} consent={consent} />
      <WorkCaution />
      {state === 'sent' && (
        <>
          <p className="mt-5 text-s text-stone">
            {`You answer as ${name}. Until ${formatMoment(expiresAt, job.timeZone)}, ${formatZone(job.timeZone)}.`}
          </p>
          <Form method="post" noValidate className="mt-3">
            <Button kind="action" name="do" value="accept" pending={busy}>
              Accept job
            </Button>
          </Form>
          <Form method="post" noValidate className="mt-8 max-w-[40rem] border-t border-rule pt-4">
            <TextArea
              label="Cannot do it? A word, if you like"
              name="words"
              rows={2}
              defaultValue={actionData?.words}
              error={actionData?.errors.words}
            />
            <p className="mt-3">
              <Button kind="quiet" name="do" value="decline" pending={busy}>
                Decline job
              </Button>
            </p>
          </Form>
        </>
      )}
    </Page>
  )
}
