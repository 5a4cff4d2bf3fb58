import { Form, redirect, useNavigation } from 'react-router'
import { requirePerson } from '~/people/guards.server'
import { editPerson } from '~/people/people.server'
import { roleWords } from '~/people/role'
import { listSessions } from '~/people/sessions.server'
import { AccountForm } from '~/people/sign-in.schema'
import { signOutEverywhere } from '~/people/sign-in.server'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { Button } from '~/ui/button'
import { Field } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'
import { Page } from '~/ui/page'
import { formatMoment } from '~/ui/when'
import { clockContext, databaseContext } from '~/web/context'
import { sessionCookie, toClearCookie } from '~/web/cookies'
import { parseForm, readForm } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { type FormAnswer, invalid } from '~/web/responses'
import type { Route } from './+types/account'

export const meta: Route.MetaFunction = () => [
  { title: 'Your account · Cragfettle' },
  { name: 'description', content: 'Your name, your roles, and where you are signed in.' },
]

export async function loader({ request, context }: Route.LoaderArgs) {
  const viewer = requirePerson(context.get(viewerContext), request)
  const now = context.get(clockContext)()
  const sessions = await listSessions(context.get(databaseContext), viewer.person.id, now)
  return {
    saved: new URL(request.url).searchParams.has('saved'),
    person: viewer.person,
    memberships: viewer.memberships,
    sessions: sessions.map(({ tokenHash, seenAt, createdAt }) => ({
      here: tokenHash === viewer.sessionHash,
      seenAt,
      createdAt,
    })),
  }
}

export async function action({ request, context }: Route.ActionArgs) {
  const { person } = requirePerson(context.get(viewerContext), request)
  const act = toAct(context.get(clockContext)(), { kind: 'person', personId: person.id })
  const db = context.get(databaseContext)
  const form = await readForm(request)
  if (form.get('intent') === 'sign-out-everywhere') {
    return await keepTyped({ intent: 'sign-out-everywhere' }, async () => {
      await signOutEverywhere(db, act, person.id)
      throw redirect('/', { headers: { 'Set-Cookie': toClearCookie(sessionCookie) } })
    })
  }
  const parsed = parseForm(AccountForm, form)
  if (!parsed.ok) return invalid(parsed)
  return await keepTyped(parsed.typed, async () => {
    await editPerson(db, act, person.id, parsed.value)
    throw redirect('/account?saved')
  })
}

export default function Account({ loaderData, actionData }: Route.ComponentProps) {
  const { saved, person, memberships, sessions } = loaderData
  return (
    <Page title="Your account" lead={person.email}>
      <FormErrors errors={actionData?.errors ?? {}} reason={actionData?.reason} labels={{ name: 'Name' }} />
      {saved && actionData === undefined && (
        <p role="status" className="mt-4">
          Your account is saved.
        </p>
      )}
      <AboutYou person={person} answer={actionData} />
      {memberships.length > 0 && <Roles memberships={memberships} />}
      <SignedIn sessions={sessions} />
    </Page>
  )
}

type Loaded = Route.ComponentProps['loaderData']

function AboutYou({ person, answer }: { person: Loaded['person']; answer: FormAnswer | undefined }) {
  const pending = useNavigation().formData?.get('intent') === 'save'
  const typed = answer?.typed ?? {}
  const kept = 'name' in typed
  return (
    <Form method="post" noValidate className="mt-6 grid max-w-md gap-4">
      <Field
        label="Name"
        name="name"
        autoComplete="name"
        hint="Coordinators and the people you work with see it, for example Mara Quill. The public record never does."
        defaultValue={typeof typed.name === 'string' ? typed.name : person.name}
        error={answer?.errors.name}
      />
      <label className="choice">
        <input type="checkbox" name="over18" defaultChecked={kept ? 'over18' in typed : person.over18} />
        <span>I am 18 or older. Only then are you offered work on fixed gear.</span>
      </label>
      <Button name="intent" value="save" pending={pending} className="justify-self-start">
        Save
      </Button>
    </Form>
  )
}

function Roles({ memberships }: { memberships: Loaded['memberships'] }) {
  return (
    <section className="mt-10">
      <h2 className="text-1 font-semibold">Your roles</h2>
      <ul className="mt-2 border-b border-rule">
        {memberships.map(({ organisationId, organisationName, roles }) => (
          <li key={organisationId} className="border-t border-rule py-2">
            {`${organisationName}: ${roles.map(role => roleWords[role]).join(', ') || 'member'}`}
          </li>
        ))}
      </ul>
    </section>
  )
}

function SignedIn({ sessions }: { sessions: Loaded['sessions'] }) {
  const pending = useNavigation().formData?.get('intent') === 'sign-out-everywhere'
  return (
    <section className="mt-10">
      <h2 className="text-1 font-semibold">Where you are signed in</h2>
      <p className="mt-1 text-stone">
        Times are UTC. You stay signed in for 90 days after you were last here.
      </p>
      <ul className="mt-2 border-b border-rule">
        {sessions.map(({ here, seenAt, createdAt }) => (
          <li key={createdAt.getTime()} className="border-t border-rule py-2">
            {here ? 'This browser' : 'Another browser'}
            <span className="text-stone">{`, last seen ${formatTime(seenAt)}, since ${formatTime(createdAt)}`}</span>
          </li>
        ))}
      </ul>
      <div className="mt-4 flex flex-wrap gap-3">
        <Form method="post" noValidate action="/sign-out">
          <Button kind="quiet">Sign out of this browser</Button>
        </Form>
        <Form method="post" noValidate>
          <Button kind="quiet" name="intent" value="sign-out-everywhere" pending={pending}>
            Sign out everywhere
          </Button>
        </Form>
      </div>
    </section>
  )
}

const formatTime = (moment: Date) => formatMoment(moment, 'UTC')
