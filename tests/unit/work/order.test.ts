import { describe, expect, it } from 'vitest'
import type { Action } from '~/people/permission'
import { can, type Viewer } from '~/people/viewer'
import { isBonded } from '~/work/bonded'
import { findConsentFault } from '~/work/consent'
import { toUsualJob } from '~/work/job'
import { canMoveOrder, liveStates, type OrderState, orderMoves, orderStates } from '~/work/order'
import { toOrderSubject } from '~/work/subject'

const everything = () => true
const only = (action: Action) => (asked: Action) => asked === action
const nextOf = (from: OrderState, may: (action: Action) => boolean) =>
  orderStates.filter(to => canMoveOrder(from, to, may))

describe('An order', () => {
  it('that is closed or cancelled stays so', () => {
    expect(nextOf('closed', everything)).toEqual([])
    expect(nextOf('cancelled', everything)).toEqual([])
  })

  it('can be cancelled only before its work is done', () => {
    expect(orderStates.filter(from => canMoveOrder(from, 'cancelled', everything))).toEqual([
      'draft',
      'offered',
      'accepted',
    ])
  })

  it('is offered, closed and cancelled by its coordinator, never by whoever mends or checks', () => {
    expect(nextOf('checked', only('order:manage'))).toEqual(['closed'])
    expect(nextOf('checked', only('work:record'))).toEqual([])
    expect(nextOf('accepted', only('work:record'))).toEqual(['draft', 'done'])
    expect(nextOf('done', only('check:make'))).toEqual(['accepted', 'checked'])
  })

  it('falls back to a draft by itself when its offer ends, at nobody’s press', () => {
    expect(canMoveOrder('offered', 'draft', everything)).toBe(false)
    expect(orderMoves).toContainEqual(
      expect.objectContaining({ from: 'offered', to: 'draft', may: 'system' }),
    )
  })

  it('is under way until it is closed or cancelled', () => {
    expect(orderStates.filter(state => !(liveStates as readonly string[]).includes(state))).toEqual([
      'closed',
      'cancelled',
    ])
  })
})

describe('The owner’s word', () => {
  it('stops work while disputed, whatever the reason', () => {
    expect(findConsentFault('disputed', 'It is urgent.')).toMatch(/disputes/)
  })

  it('is replaced by a written reason only where it is not known', () => {
    expect(findConsentFault('unknown', null)).toMatch(/reason/)
    expect(findConsentFault('unknown', 'Nobody is found.')).toBeNull()
    expect(findConsentFault('given', null)).toBeNull()
    expect(findConsentFault('not_needed', null)).toBeNull()
  })
})

describe('A role counts for an order', () => {
  const membership = (organisationId: string, role: 'coordinator' | 'rebolter') => ({
    ...{ organisationId, organisationName: organisationId, roles: [role] },
  })
  const viewer: Viewer = {
    person: { id: 'p', name: 'Bo', email: 'bo@keld.example', over18: true },
    memberships: [membership('keld', 'coordinator'), membership('harrow', 'rebolter')],
  }
  const crag = {
    sensitive: 'open' as const,
    organisations: ['keld', 'harrow'].map(organisationId => ({
      ...{ organisationId, remit: 'rebolting' as const, lead: true },
    })),
  }

  it('only in the organisation the order belongs to', () => {
    expect(can(viewer, 'order:manage', toOrderSubject({ crag }, 'keld'))).toBe(true)
    expect(can(viewer, 'order:manage', toOrderSubject({ crag }, 'harrow'))).toBe(false)
    expect(can(viewer, 'work:record', toOrderSubject({ crag }, 'harrow'))).toBe(true)
    expect(can(viewer, 'work:record', toOrderSubject({ crag }, 'elsewhere'))).toBe(false)
  })
})

describe('Kinds of job and part', () => {
  it('begin with what the way of failing usually asks for', () => {
    expect(toUsualJob('pulls_out', 'bolt')).toBe('replace_bolt')
    expect(toUsualJob('releases_rope', 'lower_off')).toBe('replace_ring')
    expect(toUsualJob('cuts_rope', 'bolt')).toBe('replace_connector')
    expect(toUsualJob('breaks', 'bolt')).toBe('look_closely')
  })

  it('know which bolts resin holds', () => {
    expect((['bonded_eye', 'bonded_staple', 'bonded_stud'] as const).every(isBonded)).toBe(true)
    expect((['wedge_bolt', 'ring', 'resin'] as const).some(isBonded)).toBe(false)
  })
})
