import { Form, redirect, useNavigation } from 'react-router'
import { signOut } from '~/people/sign-in.server'
import { viewerContext } from '~/people/viewer-context'
import { toAct } from '~/record/acts.server'
import { Button } from '~/ui/button'
import { Page } from '~/ui/page'
import { clockContext, databaseContext } from '~/web/context'
import { sessionCookie, toClearCookie } from '~/web/cookies'
import { keepTyped } from '~/web/keep-typed.server'
import type { Route } from './+types/sign-out'

export const meta: Route.MetaFunction = () => [
  { title: 'Sign out · Cragfettle' },
  { name: 'description', content: 'Sign out of this browser.' },
]

export function loader({ context }: Route.LoaderArgs) {
  if (context.get(viewerContext).person === null) throw redirect('/')
  return null
}

export async function action({ context }: Route.ActionArgs) {
  const { person, sessionHash } = context.get(viewerContext)
  return await keepTyped({}, async () => {
    if (person !== null && sessionHash !== null) {
      const act = toAct(context.get(clockContext)(), { kind: 'person', personId: person.id })
      await signOut(context.get(databaseContext), act, { personId: person.id, sessionHash })
    }
    throw redirect('/', { headers: { 'Set-Cookie': toClearCookie(sessionCookie) } })
  })
}

export default function SignOut() {
  const pending = useNavigation().formMethod !== undefined
  return (
    <Page title="Sign out" lead="You can go on reading the record and reporting without signing in.">
      <Form method="post" noValidate className="mt-6">
        <Button pending={pending}>Sign out of this browser</Button>
      </Form>
    </Page>
  )
}
