import { Link } from 'react-router'
import type { Below } from '../anchor'
import type { ConditionState } from '../condition-state'
import { conditionShort } from '../condition-state'
import { type LineScale, spreadLabels, toY } from '../line-layout'
import { MarkAt } from './condition-mark'
import { Ground, LineScene, toZoneWords, type Zone, ZoneSentences, Zones } from './line-scene'

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

interface Props {
  lengthM: number
  points: DrawnPoint[]
  zones: Zone[]
  ledges: { atM: number }[]
  ground: Below
  selected?: string
  href(code: string): string
}

/** The two sizes of the drawing, in its own pixels: the page's row holds all words, the phone's has them below the name. */
const layouts = {
  page: {
    id: 'page',
    width: 580,
    centre: 118,
    rock: 64,
    gap: 27,
    metre: 34,
    point: 46,
    name: 15,
    className: 'hidden sm:block',
  },
  phone: {
    id: 'phone',
    width: 358,
    centre: 104,
    rock: 44,
    gap: 46,
    metre: 30,
    point: 56,
    name: 16,
    className: 'sm:hidden',
  },
} as const
type Layout = (typeof layouts)[keyof typeof layouts]

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
            <Point
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

const weights: Record<ConditionState, number> = { severe: 600, poor: 600, fair: 500, unknown: 500, good: 400 }

interface PlacedPoint {
  point: DrawnPoint
  y: number
  label: number
  selected: boolean
  layout: Layout
}

function Point({ point, y, label, selected, layout }: PlacedPoint) {
  const { width, centre, rock, gap } = layout
  const lowerOff = point.kind === 'lower_off'
  const size = lowerOff ? 22 : 18
  const edge = centre + rock / 2
  return (
    <g>
      <rect x={edge + 8} y={label - gap / 2} width={width - edge - 8} height={gap} fill="transparent" />
      <circle cx={centre} cy={y} r={size / 2 + 3} fill="var(--chalk)" />
      <MarkAt state={point.state} x={centre} y={y} size={size} />
      {lowerOff && (
        <path d={`M${centre - 10} ${y + size / 2 + 5}h20`} stroke="var(--slate)" strokeWidth={2.5} />
      )}
      <path
        d={
          layout.id === 'phone'
            ? `M${edge + 2} ${y}L${edge + 9} ${label}`
            : `M${edge + 4} ${y}L${edge + 18} ${label}`
        }
        stroke="var(--stone)"
        opacity={0.5}
        fill="none"
      />
      {selected && <Ticks x={centre} y={y} reach={size / 2 + 7} />}
      {layout.id === 'phone' ? (
        <PhoneWords point={point} x={edge + 14} label={label} />
      ) : (
        <PageWords point={point} x={edge + 24} label={label} right={width - 4} />
      )}
    </g>
  )
}

function PageWords({
  point,
  x,
  label,
  right,
}: {
  point: DrawnPoint
  x: number
  label: number
  right: number
}) {
  return (
    <>
      <text x={x} y={label + 5} fontSize={15} fontWeight={weights[point.state]} fill="var(--slate)">
        {point.name}
      </text>
      <text x={x + 84} y={label + 5} fontSize={14} fill="var(--stone)">
        {shorten(point.what, point.seen === null ? 52 : 25)}
      </text>
      {point.seen && (
        <text x={right} y={label + 5} textAnchor="end" fontSize={13} fill="var(--stone)">
          {point.seen}
        </text>
      )}
    </>
  )
}

function PhoneWords({ point, x, label }: { point: DrawnPoint; x: number; label: number }) {
  return (
    <>
      <text x={x} y={label - 2} fontSize={16} fontWeight={weights[point.state]} fill="var(--slate)">
        {point.name}
      </text>
      <text x={x} y={label + 15} fontSize={14} fill="var(--stone)">
        {shorten(point.what, 30)}
      </text>
    </>
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
