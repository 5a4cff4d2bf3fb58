import { type ConditionState, conditionStates, worstState } from '~/crags/condition-state'
import { addMonths } from '~/lib/dates'
import { type ConditionFinding, toCondition } from './condition'
import type { HowSeen } from './report'

/** One uncleared finding of a check or of a report taken in or put on record. */
export interface StandingFinding extends ConditionFinding {
  isCheck: boolean
  seenOn: string
  howSeen: HowSeen
}

export interface AnchorState {
  state: ConditionState
  stateOn: string | null
  stateHow: HowSeen | null
  /** when "no fault seen" is too old to be said; null for every other state */
  lapsesOn: string | null
}

const monthsUntilLapse = { inland: 24, seaCliff: 12 }

interface Judged {
  state: ConditionState
  seenOn: string
  howSeen: HowSeen
}

/** The worst of the faults, the newest of equals; a climber's "no fault" is not one and improves nothing. */
function findWorstFault(standing: StandingFinding[]): Judged | null {
  const faults = standing
    .filter(finding => finding.kind !== 'no_fault')
    .map(finding => ({ state: toCondition(finding), seenOn: finding.seenOn, howSeen: finding.howSeen }))
    .filter(fault => fault.state !== 'good' && fault.state !== 'unknown')
  const worst = worstState(faults.map(fault => fault.state))
  return newest(faults.filter(fault => fault.state === worst))
}

function newest<T extends { seenOn: string }>(list: T[]): T | null {
  return list.reduce<T | null>(
    (best, next) => (best === null || next.seenOn > best.seenOn ? next : best),
    null,
  )
}

/**
 * A fixed point's condition from its standing findings: the worst fault; without one, what the newest trained check
 * said, until that lapses. Where hidden cracking is possible nothing seen makes it better than "not looked at".
 */
export function toAnchorState(
  standing: StandingFinding[],
  place: { hiddenCracking: boolean; seaCliff: boolean; today: string },
): AnchorState {
  const check = newest(standing.filter(finding => finding.isCheck && finding.kind === 'no_fault'))
  const lapsesOn =
    check === null
      ? null
      : addMonths(check.seenOn, place.seaCliff ? monthsUntilLapse.seaCliff : monthsUntilLapse.inland)
  const fresh = check !== null && lapsesOn! > place.today
  const fault = findWorstFault(standing)
  if (fault !== null && (!place.hiddenCracking || isWorseThanUnknown(fault.state)))
    return { state: fault.state, stateOn: fault.seenOn, stateHow: fault.howSeen, lapsesOn: null }
  if (fresh && fault === null && !place.hiddenCracking)
    return { state: 'good', stateOn: check.seenOn, stateHow: check.howSeen, lapsesOn }
  const last = newest(standing)
  return { state: 'unknown', stateOn: last?.seenOn ?? null, stateHow: last?.howSeen ?? null, lapsesOn: null }
}

/** Suspect or not to be relied on: what hidden cracking does not hide. */
function isWorseThanUnknown(state: ConditionState): boolean {
  return conditionStates.indexOf(state) < conditionStates.indexOf('fair')
}
