import { type ConditionState, conditionShort } from '../condition-state'

const width = 96
const drawn: [ConditionState, string][] = [
  ['severe', 'var(--oxide)'],
  ['poor', 'var(--ochre-mark)'],
  ['fair', 'var(--slate)'],
  ['good', 'var(--rule)'],
]

/** All conditions of a crag in a thin strip, worst first; those not looked at are only a hairline. */
export function ConditionsBar({ counts }: { counts: Record<ConditionState, number> }) {
  const all = Object.values(counts).reduce((sum, count) => sum + count, 0)
  if (all === 0) return null
  let x = 0
  const parts = drawn
    .filter(([state]) => counts[state] > 0)
    .map(([state, fill]) => {
      const wide = Math.max(2, (width * counts[state]) / all - 1)
      const part = <rect key={state} x={x} width={wide} height={4} fill={fill} />
      x += wide + 1
      return part
    })
  const words = drawn
    .map(([state]) => state)
    .concat('unknown')
    .filter(state => counts[state] > 0)
    .map(state => `${counts[state]} ${conditionShort[state].toLowerCase()}`)
  return (
    <svg
      width={width}
      height={4}
      viewBox={`0 0 ${width} 4`}
      role="img"
      aria-label={words.join(', ')}
      className="block"
    >
      {parts}
      {counts.unknown > 0 && (
        <rect x={x} y={1.5} width={Math.max(4, width - x)} height={1} fill="var(--stone)" />
      )}
    </svg>
  )
}
