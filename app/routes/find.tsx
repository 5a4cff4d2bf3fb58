import { Form, Link, redirect } from 'react-router'
import { findAnchor } from '~/crags/anchors.server'
import { ConditionMark } from '~/crags/components/condition-mark'
import { listCrags } from '~/crags/crags.server'
import { searchPlaces } from '~/crags/search.server'
import { parseCode, toSlug } from '~/lib/code'
import { viewerContext } from '~/people/viewer-context'
import { Button } from '~/ui/button'
import { Field } from '~/ui/field'
import { Page } from '~/ui/page'
import { databaseContext } from '~/web/context'
import type { Route } from './+types/find'

export const meta: Route.MetaFunction = () => [
  { title: 'Find · Cragfettle' },
  { name: 'description', content: 'Find a crag or route by name, or a fixed point by its tag code.' },
]

export async function loader({ request, context }: Route.LoaderArgs) {
  const db = context.get(databaseContext)
  const viewer = context.get(viewerContext)
  const asked = (new URL(request.url).searchParams.get('q') ?? '').trim().slice(0, 100)
  const code = parseCode(asked)
  const point = code === null ? null : await findAnchor(db, viewer, code)
  if (point !== null) throw redirect(`/points/${point.code}`)
  const plain = asked.toLocaleLowerCase()
  const crags =
    asked === ''
      ? []
      : (await listCrags(db, viewer)).filter(
          crag => crag.name.toLocaleLowerCase().includes(plain) || crag.code === code,
        )
  return {
    asked,
    crags: crags.map(({ name, code, areaName, worstState }) => ({ name, code, areaName, worstState })),
    climbs: asked === '' ? [] : await searchPlaces(db, viewer, { words: asked }),
  }
}

export default function Find({ loaderData }: Route.ComponentProps) {
  const { asked, crags, climbs } = loaderData
  const none = asked !== '' && crags.length === 0 && climbs.length === 0
  return (
    <Page title="Find" lead={asked === '' ? 'A crag, a route, or the code on a tag' : `“${asked}”`}>
      <Form method="get" className="mt-5 flex max-w-xl items-end gap-3">
        <div className="grow">
          <Field
            label="Crag, route or tag code"
            name="q"
            defaultValue={asked}
            hint="For example Slack Water, or KC-7FQ2X"
          />
        </div>
        <Button kind="action">Look up</Button>
      </Form>
      {none && (
        <p className="mt-5 text-stone">
          Nothing is known by that name or code. Try part of the name, or the code without the dash.
        </p>
      )}
      <ul className="mt-5 max-w-xl border-b border-rule">
        {crags.map(crag => (
          <Found
            key={crag.code}
            state={crag.worstState}
            to={`/crags/${toSlug(crag.name, crag.code)}`}
            name={crag.name}
            where={crag.areaName}
          />
        ))}
        {climbs.map(climb => (
          <Found
            key={climb.code}
            state={climb.state}
            to={`/climbs/${toSlug(climb.name, climb.code)}`}
            name={climb.name}
            where={climb.where}
          />
        ))}
      </ul>
    </Page>
  )
}

function Found(props: {
  state: Parameters<typeof ConditionMark>[0]['state']
  to: string
  name: string
  where: string
}) {
  return (
    <li className="border-t border-rule">
      <Link to={props.to} className="flex min-h-12 items-center gap-3 text-slate no-underline">
        <ConditionMark state={props.state} size={16} decorative />
        <span className="font-medium">{props.name}</span>
        <span className="text-s text-stone">{props.where}</span>
      </Link>
    </li>
  )
}
