import { Link } from 'react-router'
import { ConditionMark } from '~/crags/components/condition-mark'
import { ConditionsBar } from '~/crags/components/conditions-bar'
import { listCrags } from '~/crags/crags.server'
import { formatOpen, formatWorst } from '~/crags/place-words'
import { toSlug } from '~/lib/code'
import { groupBy } from '~/lib/group-by'
import { viewerContext } from '~/people/viewer-context'
import { Page } from '~/ui/page'
import { databaseContext } from '~/web/context'
import type { Route } from './+types/index'

export const meta: Route.MetaFunction = () => [
  { title: 'Crags · Cragfettle' },
  { name: 'description', content: 'All crags on record, by area, with the condition of their fixed gear.' },
]

export async function loader({ context }: Route.LoaderArgs) {
  const crags = await listCrags(context.get(databaseContext), context.get(viewerContext))
  return { areas: [...groupBy(crags, crag => crag.areaName)].map(([name, list]) => ({ name, crags: list })) }
}

export default function Crags({ loaderData }: Route.ComponentProps) {
  return (
    <Page title="Crags" lead="Worst condition first in each area">
      {loaderData.areas.length === 0 && (
        <p className="text-stone">
          No crag is on record yet. Organisations put the crags in that they look after.
        </p>
      )}
      {loaderData.areas.map(area => (
        <section key={area.name} className="mt-8">
          <h2 className="text-2 font-semibold">{area.name}</h2>
          <ul className="mt-3 border-b border-rule">
            {area.crags.map(crag => (
              <li key={crag.code} className="crag-line">
                <ConditionMark state={crag.worstState} size={16} decorative />
                <Link to={`/crags/${toSlug(crag.name, crag.code)}`} className="font-medium">
                  {crag.name}
                </Link>
                <span className={crag.worstState === 'severe' ? 'text-oxide' : 'text-stone'}>
                  {formatWorst(crag.counts)}
                </span>
                <span className="text-stone">{formatOpen(crag)}</span>
                <span className="text-stone">{`${crag.climbs} routes`}</span>
                <ConditionsBar counts={crag.counts} />
              </li>
            ))}
          </ul>
        </section>
      ))}
    </Page>
  )
}
