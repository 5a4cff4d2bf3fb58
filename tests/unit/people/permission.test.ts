import { expect, test } from 'vitest'
import { type Action, actions } from '~/people/permission'
import type { Remit, Role } from '~/people/role'
import type { Sensitivity } from '~/people/sensitivity'
import { can, canFind, type Subject, stranger, type Viewer } from '~/people/viewer'

/**
 * The table "Who may" of the product, written out by hand. At a crag each organisation stands in one of five ways:
 * R leads rebolting, r helps with it, A leads access, a helps with it, - looks after other crags only. A cell lists
 * where somebody with the role may; `all` is everybody, `own` whoever it belongs to.
 */
const matrix: Record<Action, Partial<Record<'everybody' | Role, string>>> = {
  'record:see': { everybody: 'all' },
  'report:send': { everybody: 'all' },
  'report:own': { everybody: 'own' },
  'account:see': { everybody: 'signed in' },
  'offer:answer': { everybody: 'own' },
  'report:decide': { coordinator: 'Rr' },
  'reporter:see': { coordinator: 'RA', access_officer: 'RA' },
  'photo:full': { coordinator: 'Rr' },
  'urgency:see': { coordinator: 'RrAa', access_officer: 'RrAa' },
  'hazard:manage': { coordinator: 'Rr' },
  'warning:publish': { coordinator: 'RrAa', access_officer: 'RrAa' },
  'warning:withdraw': { coordinator: 'RrAa', access_officer: 'RrAa' },
  'notice:manage': { access_officer: 'Aa' },
  'order:see': { rebolter: 'Rr', coordinator: 'Rr' },
  'order:manage': { coordinator: 'Rr' },
  'work:record': { rebolter: 'Rr', coordinator: 'Rr' },
  'check:make': { rebolter: 'Rr', coordinator: 'Rr' },
}

const standings: Record<string, { remit: Remit; lead: boolean } | null> = {
  R: { remit: 'rebolting', lead: true },
  r: { remit: 'rebolting', lead: false },
  A: { remit: 'access', lead: true },
  a: { remit: 'access', lead: false },
  '-': null,
}
const person = { id: 'me', name: 'Mara Quill', email: 'mara@example.org', over18: true }

function member(...roles: Role[]): Viewer {
  return { person, memberships: [{ organisationId: 'mine', organisationName: 'Mine', roles }] }
}

function crag(standing: string, sensitive: Sensitivity = 'open'): Subject & { crag: object } {
  const held = standings[standing]
  const others = [
    { organisationId: 'other', remit: 'rebolting' as const, lead: !(standing === 'R') },
    { organisationId: 'other', remit: 'access' as const, lead: !(standing === 'A') },
  ]
  return {
    crag: { sensitive, organisations: held ? [{ organisationId: 'mine', ...held }, ...others] : others },
  }
}

const whos = ['guest', 'climber', 'rebolter', 'coordinator', 'access_officer', 'admin'] as const
type Who = (typeof whos)[number]

function toViewer(who: Who): Viewer {
  if (who === 'guest') return stranger
  return who === 'climber' ? { person, memberships: [] } : member(who)
}

function expected(action: Action, who: Who, standing: string, own: boolean): boolean {
  const { everybody, ...byRole } = matrix[action]
  if (everybody === 'all') return true
  if (everybody === 'signed in') return who !== 'guest'
  if (everybody === 'own') return who !== 'guest' && own
  return (byRole[who as Role] ?? '').includes(standing)
}

const cells = actions.flatMap(action =>
  whos.flatMap(who => Object.keys(standings).map(standing => [action, who, standing] as const)),
)

test.each(cells)(
  '%s by a %s of an organisation standing %s is as the product says',
  (action, who, standing) => {
    for (const own of [true, false]) {
      const subject = { ...crag(standing), ownerId: own ? 'me' : 'somebody' }
      expect(can(toViewer(who), action, subject)).toBe(expected(action, who, standing, own))
    }
  },
)

test('every action has its row in the matrix', () => {
  expect(Object.keys(matrix).sort()).toEqual([...actions].sort())
})

test('roles of two organisations do not add up: the role must be held where the remit is', () => {
  const viewer: Viewer = {
    person,
    memberships: [
      { organisationId: 'mine', organisationName: 'Mine', roles: ['rebolter'] },
      { organisationId: 'elsewhere', organisationName: 'Elsewhere', roles: ['coordinator'] },
    ],
  }
  expect(can(viewer, 'report:decide', crag('R'))).toBe(false)
  expect(can(viewer, 'check:make', crag('R'))).toBe(true)
})

test('without a crag the question is whether there is any where the viewer may', () => {
  expect(can(member('coordinator'), 'report:decide')).toBe(true)
  expect(can(member('rebolter'), 'report:decide')).toBe(false)
})

test.each(['withheld', 'members'] as const)(
  'a crag that is %s is there for members of its organisations only',
  sensitive => {
    for (const role of ['rebolter', 'coordinator', 'access_officer', 'admin'] as const) {
      expect(canFind(member(role), crag('a', sensitive).crag as never)).toBe(true)
      expect(can(member(role), 'record:see', crag('-', sensitive))).toBe(false)
    }
    for (const action of ['record:see', 'report:send'] as const) {
      expect(can(stranger, action, crag('R', sensitive))).toBe(false)
      expect(can({ person, memberships: [] }, action, crag('R', sensitive))).toBe(false)
      expect(can(member('rebolter'), action, crag('R', sensitive))).toBe(true)
    }
  },
)
