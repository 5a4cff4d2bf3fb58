import type { Move } from '~/lib/moves'
import type { Action } from '~/people/permission'

export const reportStates = [
  'received',
  'needs_detail',
  'taken_in',
  'on_record',
  'declined',
  'withdrawn',
] as const
export type ReportState = (typeof reportStates)[number]

export const reportStateWords: Record<ReportState, string> = {
  received: 'received',
  needs_detail: 'needs detail',
  taken_in: 'taken in',
  on_record: 'on record',
  declined: 'declined',
  withdrawn: 'withdrawn',
}

export const reportMoves: readonly Move<ReportState, Action>[] = [
  { from: 'received', to: 'taken_in', may: 'report:decide' },
  { from: 'received', to: 'on_record', may: 'report:decide' },
  { from: 'received', to: 'needs_detail', may: 'report:decide', needs: 'a question' },
  { from: 'received', to: 'declined', may: 'report:decide', needs: 'a reason' },
  { from: 'needs_detail', to: 'received', may: 'report:own', needs: 'an answer' },
  { from: 'needs_detail', to: 'taken_in', may: 'report:decide' },
  { from: 'needs_detail', to: 'on_record', may: 'report:decide' },
  { from: 'needs_detail', to: 'declined', may: 'report:decide', needs: 'a reason' },
  { from: 'received', to: 'withdrawn', may: 'report:own' },
  { from: 'needs_detail', to: 'withdrawn', may: 'report:own' },
]

/** How a thing was seen, nearest first. */
export const howSeen = ['on_it', 'on_the_rope', 'from_the_ground', 'told', 'photo'] as const
export type HowSeen = (typeof howSeen)[number]

export const howSeenWords: Record<HowSeen, string> = {
  on_it: 'on it',
  on_the_rope: 'on the rope',
  from_the_ground: 'from the ground',
  told: 'told',
  photo: 'from a photo',
}
