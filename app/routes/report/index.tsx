import { Form, Link } from 'react-router'
import { ConditionMark } from '~/crags/components/condition-mark'
import { listCrags } from '~/crags/crags.server'
import { searchPlaces } from '~/crags/search.server'
import { parseCode } from '~/lib/code'
import { viewerContext } from '~/people/viewer-context'
import { ReportCaution } from '~/reports/components/report-caution'
import { Button } from '~/ui/button'
import { Field } from '~/ui/field'
import { Page } from '~/ui/page'
import { databaseContext } from '~/web/context'
import type { Route } from './+types/index'

export const meta: Route.MetaFunction = () => [
  { title: 'Report fixed gear · Cragfettle' },
  { name: 'description', content: 'Tell us about worn, loose or sharp fixed gear. No account is needed.' },
]

export async function loader({ request, context }: Route.LoaderArgs) {
  const db = context.get(databaseContext)
  const viewer = context.get(viewerContext)
  const search = new URL(request.url).searchParams
  const asked = (search.get('q') ?? '').trim().slice(0, 100)
  const crags = await listCrags(db, viewer)
  const cragCode = parseCode(search.get('crag') ?? '')
  const crag = crags.find(one => one.code === cragCode) ?? null
  return {
    asked,
    crag: crag === null ? null : { name: crag.name, code: crag.code },
    crags: crags
      .map(({ name, code, areaName, climbs }) => ({ name, code, areaName, climbs }))
      .sort((a, b) => a.name.localeCompare(b.name)),
    climbs:
      asked !== '' || crag !== null ? await searchPlaces(db, viewer, { words: asked, cragId: crag?.id }) : [],
  }
}

/** First step: which route? By name, by tag code, or crag by crag. */
export default function ReportWhere({ loaderData }: Route.ComponentProps) {
  const { asked, crag, crags, climbs } = loaderData
  return (
    <Page title="Report fixed gear" lead={crag ? crag.name : 'Which route?'}>
      <ReportCaution />
      <Form method="get" className="mt-6 flex max-w-xl items-end gap-3">
        {crag && <input type="hidden" name="crag" value={crag.code} />}
        <div className="grow">
          <Field
            label="Route, crag or tag code"
            name="q"
            defaultValue={asked}
            hint="For example Slack Water, or KC-7FQ2X"
          />
        </div>
        <Button kind="action">Look up</Button>
      </Form>
      {(asked !== '' || crag !== null) && (
        <section className="mt-6 max-w-xl">
          <h2 className="text-1 font-semibold">
            {climbs.length === 0 ? 'No route found' : 'Which of these?'}
          </h2>
          {climbs.length === 0 && (
            <p className="mt-1 text-stone">
              No route is known by that name or code. Try part of the name, or choose the crag below.
            </p>
          )}
          <ul className="mt-2 border-b border-rule">
            {climbs.map(climb => (
              <li key={climb.code} className="border-t border-rule">
                <Link to={climb.to} className="flex min-h-12 items-center gap-3 text-slate no-underline">
                  <ConditionMark state={climb.state} size={16} decorative />
                  <span className="font-medium">{climb.name}</span>
                  <span className="text-s text-stone">{climb.where}</span>
                </Link>
              </li>
            ))}
          </ul>
        </section>
      )}
      {crag === null && (
        <section className="mt-8 max-w-xl">
          <h2 className="text-1 font-semibold">Or choose the crag</h2>
          <ul className="mt-2 border-b border-rule">
            {crags.map(one => (
              <li key={one.code} className="border-t border-rule">
                <Link
                  to={`/report?crag=${one.code}`}
                  className="flex min-h-12 items-center justify-between gap-3 text-slate no-underline"
                >
                  <span className="font-medium">{one.name}</span>
                  <span className="text-s text-stone">{`${one.areaName}, ${one.climbs} routes`}</span>
                </Link>
              </li>
            ))}
          </ul>
        </section>
      )}
    </Page>
  )
}
