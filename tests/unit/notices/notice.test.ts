import { describe, expect, it } from 'vitest'
import { canWithdraw, findPublisher } from '~/notices/notice'
import type { Role } from '~/people/role'
import { stranger, type Viewer } from '~/people/viewer'

const crag = {
  crag: {
    sensitive: 'open',
    organisations: [
      { organisationId: 'crew', remit: 'rebolting', lead: true },
      { organisationId: 'forum', remit: 'access', lead: true },
    ],
  },
} as const satisfies Parameters<typeof canWithdraw>[2]

const member = (...memberships: [organisationId: string, ...roles: Role[]][]): Viewer => ({
  person: { id: 'me', name: 'Me', email: 'me@crew.example', over18: true },
  memberships: memberships.map(([organisationId, ...roles]) => ({
    organisationId,
    organisationName: organisationId,
    roles,
  })),
})
const subject = structuredClone(crag) as Parameters<typeof canWithdraw>[2]

describe('A notice is withdrawn', () => {
  const mine = { kind: 'first_warning', publishedBy: 'me' } as const
  const others = { kind: 'first_warning', publishedBy: 'another' } as const
  const written = { kind: 'hazard', publishedBy: 'me' } as const

  it.each([
    ['by an access officer, whosever it is', member(['forum', 'access_officer']), others, true],
    [
      'by a coordinator, when it is a first warning of their own',
      member(['crew', 'coordinator']),
      mine,
      true,
    ],
    ['by no coordinator when somebody else published it', member(['crew', 'coordinator']), others, false],
    ['by no coordinator when it is no first warning', member(['crew', 'coordinator']), written, false],
    ['by no access officer of elsewhere', member(['elsewhere', 'access_officer']), others, false],
    ['by no rebolter', member(['crew', 'rebolter']), mine, false],
    ['by no stranger', stranger, { kind: 'first_warning', publishedBy: null }, false],
  ] as const)('%s', (_, viewer, notice, may) => {
    expect(canWithdraw(viewer, notice, subject)).toBe(may)
  })
})

describe('A notice is published', () => {
  it('in the name of the organisation with the remit here, not of another one', () => {
    const viewer = member(['elsewhere', 'access_officer'], ['forum', 'access_officer'])
    expect(findPublisher(viewer, 'notice:manage', subject)?.organisationId).toBe('forum')
  })

  it('by nobody whose organisation only mends here', () => {
    expect(findPublisher(member(['crew', 'access_officer']), 'notice:manage', subject)).toBeNull()
    expect(findPublisher(member(['crew', 'coordinator']), 'warning:publish', subject)?.organisationId).toBe(
      'crew',
    )
  })
})
