import type { Below } from '../anchor'
import { type LineScale, toY } from '../line-layout'

interface Place {
  scale: LineScale
  centre: number
  rock: number
}

/** The rock behind a line, and its scale: a tick each metre, a figure each five. */
export function LineScene({ scale, centre, rock, assumed }: Place & { assumed: boolean }) {
  const left = centre - rock / 2
  const right = centre + rock / 2
  const top = toY(scale, scale.lengthM)
  const axis = left - 20
  const metres = Array.from({ length: Math.floor(scale.lengthM) + 1 }, (_, metre) => metre)
  const lastFigure = Math.floor(scale.lengthM / 5) * 5
  return (
    <>
      <defs>
        <pattern id="hatch" width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0v7" stroke="var(--oxide)" strokeWidth="1.5" />
        </pattern>
        <pattern id="anyway" width="6" height="6" patternUnits="userSpaceOnUse">
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

interface Zone {
  fromM: number
  toM: number
  kind: 'hatched' | 'anyway'
}

const sentences = {
  hatched: 'a fall from here reaches the ground if the bolt below fails',
  anyway: 'reaches the ground anyway',
}

/** The stretches from which a fall reaches the ground, each kind said once in a gap between the labels. */
export function Zones(props: Place & { zones: Zone[]; labels: number[]; width: number }) {
  const { zones, scale, centre, rock, labels } = props
  const said = (['hatched', 'anyway'] as const).flatMap(kind => {
    const zone = zones.find(one => one.kind === kind)
    if (zone === undefined) return []
    const y = findGap((toY(scale, zone.fromM) + toY(scale, zone.toM)) / 2, labels, scale)
    return [{ kind, y }]
  })
  return (
    <>
      {zones.map(zone => (
        <rect
          key={`${zone.kind}${zone.fromM}`}
          x={centre - rock / 2}
          y={toY(scale, zone.toM)}
          width={rock}
          height={(zone.toM - zone.fromM) * scale.perMetre}
          fill={zone.kind === 'hatched' ? 'url(#hatch)' : 'url(#anyway)'}
        />
      ))}
      {said.map(({ kind, y }) => (
        <text
          key={kind}
          x={centre + rock / 2 + 24}
          y={y + 4.5}
          fontSize={13}
          fontWeight={kind === 'hatched' ? 500 : 400}
          fill={kind === 'hatched' ? 'var(--oxide)' : 'var(--stone)'}
        >
          {sentences[kind]}
        </text>
      ))}
    </>
  )
}

/** The middle of the gap between labels that lies nearest, at least 24 pixels from either. */
function findGap(wanted: number, labels: number[], scale: LineScale): number {
  const edges = [scale.base + 8, ...labels, 0]
  const gaps = edges.slice(1).flatMap((upper, index) => {
    const lower = edges[index]!
    return lower - upper >= 36 ? [(lower + upper) / 2] : []
  })
  if (gaps.length === 0) return scale.base + 17
  return gaps.reduce((best, gap) => (Math.abs(gap - wanted) < Math.abs(best - wanted) ? gap : best))
}
