import { describe, expect, it, test } from 'vitest'
import { consentStates } from '~/crags/crag'
import { findMove } from '~/lib/moves'
import { rules } from '~/people/permission'
import type { Role } from '~/people/role'
import { can, type Viewer } from '~/people/viewer'
import { findConsentFault } from '~/work/consent'
import { liveStates, type OrderState, offerStates, orderMoves, orderStates } from '~/work/order'
import { toOrderSubject } from '~/work/subject'
import { answeredWords } from '~/work/words'

/** Where an order may go, written out by hand from “How things move” of the product. */
const mayGo: Record<OrderState, OrderState[]> = {
  draft: ['offered', 'cancelled'],
  offered: ['accepted', 'draft', 'cancelled'],
  accepted: ['draft', 'done', 'cancelled'],
  done: ['checked', 'accepted'],
  checked: ['closed'],
  closed: [],
  cancelled: [],
}

const pairs = orderStates.flatMap(from => orderStates.map(to => [from, to] as const))

test.each(pairs)('an order that is %s goes to %s only where the product says so', (from, to) => {
  expect(findMove(orderMoves, from, to) !== null).toBe(mayGo[from].includes(to))
})

test('every move of an order is the system’s or asks for an action of the permission table', () => {
  for (const { may } of orderMoves) expect(may === 'system' || may in rules).toBe(true)
})

describe('Consent', () => {
  it.each(consentStates)('%s without a reason stops work only where it is disputed or unknown', state => {
    expect(findConsentFault(state, null) !== null).toBe(state === 'disputed' || state === 'unknown')
  })

  it('unknown is got over by a written reason, a dispute is not', () => {
    expect(findConsentFault('unknown', 'The owner cannot be found.')).toBeNull()
    expect(findConsentFault('disputed', 'The owner cannot be found.')).toMatch(/disputes/)
  })
})

describe('An order of one organisation at a crag that two look after', () => {
  const crag = {
    sensitive: 'open' as const,
    organisations: ['keld', 'harrow'].map(organisationId => ({
      organisationId,
      remit: 'rebolting' as const,
      lead: organisationId === 'keld',
    })),
  }
  const viewer = (held: Record<string, Role[]>): Viewer => ({
    person: { id: 'me', name: 'Mara Quill', email: 'mara@example.org', over18: true },
    memberships: Object.entries(held).map(([organisationId, roles]) => ({
      organisationId,
      organisationName: organisationId,
      roles,
    })),
  })

  it('is managed by its own coordinator', () => {
    const subject = toOrderSubject({ crag }, 'keld')
    expect(can(viewer({ keld: ['coordinator'] }), 'order:manage', subject)).toBe(true)
    expect(can(viewer({ harrow: ['coordinator'] }), 'order:manage', subject)).toBe(false)
  })

  it('is not managed by its own rebolter who coordinates for the other', () => {
    const both = viewer({ keld: ['rebolter'], harrow: ['coordinator'] })
    expect(can(both, 'order:manage', { crag })).toBe(true)
    expect(can(both, 'order:manage', toOrderSubject({ crag }, 'keld'))).toBe(false)
    expect(can(both, 'order:see', toOrderSubject({ crag }, 'keld'))).toBe(true)
  })
})

test('an offer that can no longer be answered says something else for each way it ended', () => {
  const ended = offerStates.filter(state => state !== 'sent')
  expect(new Set(ended.map(state => answeredWords[state])).size).toBe(ended.length)
})

test('a hazard’s order is under way in every state that it can still leave', () => {
  const canLeave = orderStates.filter(from => orderMoves.some(move => move.from === from))
  expect([...liveStates].sort()).toEqual(canLeave.sort())
})
