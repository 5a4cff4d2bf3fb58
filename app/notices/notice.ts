import type { Move } from '~/lib/moves'
import type { Action } from '~/people/permission'
import { can, type Membership, type Subject, type Viewer } from '~/people/viewer'

export const noticeKinds = [
  'first_warning',
  'hazard',
  'works',
  'please_do_not_climb',
  'owner_forbids',
  'closed_in_law',
] as const
export type NoticeKind = (typeof noticeKinds)[number]

/** Kinds an access officer writes; a first warning has words of its own. */
export const writtenKinds = [
  'hazard',
  'works',
  'please_do_not_climb',
  'owner_forbids',
  'closed_in_law',
] as const

export const noticeKindWords: Record<NoticeKind, string> = {
  first_warning: 'First warning',
  hazard: 'Hazard',
  works: 'Works',
  please_do_not_climb: 'Please do not climb (agreed)',
  owner_forbids: 'Owner forbids',
  closed_in_law: 'Closed in law',
}

export const noticeStates = ['draft', 'published', 'withdrawn'] as const
export type NoticeState = (typeof noticeStates)[number]

export const noticeMoves: readonly Move<NoticeState, Action>[] = [
  { from: 'draft', to: 'published', may: 'notice:manage' },
  { from: 'published', to: 'withdrawn', may: 'notice:manage' },
]

/** Who may withdraw a notice: an access officer any, a coordinator a first warning of their own. */
export function canWithdraw(
  viewer: Viewer,
  notice: { kind: NoticeKind; publishedBy: string | null },
  subject: Subject,
): boolean {
  if (can(viewer, 'notice:manage', subject)) return true
  const own = notice.publishedBy !== null && notice.publishedBy === viewer.person?.id
  return notice.kind === 'first_warning' && own && can(viewer, 'warning:withdraw', subject)
}

/** The membership in whose organisation's name the viewer does this at a crag, or null when they may not. */
export function findPublisher(
  viewer: Viewer,
  action: 'warning:publish' | 'notice:manage',
  subject: Subject,
): Membership | null {
  return viewer.memberships.find(one => can({ ...viewer, memberships: [one] }, action, subject)) ?? null
}
