import { expect, test } from 'vitest'
import { requireCan, requirePerson } from '~/people/guards.server'
import { actions } from '~/people/permission'
import { toRefusal } from '~/people/refusal'
import { stranger, type Viewer } from '~/people/viewer'

const person = { id: 'me', name: 'Mara Quill', email: 'mara@example.org', over18: true }
const climber: Viewer = { person, memberships: [] }

function thrownBy(run: () => unknown): unknown {
  try {
    run()
  } catch (thrown) {
    return thrown
  }
  return undefined
}

test.each([
  ['http://x.example/hazards?band=first', '/hazards?band=first'],
  ['http://x.example/hazards.data?band=first&_routes=a', '/hazards?band=first'],
  ['http://x.example/reports?index', '/reports'],
  ['http://x.example/_root.data', '/'],
])('somebody not signed in at %s is led to signing in and back to %s', (url, to) => {
  const thrown = thrownBy(() => requirePerson(stranger, new Request(url))) as Response
  expect(thrown.status).toBe(302)
  expect(thrown.headers.get('location')).toBe(`/sign-in?${new URLSearchParams({ to })}`)
})

test('somebody signed in goes on', () => {
  expect(requirePerson(climber, new Request('http://x.example/')).person.id).toBe('me')
})

test('what one may not see is not there; what one may see but not do is refused in a sentence', () => {
  const run = (seen: boolean) => thrownBy(() => requireCan(climber, 'report:decide', {}, { seen }))
  expect(run(false)).toMatchObject({ init: { status: 404 } })
  expect(run(true)).toMatchObject({
    init: { status: 403 },
    data: {
      reason: expect.stringContaining('Only a coordinator of an organisation that looks after this crag'),
    },
  })
  expect(thrownBy(() => requireCan(climber, 'record:see', {}, { seen: true }))).toBeUndefined()
})

test('every action has a refusal that is one or two whole sentences', () => {
  for (const action of actions)
    expect(toRefusal(stranger, action)).toMatch(/^Only [^.]+\.( Sign in [^.]+\.)?$/)
})

test('while the database cannot be asked nobody is sent to sign in: the page says what is wrong', () => {
  const unknown: Viewer = { ...stranger, away: true }
  const request = new Request('http://x.example/account')
  expect(thrownBy(() => requirePerson(unknown, request))).toMatchObject({ init: { status: 503 } })
  expect(thrownBy(() => requireCan(unknown, 'report:decide', {}, { seen: true }))).toMatchObject({
    init: { status: 503 },
  })
})
