import { Link } from 'react-router'
import type { Below } from '../anchor'
import type { ConditionState } from '../condition-state'
import { conditionShort } from '../condition-state'
import { type LineScale, spreadLabels, toY } from '../line-layout'
import { MarkAt } from './condition-mark'
import { Ground, LineScene, Zones } from './line-scene'

/** A fixed point as the line draws it. */
export interface DrawnPoint {
  code: string
  name: string
  kind: string
  alongM: number
  assumed: boolean
  state: ConditionState
  what: string
  seen: string | null
  open: boolean
}

export interface Zone {
  fromM: number
  toM: number
  kind: 'hatched' | 'anyway'
}

interface Props {
  lengthM: number
  points: DrawnPoint[]
  zones: Zone[]
  ledges: { atM: number }[]
  ground: Below
  selected?: string
  href(code: string): string
}

const width = 580
const centre = 118
const rock = 64

/**
 * A pitch as a line to scale: its fixed points where they are with what they are and when they were last seen, the
 * stretches from which a fall reaches the ground, ledges and what is below. Every point leads to its own part of the
 * page; the same stands as a list for those who hear it.
 */
export function Line(props: Props) {
  const { lengthM, points, zones, ledges, selected } = props
  const height = Math.max(360, Math.min(1100, 60 + Math.max(lengthM * 34, points.length * 46)))
  const scale: LineScale = { lengthM, base: height - 40, perMetre: (height - 76) / Math.max(lengthM, 1) }
  const labels = spreadLabels(
    points.map(point => toY(scale, point.alongM)),
    { gap: 27, top: 20, bottom: scale.base - 14 },
  )
  const assumed = points.some(point => point.assumed)
  return (
    <figure>
      {/* biome-ignore lint/a11y/useSemanticElements: an SVG has no element for a group of links */}
      <svg
        viewBox={`0 0 ${width} ${height}`}
        className="block h-auto w-full max-w-[580px]"
        role="group"
        aria-label="The line of the route"
      >
        <LineScene scale={scale} centre={centre} rock={rock} assumed={assumed} />
        <Zones zones={zones} scale={scale} centre={centre} rock={rock} labels={labels} width={width} />
        <path
          d={`M${centre} ${toY(scale, 0)}V${toY(scale, lengthM)}`}
          stroke={assumed ? 'var(--stone)' : 'var(--slate)'}
          strokeWidth={2.5}
        />
        {ledges.map(ledge => (
          <g key={ledge.atM}>
            <path
              d={`M${centre - rock / 2 - 6} ${toY(scale, ledge.atM)}h${rock + 24}`}
              stroke="var(--slate)"
              strokeWidth={3}
            />
            <text x={centre + rock / 2 + 24} y={toY(scale, ledge.atM) - 5} fontSize={13} fill="var(--stone)">
              {`ledge at ${ledge.atM} m`}
            </text>
          </g>
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
            <Point
              point={point}
              y={toY(scale, point.alongM)}
              label={labels[index]!}
              selected={point.code === selected}
            />
          </Link>
        ))}
      </svg>
      {assumed && (
        <figcaption className="mt-1 text-s text-stone">
          Grey: nobody has measured the spacing here; it is assumed.
        </figcaption>
      )}
    </figure>
  )
}

const weights: Record<ConditionState, number> = { severe: 600, poor: 600, fair: 500, unknown: 500, good: 400 }

function Point({
  point,
  y,
  label,
  selected,
}: {
  point: DrawnPoint
  y: number
  label: number
  selected: boolean
}) {
  const lowerOff = point.kind === 'lower_off'
  const size = lowerOff ? 22 : 18
  const edge = centre + rock / 2
  return (
    <g>
      <rect x={edge + 18} y={label - 13} width={width - edge - 18} height={26} fill="transparent" />
      <circle cx={centre} cy={y} r={size / 2 + 3} fill="var(--chalk)" />
      <MarkAt state={point.state} x={centre} y={y} size={size} />
      {lowerOff && (
        <path d={`M${centre - 10} ${y + size / 2 + 5}h20`} stroke="var(--slate)" strokeWidth={2.5} />
      )}
      <path d={`M${edge + 4} ${y}L${edge + 18} ${label}`} stroke="var(--stone)" opacity={0.5} fill="none" />
      {selected && <Ticks x={centre} y={y} reach={size / 2 + 7} />}
      <text x={edge + 24} y={label + 5} fontSize={15} fontWeight={weights[point.state]} fill="var(--slate)">
        {point.name}
      </text>
      <text x={edge + 108} y={label + 5} fontSize={14} fill="var(--stone)">
        {shorten(point.what, point.seen === null ? 52 : 25)}
      </text>
      {point.seen && (
        <text x={width - 4} y={label + 5} textAnchor="end" fontSize={13} fill="var(--stone)">
          {point.seen}
        </text>
      )}
    </g>
  )
}

/** Words that fit beside the date; the whole stands in the point's own part of the page. */
function shorten(words: string, most: number): string {
  return words.length <= most ? words : `${words.slice(0, most - 1).trimEnd()}…`
}

/** What is chosen: four corner ticks, never a ring. */
function Ticks({ x, y, reach }: { x: number; y: number; reach: number }) {
  const corners = [
    [-1, -1],
    [1, -1],
    [-1, 1],
    [1, 1],
  ] as const
  const arm = 6
  return corners.map(([a, b]) => (
    <path
      key={`${a}${b}`}
      d={`M${x + a * reach} ${y + b * (reach - arm)}V${y + b * reach}H${x + a * (reach - arm)}`}
      fill="none"
      stroke="var(--slate)"
      strokeWidth={2}
    />
  ))
}
