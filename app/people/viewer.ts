import { type Action, type Rule, rules } from './permission'
import type { Remit, Role } from './role'
import type { Sensitivity } from './sensitivity'

export interface Membership {
  organisationId: string
  organisationName: string
  roles: Role[]
}

/** Who looks: nobody known (`person` null) or a person with the roles held now. */
export interface Viewer {
  person: { id: string; name: string; email: string; over18: boolean } | null
  memberships: Membership[]
  /** nobody is known because the database cannot be asked: guards answer that, not that nobody is signed in */
  away?: true
}

export const stranger: Viewer = { person: null, memberships: [] }

/** What permission asks about: the organisations that look after the crag, or whose own thing it is. */
export interface Subject {
  /** organisations with a remit at the crag; left out: is there any crag where the viewer may? */
  crag?: { sensitive: Sensitivity; organisations: { organisationId: string; remit: Remit; lead: boolean }[] }
  ownerId?: string | null
}

type Crag = NonNullable<Subject['crag']>

/** Whether a crag is there at all for the viewer: places withheld and members-only crags only for its organisations. */
export function canFind(viewer: Viewer, crag: Crag): boolean {
  return crag.sensitive === 'open' || viewer.memberships.some(membership => looksAfter(membership, crag))
}

function looksAfter({ organisationId }: Membership, crag: Crag): boolean {
  return crag.organisations.some(held => held.organisationId === organisationId)
}

/** Whether the viewer may do the action to the subject, by the one table of permission. */
export function can(viewer: Viewer, action: Action, subject: Subject = {}): boolean {
  const rule = rules[action]
  const { crag, ownerId } = subject
  if (rule.to === 'anyone') return crag === undefined || canFind(viewer, crag)
  if (viewer.person === null) return false
  if (rule.to === 'person') return true
  if (rule.to === 'own') return ownerId === viewer.person.id
  return viewer.memberships.some(
    membership =>
      membership.roles.some(role => rule.roles.includes(role)) &&
      (crag === undefined || isCovered(membership, crag, rule)),
  )
}

function isCovered(
  { organisationId }: Membership,
  crag: Crag,
  rule: Extract<Rule, { to: 'roles' }>,
): boolean {
  return crag.organisations.some(
    held =>
      held.organisationId === organisationId &&
      (rule.remit === 'any' || held.remit === rule.remit) &&
      (!rule.leadOnly || held.lead),
  )
}
