/** The four element states of bridge inspection and unknown, worst first, as stored and ordered everywhere. */
export const conditionStates = ['severe', 'poor', 'fair', 'unknown', 'good'] as const
export type ConditionState = (typeof conditionStates)[number]

/** What people read for each state. Condition never shares a word with urgency or consequence. */
export const conditionWords: Record<ConditionState, string> = {
  severe: 'Do not rely on it',
  poor: 'Suspect: look before you trust it',
  fair: 'Minor only',
  unknown: 'Not looked at',
  good: 'No fault seen',
}

/** The same in a table's width. */
export const conditionShort: Record<ConditionState, string> = { ...conditionWords, poor: 'Suspect' }

/** The worst of the given states; `unknown` when there is none. */
export function worstState(states: Iterable<ConditionState>): ConditionState {
  let worst: number = conditionStates.length
  for (const state of states) worst = Math.min(worst, conditionStates.indexOf(state))
  return conditionStates[worst] ?? 'unknown'
}
