import { Form, redirect, useNavigation } from 'react-router'
import { askForCode } from '~/people/code-asking.server'
import { toReturnPath, toReturnQuery } from '~/people/return-path'
import { AskForm } from '~/people/sign-in.schema'
import { viewerContext } from '~/people/viewer-context'
import { hashSecret, toAct } from '~/record/acts.server'
import { Button } from '~/ui/button'
import { Field } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'
import { Page } from '~/ui/page'
import { clockContext, databaseContext, settingsContext, wakeContext } from '~/web/context'
import { findCookie, guestCookie, toSetCookie } from '~/web/cookies'
import { parseForm, readForm } from '~/web/forms.server'
import { keepTyped } from '~/web/keep-typed.server'
import { networkContext } from '~/web/network'
import { invalid, tooMany } from '~/web/responses'
import type { Route } from './+types/index'

export const meta: Route.MetaFunction = () => [
  { title: 'Sign in · Cragfettle' },
  { name: 'description', content: 'Sign in with a code sent by mail. There is no password.' },
]

export function loader({ request, context }: Route.LoaderArgs) {
  const to = new URL(request.url).searchParams.get('to')
  if (context.get(viewerContext).person !== null) throw redirect(toReturnPath(to))
  return null
}

export async function action({ request, context }: Route.ActionArgs) {
  const parsed = parseForm(AskForm, await readForm(request))
  if (!parsed.ok) return invalid(parsed)
  const act = toAct(context.get(clockContext)(), { kind: 'guest', personId: null })
  const browser = findCookie(request.headers.get('cookie'), guestCookie) ?? act.newSecret()
  const asked = {
    email: parsed.value.email,
    browserHash: hashSecret(browser),
    network: context.get(networkContext),
  }
  return await keepTyped(parsed.typed, async () => {
    const answer = await askForCode(context.get(databaseContext), act, asked, context.get(settingsContext))
    if (!answer.ok) return tooMany(answer.reason, 60, parsed.typed)
    context.get(wakeContext)()
    const query = toReturnQuery(new URL(request.url).searchParams.get('to'))
    throw redirect(`/sign-in/code${query}`, { headers: { 'Set-Cookie': toSetCookie(guestCookie, browser) } })
  })
}

const labels = { email: 'E-mail address' }

export default function SignIn({ actionData }: Route.ComponentProps) {
  const pending = useNavigation().formMethod !== undefined
  return (
    <Page title="Sign in" lead="We send a code of eight digits to your e-mail address. There is no password.">
      <FormErrors errors={actionData?.errors ?? {}} reason={actionData?.reason} labels={labels} />
      <Form method="post" noValidate className="mt-6 grid max-w-md gap-4">
        <Field
          label={labels.email}
          name="email"
          type="email"
          autoComplete="email"
          hint="For example mara@example.org"
          defaultValue={toText(actionData?.typed.email)}
          error={actionData?.errors.email}
        />
        <Button pending={pending} className="justify-self-start">
          Send the code
        </Button>
      </Form>
      <h2 className="mt-8 text-1 font-semibold">New here?</h2>
      <p className="mt-2 max-w-prose">
        It is the same: the first code you type opens an account for your address. Anybody who climbs may have
        one. Of those who report, name and address are seen only by the coordinators and access officers that
        lead at the crag.
      </p>
      <p className="mt-2 max-w-prose">You can report fixed gear and read the record without an account.</p>
    </Page>
  )
}

const toText = (typed: string | string[] | undefined) => (typeof typed === 'string' ? typed : undefined)
