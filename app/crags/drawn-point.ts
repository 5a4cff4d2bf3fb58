import type { ConditionState } from './condition-state'

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
