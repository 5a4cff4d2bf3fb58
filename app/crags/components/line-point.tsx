import type { ConditionState } from '../condition-state'
import type { DrawnPoint } from '../drawn-point'
import type { Layout } from '../line-layout'
import { MarkAt } from './condition-mark'

const weights: Record<ConditionState, number> = { severe: 600, poor: 600, fair: 500, unknown: 500, good: 400 }

interface PlacedPoint {
  point: DrawnPoint
  y: number
  label: number
  selected: boolean
  layout: Layout
}

/** One fixed point of the line: its mark, its leader, and its words by the size of the drawing. */
export function LinePoint({ point, y, label, selected, layout }: PlacedPoint) {
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
