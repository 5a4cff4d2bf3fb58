import { Link } from 'react-router'
import type { Below } from '../anchor'
import { conditionShort } from '../condition-state'
import type { DrawnPoint } from '../drawn-point'
import { type Layout, type LineScale, layouts, spreadLabels, toY } from '../line-layout'
import { LinePoint } from './line-point'
import { Ground, LineScene, toZoneWords, type Zone, ZoneSentences, Zones } from './line-scene'

interface Props {
  lengthM: number
  points: DrawnPoint[]
  zones: Zone[]
  ledges: { atM: number }[]
  ground: Below
  selected?: string
  href(code: string): string
}

/**
 * A pitch as a line to scale: its fixed points where they are with what they are and when they were last seen, the
 * stretches from which a fall reaches the ground, ledges and what is below. Every point leads to its own part of the
 * page.
 */
export function Line(props: Props) {
  const assumed = props.points.some(point => point.assumed)
  return (
    <figure>
      <DrawnLine {...props} assumed={assumed} layout={layouts.page} />
      <DrawnLine {...props} assumed={assumed} layout={layouts.phone} />
      <figcaption className="mt-1 text-s text-stone">
        {(['hatched', 'anyway'] as const).map(
          kind =>
            props.zones.some(zone => zone.kind === kind) && (
              <p key={kind} className="sm:hidden">
                {`${kind === 'hatched' ? 'Hatched' : 'Dotted'}: ${toZoneWords(kind, props.ledges.length > 0)}.`}
              </p>
            ),
        )}
        {assumed && <p>Grey: nobody has measured the spacing here; it is assumed.</p>}
      </figcaption>
    </figure>
  )
}

function DrawnLine(props: Props & { assumed: boolean; layout: Layout }) {
  const { lengthM, points, zones, ledges, selected, assumed, layout } = props
  const { width, centre, rock, gap } = layout
  const wanted = Math.max(lengthM * layout.metre, points.length * layout.point)
  const height = Math.max(360, Math.min(1200, 60 + wanted))
  const scale: LineScale = { lengthM, base: height - 40, perMetre: (height - 76) / Math.max(lengthM, 1) }
  const labels = spreadLabels(
    points.map(point => toY(scale, point.alongM)),
    { gap, top: 20, bottom: scale.base - 14 },
  )
  return (
    <>
      {/* biome-ignore lint/a11y/useSemanticElements: an SVG has no element for a group of links */}
      <svg
        viewBox={`0 0 ${width} ${height}`}
        className={`h-auto w-full max-w-[580px] ${layout.className}`}
        role="group"
        aria-label="The line of the route"
      >
        <LineScene scale={scale} centre={centre} rock={rock} assumed={assumed} id={layout.id} />
        <Zones zones={zones} scale={scale} centre={centre} rock={rock} id={layout.id} />
        {layout.id === 'page' && (
          <ZoneSentences
            zones={zones}
            scale={scale}
            centre={centre}
            rock={rock}
            labels={labels}
            ledges={ledges.length > 0}
          />
        )}
        <path
          d={`M${centre} ${toY(scale, 0)}V${toY(scale, lengthM)}`}
          stroke={assumed ? 'var(--stone)' : 'var(--slate)'}
          strokeWidth={2.5}
        />
        {ledges.map(ledge => (
          <Ledge key={ledge.atM} atM={ledge.atM} y={toY(scale, ledge.atM)} layout={layout} />
        ))}
        <Ground ground={props.ground} scale={scale} from={centre - rock / 2 - 20} to={width - 4} />
        {points.map((point, index) => (
          <Link
            key={point.code}
            to={props.href(point.code)}
            preventScrollReset
            className="line-point"
            aria-label={`${point.name}, ${point.alongM} m, ${conditionShort[point.state]}, ${point.what}`}
            aria-current={point.code === selected ? 'true' : undefined}
          >
            <LinePoint
              point={point}
              y={toY(scale, point.alongM)}
              label={labels[index]!}
              selected={point.code === selected}
              layout={layout}
            />
          </Link>
        ))}
      </svg>
    </>
  )
}

function Ledge({ atM, y, layout }: { atM: number; y: number; layout: Layout }) {
  const { centre, rock } = layout
  return (
    <g>
      <path d={`M${centre - rock / 2 - 6} ${y}h${rock + 24}`} stroke="var(--slate)" strokeWidth={3} />
      <text x={centre + rock / 2 + 24} y={y - 5} fontSize={13} fill="var(--stone)">
        {`ledge at ${atM} m`}
      </text>
    </g>
  )
}
