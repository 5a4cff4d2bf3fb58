import type { NoticeState } from './notice'

/** What decides whether a notice holds. */
export interface Held {
  state: NoticeState
  startsAt: Date
  endsAt: Date | null
  /** it also stands while one of its hazards is open */
  whileOpen: boolean
  /** one of its hazards is open or warned of */
  hazardOpen: boolean
}

/** A notice's standing at a moment: `ahead` has not begun, `over` has reached its end without being withdrawn. */
export type Force = 'draft' | 'ahead' | 'in_force' | 'over' | 'withdrawn'

/** How a notice stands at a moment; its end is no longer within it. `isInForceAt` says the same to the database. */
export function toForce(notice: Held, now: Date): Force {
  if (notice.state !== 'published') return notice.state
  if (notice.startsAt > now) return 'ahead'
  const ended = notice.endsAt !== null && notice.endsAt <= now
  return ended && !(notice.whileOpen && notice.hazardOpen) ? 'over' : 'in_force'
}

/** Whether a notice is in force at a moment. */
export function isInForce(notice: Held, now: Date): boolean {
  return toForce(notice, now) === 'in_force'
}
