import { type ConditionState, conditionWords } from '../condition-state'

/** The shapes on a grid of 16: a ring wearing through. */
function Shape({ state }: { state: ConditionState }) {
  switch (state) {
    case 'good':
      return <circle cx="8" cy="8" r="5.75" fill="none" stroke="var(--slate)" strokeWidth="1.5" />
    case 'fair':
      return (
        <>
          <circle cx="8" cy="8" r="5.75" fill="none" stroke="var(--slate)" strokeWidth="1.5" />
          <path d="M2.5 9.5H13.5A5.75 5.75 0 0 1 2.5 9.5Z" fill="var(--slate)" />
        </>
      )
    case 'poor':
      return (
        <path
          d="M3.9 14.1A7.4 7.4 0 1 1 12.1 14.1L10.6 11V8A2.6 2.6 0 1 0 5.4 8V11Z"
          fill="var(--ochre-mark)"
        />
      )
    case 'severe':
      return (
        <path d="M8.7 2.3A6.6 6.6 0 1 0 4.7 14.9Z M11.3 1.1A6.6 6.6 0 0 1 7.3 13.7Z" fill="var(--oxide)" />
      )
    case 'unknown':
      return (
        <circle
          cx="8"
          cy="8"
          r="5.75"
          fill="none"
          stroke="var(--stone)"
          strokeWidth="1.75"
          strokeDasharray="3.01 3.01"
          strokeDashoffset="1.5"
        />
      )
  }
}

/** A condition's mark, told by its shape and not by colour alone; with its word unless that stands beside it. */
export function ConditionMark(props: { state: ConditionState; size: number; decorative?: boolean }) {
  const { state, size, decorative } = props
  const drawn = { width: size, height: size, viewBox: '0 0 16 16', className: 'inline-block flex-none' }
  if (decorative)
    return (
      <svg {...drawn} aria-hidden="true">
        <Shape state={state} />
      </svg>
    )
  return (
    <svg {...drawn} role="img" aria-label={conditionWords[state]}>
      <Shape state={state} />
    </svg>
  )
}

/** The same within a larger drawing, centred at a place. */
export function MarkAt({ state, x, y, size }: { state: ConditionState; x: number; y: number; size: number }) {
  return (
    <svg x={x - size / 2} y={y - size / 2} width={size} height={size} viewBox="0 0 16 16" aria-hidden="true">
      <Shape state={state} />
    </svg>
  )
}
