import { Form, redirect } from 'react-router'
import { toAct } from '~/record/acts.server'
import { toReportLinks } from '~/reports/links.server'
import { confirmGuest } from '~/reports/send.server'
import { Button } from '~/ui/button'
import { Page } from '~/ui/page'
import { clockContext, databaseContext, settingsContext } from '~/web/context'
import { keepTyped } from '~/web/keep-typed.server'
import { notFound } from '~/web/responses'
import type { Route } from './+types/confirm.$secret'

export const meta: Route.MetaFunction = () => [
  { title: 'Confirm your address · Cragfettle' },
  { name: 'robots', content: 'noindex' },
]

export async function action({ params, context }: Route.ActionArgs) {
  return await keepTyped({}, async () => {
    const act = toAct(context.get(clockContext)(), { kind: 'link', personId: null })
    const confirmed = await confirmGuest(context.get(databaseContext), act, params.secret)
    if (confirmed === null)
      throw notFound(
        'This link has run out or is not whole. Your report itself is not lost; it stays with the coordinators for 30 days.',
      )
    const { toStatusSecret } = toReportLinks(context.get(settingsContext))
    throw redirect(`/status/${toStatusSecret(confirmed.reportId)}`)
  })
}

/** Opening the link changes nothing; the button does. */
export default function Confirm() {
  return (
    <Page title="Confirm your address" lead="So that we can tell you what becomes of your report">
      <Form method="post" noValidate className="mt-5">
        <Button kind="action">Confirm this address</Button>
      </Form>
    </Page>
  )
}
