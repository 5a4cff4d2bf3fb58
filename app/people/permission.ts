import type { Remit, Role } from './role'

/** Everything somebody may or may not do. One row each; guards, buttons and the matrix test read it. */
export const actions = [
  'record:see',
  'report:send',
  'report:own',
  'report:decide',
  'reporter:see',
  'photo:full',
  'urgency:see',
  'hazard:manage',
  'warning:publish',
  'warning:withdraw',
  'notice:manage',
  'order:see',
  'order:manage',
  'offer:answer',
  'work:record',
  'check:make',
  'account:see',
] as const
export type Action = (typeof actions)[number]

/**
 * Who may: `anyone`, a signed-in `person`, whose `own` it is, or a role in an organisation whose remit at the crag
 * covers it (`leadOnly`: that has the lead there).
 */
export type Rule =
  | { to: 'anyone' }
  | { to: 'person' }
  | { to: 'own' }
  | { to: 'roles'; roles: readonly Role[]; remit: Remit | 'any'; leadOnly?: true }

export const rules: Record<Action, Rule> = {
  'record:see': { to: 'anyone' },
  'report:send': { to: 'anyone' },
  'report:own': { to: 'own' },
  'account:see': { to: 'person' },
  'offer:answer': { to: 'own' },
  'report:decide': { to: 'roles', roles: ['coordinator'], remit: 'rebolting' },
  'reporter:see': { to: 'roles', roles: ['coordinator', 'access_officer'], remit: 'any', leadOnly: true },
  'photo:full': { to: 'roles', roles: ['coordinator'], remit: 'rebolting' },
  'urgency:see': { to: 'roles', roles: ['coordinator', 'access_officer'], remit: 'any' },
  'hazard:manage': { to: 'roles', roles: ['coordinator'], remit: 'rebolting' },
  'warning:publish': { to: 'roles', roles: ['coordinator', 'access_officer'], remit: 'any' },
  'warning:withdraw': { to: 'roles', roles: ['coordinator', 'access_officer'], remit: 'any' },
  'notice:manage': { to: 'roles', roles: ['access_officer'], remit: 'access' },
  'order:see': { to: 'roles', roles: ['rebolter', 'coordinator'], remit: 'rebolting' },
  'order:manage': { to: 'roles', roles: ['coordinator'], remit: 'rebolting' },
  'work:record': { to: 'roles', roles: ['rebolter', 'coordinator'], remit: 'rebolting' },
  'check:make': { to: 'roles', roles: ['rebolter', 'coordinator'], remit: 'rebolting' },
}
