import { Form, redirect } from 'react-router'
import { findClimb } from '~/crags/climbs.server'
import { LineChooser } from '~/crags/components/line-chooser'
import { formatGearShort } from '~/crags/part-words'
import { parseCode, toSlug } from '~/lib/code'
import { toDay } from '~/lib/dates'
import { viewerContext } from '~/people/viewer-context'
import { ReportCaution } from '~/reports/components/report-caution'
import { toDrawnPoint } from '~/reports/drawn-line'
import '~/reports/reports.css'
import { StepBar } from '~/ui/bar'
import { Button } from '~/ui/button'
import { clockContext, databaseContext } from '~/web/context'
import { notFound } from '~/web/responses'
import type { Route } from './+types/$climb'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Which one? ${loaderData?.climb.name ?? ''} · Cragfettle` },
  { name: 'description', content: 'Choose the bolt or lower-off on the line of the route.' },
]

export async function loader({ params, request, context }: Route.LoaderArgs) {
  const db = context.get(databaseContext)
  const code = parseCode(params.climb)
  const climb =
    code === null
      ? null
      : await findClimb(db, context.get(viewerContext), code, toDay(context.get(clockContext)(), 'UTC'))
  if (climb === null) throw notFound('No route is known by this code. Look it up by name.')
  const search = new URL(request.url).searchParams
  const chosen = parseCode(search.get('point') ?? '')
  if (chosen !== null && climb.points.some(point => point.code === chosen))
    throw redirect(`/report/${climb.code}/${chosen}`)
  return { climb, asked: search.has('asked') }
}

/** Second step: choose on the line. A plain form, so that it works without JavaScript too. */
export default function ReportWhich({ loaderData }: Route.ComponentProps) {
  const { climb, asked } = loaderData
  return (
    <>
      <StepBar
        back={`/climbs/${toSlug(climb.name, climb.code)}`}
        title="Report fixed gear"
        note="not sent yet"
      />
      <main className="report-sheet">
        <p className="text-s text-stone">{`${climb.cragName}, ${climb.name}`}</p>
        <h1 className="text-2 font-semibold">Which one?</h1>
        {asked && (
          <p className="mt-2 text-oxide" role="alert">
            Choose one on the line first, for example the lower-off.
          </p>
        )}
        {climb.points.length === 0 ? (
          <p className="mt-4 text-stone">
            No fixed gear is on record for this route yet, so nothing can be chosen on its line.
          </p>
        ) : (
          <Form method="get">
            <input type="hidden" name="asked" value="1" />
            <LineChooser
              lengthM={climb.lengthM}
              points={climb.points.map(point => toDrawnPoint(point, formatGearShort(point.parts)))}
              ground={climb.points[0]?.below ?? 'ground'}
            />
            <ReportCaution />
            <div className="report-send">
              <Button kind="action">Go on</Button>
            </div>
          </Form>
        )}
      </main>
    </>
  )
}
