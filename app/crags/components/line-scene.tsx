import type { Below } from '../anchor'
import { type LineScale, toY } from '../line-layout'

interface Place {
  scale: LineScale
  centre: number
  rock: number
}

/** The rock behind a line, and its scale: a tick each metre, a figure each five. */
export function LineScene({ scale, centre, rock, assumed, id }: Place & { assumed: boolean; id: string }) {
  const left = centre - rock / 2
  const right = centre + rock / 2
  const top = toY(scale, scale.lengthM)
  const axis = left - 20
  const metres = Array.from({ length: Math.floor(scale.lengthM) + 1 }, (_, metre) => metre)
  const lastFigure = Math.floor(scale.lengthM / 5) * 5
  return (
    <>
      <defs>
        <pattern
          id={`hatch-${id}`}
          width="7"
          height="7"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0v7" stroke="var(--oxide)" strokeWidth="1.5" />
        </pattern>
        <pattern id={`anyway-${id}`} width="6" height="6" patternUnits="userSpaceOnUse">
          <circle cx="3" cy="3" r="1" fill="var(--oxide)" />
        </pattern>
      </defs>
      <path
        d={`M${left} ${scale.base}L${left + 2} ${top - 14}Q${centre - 4} ${top - 25} ${right - 2} ${top - 16}L${right} ${scale.base}Z`}
        fill="var(--rock)"
      />
      <path d={`M${axis} ${scale.base}V${top}`} stroke="var(--stone)" />
      {metres.map(metre => (
        <g key={metre}>
          <path d={`M${axis} ${toY(scale, metre)}h-${metre % 5 ? 4 : 10}`} stroke="var(--stone)" />
          {metre % 5 === 0 && (
            <text
              x={axis - 14}
              y={toY(scale, metre) + 4.5}
              textAnchor="end"
              fontSize={13}
              fill="var(--stone)"
            >
              {metre === lastFigure ? `${metre} m` : metre}
            </text>
          )}
        </g>
      ))}
      {assumed && <path d={`M${axis} ${scale.base}V${top}`} stroke="var(--chalk)" strokeDasharray="3 3" />}
    </>
  )
}

/** What is below, under the foot of the line. */
export function Ground(props: { ground: Below; scale: LineScale; from: number; to: number }) {
  const { ground, scale, from, to } = props
  const words = { ground: '', ledge: 'ledge', stance: 'stance', sea: 'sea', air: 'free hanging' }[ground]
  return (
    <>
      <path
        d={`M${from} ${scale.base}H${to}`}
        stroke="var(--slate)"
        strokeWidth={1.5}
        strokeDasharray={ground === 'air' ? '2 6' : ground === 'sea' ? '10 4' : undefined}
      />
      {words && (
        <text x={to} y={scale.base + 17} textAnchor="end" fontSize={13} fill="var(--stone)">
          {words}
        </text>
      )}
    </>
  )
}

export interface Zone {
  fromM: number
  toM: number
  kind: 'hatched' | 'anyway'
}

/** What each kind of stretch means, said in place or below the drawing. */
export function toZoneWords(kind: Zone['kind'], ledges: boolean): string {
  const hard = ledges ? 'the ground or a ledge' : 'the ground'
  return kind === 'hatched'
    ? `a fall from here reaches ${hard} if the bolt below fails`
    : `reaches ${hard} anyway`
}

const fills = { hatched: 'hatch', anyway: 'anyway' }

/** The stretches from which a fall reaches the ground. */
export function Zones({ zones, scale, centre, rock, id }: Place & { zones: Zone[]; id: string }) {
  return zones.map(zone => (
    <rect
      key={`${zone.kind}${zone.fromM}`}
      x={centre - rock / 2}
      y={toY(scale, zone.toM)}
      width={rock}
      height={(zone.toM - zone.fromM) * scale.perMetre}
      fill={`url(#${fills[zone.kind]}-${id})`}
    />
  ))
}

/** Each kind of stretch said once, in a gap between the labels that is its own; what finds no gap is left to the caption. */
export function ZoneSentences(props: Place & { zones: Zone[]; labels: number[]; ledges: boolean }) {
  const { zones, scale, centre, rock, labels } = props
  const taken: number[] = []
  return (['hatched', 'anyway'] as const).map(kind => {
    const zone = zones.find(one => one.kind === kind)
    if (zone === undefined) return null
    const y = findGap((toY(scale, zone.fromM) + toY(scale, zone.toM)) / 2, labels, scale, taken)
    if (y === null) return null
    taken.push(y)
    return (
      <text
        key={kind}
        x={centre + rock / 2 + 24}
        y={y + 4.5}
        fontSize={13}
        fontWeight={kind === 'hatched' ? 500 : 400}
        fill={kind === 'hatched' ? 'var(--oxide)' : 'var(--stone)'}
      >
        {toZoneWords(kind, props.ledges)}
      </text>
    )
  })
}

/** The middle of the nearest gap between labels that is wide enough and not taken, or null. */
function findGap(wanted: number, labels: number[], scale: LineScale, taken: number[]): number | null {
  const edges = [scale.base + 8, ...labels, 0]
  const gaps = edges.slice(1).flatMap((upper, index) => {
    const lower = edges[index]!
    const middle = (lower + upper) / 2
    return lower - upper >= 36 && !taken.includes(middle) ? [middle] : []
  })
  if (gaps.length === 0) return null
  return gaps.reduce((best, gap) => (Math.abs(gap - wanted) < Math.abs(best - wanted) ? gap : best))
}
