import { useEffect, useMemo, useState } from 'react'
import { Link } from 'react-router'
import { ConditionMark } from '~/crags/components/condition-mark'
import { ConditionsBar } from '~/crags/components/conditions-bar'
import { conditionStates } from '~/crags/condition-state'
import { listCrags } from '~/crags/crags.server'
import { formatOpen, formatWorst } from '~/crags/place-words'
import { toSlug } from '~/lib/code'
import { MapStage } from '~/map/components/map-stage'
import { viewerContext } from '~/people/viewer-context'
import { databaseContext } from '~/web/context'
import type { Route } from './+types/home'
import './home.css'

export const meta: Route.MetaFunction = () => [
  { title: 'Cragfettle: the working record of fixed gear' },
  {
    name: 'description',
    content:
      'Which bolts and lower-offs are worn, loose or sharp, what is being done about it, and how to report more.',
  },
]

export async function loader({ context }: Route.LoaderArgs) {
  const crags = await listCrags(context.get(databaseContext), context.get(viewerContext))
  return {
    crags: crags.map(({ id: _, ...crag }) => crag),
    points: crags.reduce((sum, crag) => sum + sumCounts(crag.counts), 0),
    hazards: crags.reduce((sum, crag) => sum + crag.openHazards, 0),
    notices: crags.reduce((sum, crag) => sum + crag.notices, 0),
  }
}

const sumCounts = (counts: Record<string, number>) =>
  Object.values(counts).reduce((sum, count) => sum + count, 0)

type ListedCrag = Route.ComponentProps['loaderData']['crags'][number]

/** Map and list side by side are one selection; without JavaScript or WebGL the list is the page. */
export default function Home({ loaderData }: Route.ComponentProps) {
  const { crags, points, hazards, notices } = loaderData
  const [selected, select] = useState<string | null>(null)
  const [hovered, hover] = useState<string | null>(null)
  useScrollTo(selected)
  const mapped = useMemo(() => crags.map(toMapped), [crags])
  const [height, setHeight] = useState<'map' | 'both' | 'list'>('both')
  return (
    <main className="home" data-height={height}>
      <div className="home-map">
        <MapStage crags={mapped} selected={selected} hovered={hovered} onSelect={select} onHover={hover} />
      </div>
      <div className="home-list">
        <Heights height={height} onChange={setHeight} count={crags.length} />
        <header className="home-head">
          <h1 className="text-2 font-semibold">{toTitle(crags)}</h1>
          <p className="text-s text-stone">{`${crags.length} crags, ${points.toLocaleString('en')} fixed points`}</p>
          <p className="home-open text-stone">{`${hazards} open hazards, ${notices} notices in force`}</p>
        </header>
        {crags.length === 0 && (
          <p className="py-6 text-stone">
            No crag is on record yet. Crags stand here once an organisation that looks after them has put them
            in.
          </p>
        )}
        <ul>
          {crags.map(crag => (
            <CragRow
              key={crag.code}
              crag={crag}
              selected={selected === crag.code || hovered === crag.code}
              onHover={hover}
            />
          ))}
        </ul>
      </div>
    </main>
  )
}

/** Brings the row of a crag chosen on the map into view. */
function useScrollTo(code: string | null): void {
  useEffect(() => {
    if (code !== null) document.getElementById(`crag-${code}`)?.scrollIntoView({ block: 'nearest' })
  }, [code])
}

const toMapped = ({ code, name, pos, worstState }: ListedCrag) => ({ code, name, ...pos, state: worstState })

/** The area all crags lie in, or the region around their areas. */
function toTitle(crags: ListedCrag[]): string {
  const areas = new Set(crags.map(crag => crag.areaName))
  const regions = new Set(crags.map(crag => crag.regionName))
  if (areas.size === 1) return [...areas][0]!
  return (regions.size === 1 && [...regions][0]) || 'All crags'
}

const heights = [
  ['map', 'Map'],
  ['both', 'Both'],
  ['list', 'List'],
] as const

/** On a phone: how much of the sheet is map, and how much list. */
function Heights(props: { height: string; onChange(height: 'map' | 'both' | 'list'): void; count: number }) {
  return (
    <div className="home-heights">
      {heights.map(([height, words]) => (
        <button
          key={height}
          type="button"
          aria-pressed={props.height === height}
          onClick={() => props.onChange(height)}
        >
          {words}
        </button>
      ))}
      <span className="ml-auto text-s text-stone">{props.count} crags</span>
    </div>
  )
}

const tones = {
  severe: 'text-oxide font-semibold',
  poor: 'text-ochre font-semibold',
  fair: 'font-medium',
  unknown: 'text-stone',
  good: 'text-stone',
}

function CragRow({
  crag,
  selected,
  onHover,
}: {
  crag: ListedCrag
  selected: boolean
  onHover(code: string | null): void
}) {
  const present = conditionStates.filter(state => crag.counts[state] > 0)
  return (
    <li
      id={`crag-${crag.code}`}
      className="crag-row"
      data-selected={selected || undefined}
      onMouseEnter={() => onHover(crag.code)}
      onMouseLeave={() => onHover(null)}
    >
      <Link
        to={`/crags/${toSlug(crag.name, crag.code)}`}
        onFocus={() => onHover(crag.code)}
        onBlur={() => onHover(null)}
      >
        <span className="crag-mark">
          <ConditionMark state={crag.worstState} size={16} decorative={present.length > 0} />
        </span>
        <span className="crag-name font-medium">{crag.name}</span>
        <span className={`crag-worst ${tones[crag.worstState]}`}>{formatWorst(crag.counts)}</span>
        <span className="crag-open text-s text-stone">{formatOpen(crag)}</span>
        <span className="crag-routes text-s text-stone">{`${crag.climbs} routes`}</span>
        <span className="crag-bar">
          <ConditionsBar counts={crag.counts} />
        </span>
      </Link>
    </li>
  )
}
