import { eq } from 'drizzle-orm'
import { beforeEach, expect, test } from 'vitest'
import { membershipRoles, memberships, organisations, people, sessions } from '~/db/schema/people'
import { endAllSessions, endSession, findViewer, listSessions, startSession } from '~/people/sessions.server'
import { hashSecret } from '~/record/acts.server'
import { testDatabase } from '../database'
import { actAt, day, later, minute, newSecret, noon } from './acting'

const { db, empty } = await testDatabase()
const act = actAt(noon)
const mara = act.newId()
const stamps = { createdAt: noon, updatedAt: noon }

beforeEach(async () => {
  await empty()
  await db.insert(people).values({ id: mara, name: 'Mara Quill', email: 'mara@example.org', ...stamps })
})

const find = (session: string | null, now = noon) => findViewer(db, { session, guest: null }, now)

test('a session is known by its secret, of which only the hash is kept', async () => {
  const secret = await startSession(db, act, mara)
  const viewer = await find(secret)
  expect(viewer.person).toEqual({ id: mara, name: 'Mara Quill', email: 'mara@example.org', over18: false })
  expect(viewer).toMatchObject({ sessionHash: hashSecret(secret), confirmedAt: noon })
  expect(JSON.stringify(await db.select().from(sessions))).not.toContain(secret)
})

test('nobody is known by no secret, or one that was never given out', async () => {
  expect((await find(null)).person).toBeNull()
  expect((await find(newSecret())).person).toBeNull()
})

test('a guest has the hash of their own cookie and is nobody', async () => {
  const guest = newSecret()
  const viewer = await findViewer(db, { session: null, guest }, noon)
  expect(viewer).toMatchObject({ person: null, guestHash: hashSecret(guest) })
})

test('a session ends 90 days after it was last seen, and each visit puts that off', async () => {
  const secret = await startSession(db, act, mara)
  expect((await find(secret, later(80 * day))).person?.id).toBe(mara)
  expect((await find(secret, later(169 * day))).person?.id).toBe(mara)
  expect((await find(secret, later(259 * day))).person).toBeNull()
})

test('that a session was seen is written at most every ten minutes', async () => {
  const secret = await startSession(db, act, mara)
  const seen = async () => (await db.select().from(sessions))[0]!.seenAt
  await find(secret, later(9 * minute))
  expect(await seen()).toEqual(noon)
  await find(secret, later(10 * minute))
  expect(await seen()).toEqual(later(10 * minute))
})

test('a role given or taken, and a membership ended, counts from the next request on', async () => {
  const secret = await startSession(db, act, mara)
  const crew = { id: act.newId(), name: 'Crew', timeZone: 'Atlantic/Azores', currency: 'EUR', ...stamps }
  const membership = { id: act.newId(), organisationId: crew.id, personId: mara, ...stamps }
  await db.insert(organisations).values(crew)
  await db.insert(memberships).values(membership)
  const held = async () => (await find(secret)).memberships
  expect(await held()).toEqual([{ organisationId: crew.id, organisationName: 'Crew', roles: [] }])
  await db.insert(membershipRoles).values({ membershipId: membership.id, role: 'rebolter' })
  await db.insert(membershipRoles).values({ membershipId: membership.id, role: 'coordinator' })
  expect((await held())[0]!.roles.sort()).toEqual(['coordinator', 'rebolter'])
  await db.update(memberships).set({ endedAt: noon }).where(eq(memberships.id, membership.id))
  expect(await held()).toEqual([])
})

test('one session ends alone, all of a person end together', async () => {
  const [phone, laptop, tablet] = await Promise.all([1, 2, 3].map(() => startSession(db, act, mara)))
  await endSession(db, hashSecret(phone!))
  expect((await find(phone!)).person).toBeNull()
  expect(await listSessions(db, mara, noon)).toHaveLength(2)
  await endAllSessions(db, mara)
  expect((await find(laptop!)).person).toBeNull()
  expect((await find(tablet!)).person).toBeNull()
})

test('an erased person is signed in nowhere', async () => {
  const secret = await startSession(db, act, mara)
  await db.update(people).set({ erasedAt: noon, email: null })
  expect((await find(secret)).person).toBeNull()
})
