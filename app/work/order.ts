import { findMove, type Move } from '~/lib/moves'
import type { Action } from '~/people/permission'

export const orderStates = ['draft', 'offered', 'accepted', 'done', 'checked', 'closed', 'cancelled'] as const
export type OrderState = (typeof orderStates)[number]

export const orderStateWords: Record<OrderState, string> = {
  draft: 'draft',
  offered: 'offered',
  accepted: 'accepted',
  done: 'done, check due',
  checked: 'checked',
  closed: 'closed',
  cancelled: 'cancelled',
}

export const orderMoves: readonly Move<OrderState, Action>[] = [
  { from: 'draft', to: 'offered', may: 'order:manage', needs: 'somebody to offer it to' },
  { from: 'offered', to: 'accepted', may: 'offer:answer' },
  { from: 'offered', to: 'draft', may: 'system', needs: 'no live offer left' },
  { from: 'accepted', to: 'draft', may: 'work:record', needs: 'a word why' },
  {
    from: 'accepted',
    to: 'done',
    may: 'work:record',
    needs: 'what was fitted, and a photo or a reason for none',
  },
  { from: 'done', to: 'checked', may: 'check:make', needs: 'somebody who did not do it' },
  { from: 'done', to: 'accepted', may: 'check:make', needs: 'what is to be done again' },
  { from: 'checked', to: 'closed', may: 'order:manage' },
  { from: 'draft', to: 'cancelled', may: 'order:manage' },
  { from: 'offered', to: 'cancelled', may: 'order:manage' },
  { from: 'accepted', to: 'cancelled', may: 'order:manage' },
]

/** Whether a person, by what they may do there, can move an order so; what happens by itself nobody can. */
export function canMoveOrder(from: OrderState, to: OrderState, may: (action: Action) => boolean): boolean {
  const move = findMove(orderMoves, from, to)
  return move !== null && move.may !== 'system' && may(move.may)
}

/** Orders in these states are under way: their hazard needs no other. */
export const liveStates = [
  'draft',
  'offered',
  'accepted',
  'done',
  'checked',
] as const satisfies readonly OrderState[]

export const offerStates = ['sent', 'accepted', 'declined', 'expired', 'withdrawn'] as const
export type OfferState = (typeof offerStates)[number]

/** Who checked: the day's partner or somebody independent. */
export const checkerKinds = ['partner', 'independent'] as const
export type CheckerKind = (typeof checkerKinds)[number]

export const checkMethods = ['on_the_rope', 'from_photos', 'load_test'] as const
export type CheckMethod = (typeof checkMethods)[number]
