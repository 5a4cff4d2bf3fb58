import type { Move } from '~/lib/moves'
import type { Action } from '~/people/permission'

export const hazardStates = [
  'open',
  'warned',
  'mended',
  'cleared',
  'joined',
  'not_confirmed',
  'retired',
] as const
export type HazardState = (typeof hazardStates)[number]

export const hazardStateWords: Record<HazardState, string> = {
  open: 'open',
  warned: 'warned',
  mended: 'mended, check due',
  cleared: 'cleared',
  joined: 'joined to another',
  not_confirmed: 'not confirmed by check',
  retired: 'retired with its route',
}

/** Hazards in these states stand in the dangerous list. */
export const dangerousStates = ['open', 'warned'] as const satisfies readonly HazardState[]

export const hazardMoves: readonly Move<HazardState, Action>[] = [
  { from: 'open', to: 'warned', may: 'warning:publish', needs: 'a notice in force' },
  { from: 'warned', to: 'open', may: 'system', needs: 'its notice ended' },
  { from: 'open', to: 'mended', may: 'system', needs: 'work done' },
  { from: 'warned', to: 'mended', may: 'system', needs: 'work done' },
  { from: 'mended', to: 'cleared', may: 'order:manage', needs: 'work checked' },
  { from: 'mended', to: 'open', may: 'system', needs: 'work returned or done in part' },
  { from: 'cleared', to: 'open', may: 'hazard:manage', needs: 'a reason' },
]

/** How a hazard fails, which joins reports of the same problem. */
export const failureModes = ['pulls_out', 'breaks', 'cuts_rope', 'releases_rope'] as const
export type FailureMode = (typeof failureModes)[number]
