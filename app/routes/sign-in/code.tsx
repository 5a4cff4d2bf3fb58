import { Form, Link, redirect, useLocation, useNavigation } from 'react-router'
import { CodeRefused, createAuthenticator } from '~/people/code-strategy.server'
import { findAsked } from '~/people/codes.server'
import { toReturnPath, toReturnQuery } from '~/people/return-path'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { Button } from '~/ui/button'
import { Field } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'
import { Page } from '~/ui/page'
import { clockContext, databaseContext, settingsContext } from '~/web/context'
import { sessionCookie, toSetCookie } from '~/web/cookies'
import { readForm, toTyped } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { log } from '~/web/log.server'
import { invalid } from '~/web/responses'
import type { Route } from './+types/code'

export const meta: Route.MetaFunction = () => [
  { title: 'Type the code · Cragfettle' },
  { name: 'description', content: 'Type the code that came by mail to sign in.' },
]

const findWay = (request: Request) => new URL(request.url).searchParams.get('to')

export async function loader({ request, context }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext)
  const way = findWay(request)
  if (viewer.person !== null) throw redirect(toReturnPath(way))
  const now = context.get(clockContext)()
  const email = viewer.guestHash && (await findAsked(context.get(databaseContext), viewer.guestHash, now))
  return { email, again: `/sign-in${toReturnQuery(way)}` }
}

export async function action({ request, context }: Route.ActionArgs) {
  const act = toAct(context.get(clockContext)(), { kind: 'guest', personId: null })
  const { appSecret } = context.get(settingsContext)
  const authenticator = createAuthenticator({ db: context.get(databaseContext), act, appSecret })
  const typed = toTyped(await readForm(request.clone()))
  return await keepTyped(typed, async () => {
    try {
      const { secret, isNew } = await authenticator.authenticate('code', request)
      const to = toReturnPath(findWay(request), isNew ? '/account' : '/')
      throw redirect(to, { headers: { 'Set-Cookie': toSetCookie(sessionCookie, secret) } })
    } catch (error) {
      if (!(error instanceof CodeRefused)) throw error
      log.info('code refused')
      return invalid({ errors: { code: error.message }, typed })
    }
  })
}

const labels = { code: 'The code from the mail' }

export default function TypeCode({ loaderData, actionData }: Route.ComponentProps) {
  const { email, again } = loaderData
  const pending = useNavigation().formMethod !== undefined
  const { search } = useLocation()
  return (
    <Page title="Type the code" lead={email ? `We sent a code to ${email}.` : undefined}>
      <FormErrors errors={actionData?.errors ?? {}} reason={actionData?.reason} labels={labels} />
      {email === null ? (
        <p className="mt-6">
          No code that still works was asked for in this browser. Codes last ten minutes.{' '}
          <Link to={again}>Ask for a code</Link>
        </p>
      ) : (
        <>
          <Form
            method="post"
            noValidate
            action={`/sign-in/code${search}`}
            className="mt-6 grid max-w-md gap-4"
          >
            <Field
              label={labels.code}
              name="code"
              inputMode="numeric"
              autoComplete="one-time-code"
              hint="Eight digits, for example 4821 9306. It lasts ten minutes."
              defaultValue={typeof actionData?.typed.code === 'string' ? actionData.typed.code : undefined}
              error={actionData?.errors.code}
            />
            <Button pending={pending} className="justify-self-start">
              Sign in
            </Button>
          </Form>
          <p className="mt-6 max-w-prose text-stone">
            No mail after two minutes? Look among the unwanted mail, then{' '}
            <Link to={again}>ask for another code</Link>.
          </p>
        </>
      )}
    </Page>
  )
}
