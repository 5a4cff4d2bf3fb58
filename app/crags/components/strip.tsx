import { type ConditionState, conditionShort } from '../condition-state'
import { MarkAt } from './condition-mark'

interface StripPoint {
  /** share of the way up, 0 to 1 */
  along: number
  state: ConditionState
  current?: boolean
}

const width = 158

/** The line of a route lying down, small, for tables: every fixed point where it is, the one in question ticked. */
export function Strip({ points }: { points: StripPoint[] }) {
  const faults = points.filter(point => point.state === 'severe' || point.state === 'poor')
  const words = faults.map(point => conditionShort[point.state].toLowerCase()).join(', ')
  const label = `${points.length} fixed points${words ? `: ${words}` : ''}`
  return (
    <svg
      width={width}
      height={20}
      viewBox={`0 0 ${width} 20`}
      role="img"
      aria-label={label}
      className="block"
    >
      <path d="M4 10H148" stroke="var(--stone)" />
      {points.map((point, index) => {
        const x = 8 + Math.min(1, Math.max(0, point.along)) * 140
        return (
          // biome-ignore lint/suspicious/noArrayIndexKey: points have no name here and never change places
          <g key={index}>
            <circle cx={x} cy={10} r={6.5} fill="var(--chalk)" />
            <MarkAt state={point.state} x={x} y={10} size={12} />
            {point.current && <path d={`M${x - 5} 19.5h10`} stroke="var(--slate)" strokeWidth={1.5} />}
          </g>
        )
      })}
    </svg>
  )
}
