import { eq } from 'drizzle-orm'
import { beforeEach, expect, test } from 'vitest'
import { messages } from '~/db/schema/mail'
import { people, sessions, signInCodes } from '~/db/schema/people'
import { activities } from '~/db/schema/record'
import { askForCode } from '~/people/code-asking.server'
import { CodeRefused, createAuthenticator } from '~/people/code-strategy.server'
import { findAsked } from '~/people/codes.server'
import { findViewer } from '~/people/sessions.server'
import { signInByCode, signInSweep, signOut, signOutEverywhere } from '~/people/sign-in.server'
import { hashSecret } from '~/record/acts.server'
import { testDatabase } from '../database'
import { actAt, day, hour, later, minute, newSecret, noon } from './acting'

const { db, empty } = await testDatabase()
beforeEach(empty)

const settings = { appSecret: 'the secret of the tests', appUrl: 'http://127.0.0.1:3000' }
const browser = newSecret()
const browserHash = hashSecret(browser)
const email = 'mara@example.org'

function ask(changes: Partial<{ email: string; browserHash: string; network: string; now: Date }> = {}) {
  const { now = noon, ...rest } = changes
  return askForCode(db, actAt(now), { email, browserHash, network: 'net', ...rest }, settings)
}

async function readCodes(to = email): Promise<string[]> {
  const sent = await db.select().from(messages).where(eq(messages.toEmail, to)).orderBy(messages.id)
  return sent.map(({ text }) => /(\d{4}) (\d{4})/.exec(text!)!.slice(1).join(''))
}

const signIn = (
  code: string,
  changes: Partial<{ browserHash: string; sessionHash: string; now: Date }> = {},
) => {
  const { now = noon, ...rest } = changes
  return signInByCode(db, actAt(now), { code, browserHash, sessionHash: null, ...rest }, settings.appSecret)
}

const wrong = (code: string) => String((Number(code) + 1) % 1e8).padStart(8, '0')

test('a mailed code signs in once, in the browser that asked, and opens an account for a new address', async () => {
  expect(await ask()).toEqual({ ok: true })
  const [code] = await readCodes()
  const answer = await signIn(code!)
  expect(answer).toMatchObject({ ok: true, isNew: true })
  const viewer = await findViewer(db, { session: answer.ok ? answer.secret : null, guest: null }, noon)
  expect(viewer.person).toMatchObject({ email, name: 'mara' })
  expect(await signIn(code!)).toMatchObject({ ok: false })
  expect(await db.select({ verb: activities.verb }).from(activities)).toEqual([{ verb: 'account-opened' }])
})

test('a known address signs in to its own account', async () => {
  const id = actAt(noon).newId()
  await db.insert(people).values({ id, name: 'Mara Quill', email, createdAt: noon, updatedAt: noon })
  await ask()
  const [code] = await readCodes()
  expect(await signIn(code!)).toMatchObject({ ok: true, isNew: false, personId: id })
  expect(await db.select().from(people)).toMatchObject([{ name: 'Mara Quill', emailConfirmedAt: noon }])
})

test('asking gives the same answer and the same mail for a known and an unknown address', async () => {
  const id = actAt(noon).newId()
  await db.insert(people).values({ id, name: 'Mara Quill', email, createdAt: noon, updatedAt: noon })
  expect(await ask()).toEqual(
    await ask({ email: 'nobody@example.org', browserHash: hashSecret(newSecret()) }),
  )
  const sent = await db.select().from(messages)
  const bare = sent.map(({ subject, text }) => subject + text!.replace(/\d{4} \d{4}/, ''))
  expect(bare).toHaveLength(2)
  expect(bare[0]).toBe(bare[1])
})

test('a code of another browser signs in nobody', async () => {
  await ask()
  const [code] = await readCodes()
  expect(await signIn(code!, { browserHash: hashSecret(newSecret()) })).toMatchObject({ ok: false })
  expect(await db.select().from(sessions)).toEqual([])
})

test('a code works for ten minutes and not a moment longer', async () => {
  await ask()
  const [code] = await readCodes()
  expect(await signIn(code!, { now: later(10 * minute) })).toMatchObject({
    ok: false,
    reason: expect.stringContaining('Ask for a new one'),
  })
  expect(await signIn(code!, { now: later(10 * minute - 1) })).toMatchObject({ ok: true })
})

test('after five wrong codes the right one works no more, and asking again gives no new tries', async () => {
  await ask()
  const [code] = await readCodes()
  for (const left of ['4 tries are', '3 tries are', '2 tries are', 'one try is'])
    expect(await signIn(wrong(code!))).toMatchObject({ reason: expect.stringContaining(`${left} left`) })
  expect(await signIn(wrong(code!))).toMatchObject({ reason: expect.stringContaining('in 10 minutes') })
  expect(await signIn(code!)).toMatchObject({ ok: false })
  expect(await ask({ now: later(4 * minute) })).toMatchObject({
    ok: false,
    reason: expect.stringContaining('in 6 minutes'),
  })
  expect(await ask({ now: later(10 * minute) })).toEqual({ ok: true })
})

test('tries made at the same moment are all counted', async () => {
  await ask()
  const [code] = await readCodes()
  await Promise.all(Array.from({ length: 8 }, () => signIn(wrong(code!))))
  const [row] = await db.select().from(signInCodes)
  expect(row!.tries).toBe(5)
  expect(await signIn(code!)).toMatchObject({ ok: false })
})

test('a code used by two requests at once signs in one of them', async () => {
  await ask()
  const [code] = await readCodes()
  const answers = await Promise.all(Array.from({ length: 4 }, () => signIn(code!)))
  expect(answers.filter(({ ok }) => ok)).toHaveLength(1)
})

test('two codes asked for within ten minutes both work, so that a late mail is of use', async () => {
  await ask()
  await ask({ now: later(minute) })
  const [first] = await readCodes()
  expect(await signIn(first!, { now: later(2 * minute) })).toMatchObject({ ok: true })
})

test('an address gets ten codes a day, even when asked for all at once', async () => {
  const asked = Array.from({ length: 13 }, () => ask({ browserHash: hashSecret(newSecret()) }))
  const answers = await Promise.all(asked)
  expect(answers.filter(({ ok }) => ok)).toHaveLength(10)
  expect(await readCodes()).toHaveLength(10)
  expect(await ask({ now: later(3 * hour) })).toMatchObject({
    reason: expect.stringContaining('in 21 hours'),
  })
  expect(await ask({ now: later(day) })).toEqual({ ok: true })
})

test('a network gets thirty codes an hour, another network is not touched by that', async () => {
  for (let i = 0; i < 30; i++) await ask({ email: `climber${i}@example.org` })
  expect(await ask({ email: 'late@example.org' })).toMatchObject({
    ok: false,
    reason: expect.stringContaining('from your network'),
  })
  expect(await ask({ email: 'late@example.org', network: 'other' })).toEqual({ ok: true })
  expect(await ask({ email: 'later@example.org', now: later(hour) })).toEqual({ ok: true })
})

test('no code and no secret stands in the database as it was given out', async () => {
  await ask()
  const [code] = await readCodes()
  expect(JSON.stringify(await db.select().from(signInCodes))).not.toContain(code)
})

test('the page for the code knows the address without being told it', async () => {
  await ask()
  await ask({ email: 'second@example.org', now: later(1) })
  expect(await findAsked(db, browserHash, later(minute))).toBe('second@example.org')
  expect(await findAsked(db, hashSecret(newSecret()), noon)).toBeNull()
})

test('signing in anew ends the session this browser had', async () => {
  await ask()
  const first = await signIn((await readCodes())[0]!)
  const secret = first.ok ? first.secret : ''
  await ask({ now: later(minute) })
  const code = (await readCodes())[1]!
  const second = await signIn(code, { now: later(minute), sessionHash: hashSecret(secret) })
  expect(second.ok && second.secret).not.toBe(secret)
  expect((await findViewer(db, { session: secret, guest: null }, noon)).person).toBeNull()
})

test('signing out ends one session, signing out everywhere all of them', async () => {
  const secrets: string[] = []
  for (let i = 0; i < 3; i++) {
    await ask({ now: later(i) })
    const answer = await signIn((await readCodes())[i]!, { now: later(i) })
    if (answer.ok) secrets.push(answer.secret)
  }
  const [{ personId } = { personId: '' }] = await db.select().from(sessions)
  await signOut(db, actAt(noon), { personId, sessionHash: hashSecret(secrets[0]!) })
  expect(await db.select().from(sessions)).toHaveLength(2)
  await signOutEverywhere(db, actAt(noon), personId)
  expect(await db.select().from(sessions)).toHaveLength(0)
})

test('the sweep takes away what works no more and leaves what still counts', async () => {
  await ask()
  await signIn((await readCodes())[0]!)
  const sweep = (now: Date) => signInSweep.run({ db, clock: () => now, stopping: () => false })
  await sweep(later(day))
  expect(await db.select().from(signInCodes)).toHaveLength(1)
  expect(await db.select().from(sessions)).toHaveLength(1)
  await sweep(later(91 * day))
  expect(await db.select().from(signInCodes)).toHaveLength(0)
  expect(await db.select().from(sessions)).toHaveLength(0)
})

function toRequest(code: string, cookie: string) {
  return new Request('http://127.0.0.1:3000/sign-in/code', {
    method: 'POST',
    body: new URLSearchParams({ code }),
    headers: { cookie },
  })
}

test('the strategy reads code and browser from the request and gives the new session', async () => {
  await ask()
  const [code] = await readCodes()
  const authenticator = createAuthenticator({ db, act: actAt(noon), appSecret: settings.appSecret })
  const spaced = `${code!.slice(0, 4)} ${code!.slice(4)}`
  const run = (typed: string, cookie: string) => authenticator.authenticate('code', toRequest(typed, cookie))
  await expect(run('12', '')).rejects.toMatchObject({
    message: expect.stringContaining('eight digits'),
  })
  await expect(run(spaced, '')).rejects.toMatchObject({
    message: expect.stringContaining('only in the browser'),
  })
  await expect(run(wrong(code!), `__Host-guest=${browser}`)).rejects.toBeInstanceOf(CodeRefused)
  expect(await run(spaced, `__Host-guest=${browser}`)).toMatchObject({
    isNew: true,
    secret: expect.any(String),
  })
})
