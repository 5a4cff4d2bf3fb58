import { RouterContextProvider } from 'react-router'
import { beforeEach, expect, test } from 'vitest'
import { openDatabase } from '~/db/client.server'
import { messages } from '~/db/schema/mail'
import { people } from '~/db/schema/people'
import { findViewer } from '~/people/sessions.server'
import { viewerContext } from '~/people/viewer-context'
import * as account from '~/routes/account'
import * as typeCode from '~/routes/sign-in/code'
import * as signIn from '~/routes/sign-in/index'
import * as signOut from '~/routes/sign-out'
import { clockContext, databaseContext, settingsContext } from '~/web/context'
import { findCookie, guestCookie, sessionCookie } from '~/web/cookies'
import { networkContext } from '~/web/network'
import type { Settings } from '~/web/settings'
import { testDatabase } from '../database'
import { noon } from './acting'

const own = await testDatabase()
const address = 'http://127.0.0.1:3000'
let jar: Map<string, string>

beforeEach(async () => {
  await own.empty()
  jar = new Map()
})

type Page = { loader?: unknown; action?: unknown }
type Answer = { status: number; location: string | null; body: unknown }

/** One visit as the server would make it: who looks from the cookies, the answer's cookies kept for the next. */
async function visit(page: Page, path: string, form?: Record<string, string>, db = own.db): Promise<Answer> {
  const cookie = [...jar].map(([name, value]) => `${name}=${value}`).join('; ')
  const init = form && { method: 'POST', body: new URLSearchParams(form) }
  const request = new Request(address + path, { ...init, headers: { cookie } })
  const context = new RouterContextProvider()
  context.set(databaseContext, db)
  context.set(clockContext, () => noon)
  context.set(settingsContext, { appUrl: address, appSecret: 'the secret of the tests' } as Settings)
  context.set(networkContext, 'net')
  const secrets = { session: findCookie(cookie, sessionCookie), guest: findCookie(cookie, guestCookie) }
  context.set(viewerContext, await findViewer(own.db, secrets, noon))
  const handler = (form ? page.action : page.loader) as (given: object) => Promise<unknown>
  return keepCookies(await settle(async () => handler({ request, context, params: {} })))
}

async function settle(run: () => Promise<unknown>): Promise<unknown> {
  try {
    return await run()
  } catch (thrown) {
    if (thrown instanceof Error) throw thrown
    return thrown
  }
}

function keepCookies(answer: unknown): Answer {
  if (!(answer instanceof Response)) {
    const { data, init } = (answer ?? {}) as { data?: unknown; init?: { status?: number } | null }
    return { status: init?.status ?? 200, location: null, body: data ?? answer }
  }
  for (const line of answer.headers.getSetCookie()) {
    const [name, value] = line.split(';')[0]!.split('=') as [string, string]
    if (value === '') jar.delete(name)
    else jar.set(name, value)
  }
  return { status: answer.status, location: answer.headers.get('location'), body: null }
}

async function readCode(): Promise<string> {
  const [mail] = await own.db.select().from(messages)
  return /\d{4} \d{4}/.exec(mail!.text!)![0]
}

test('a newcomer signs in with a mailed code, gives a name, and signs out', async () => {
  const asked = await visit(signIn, '/sign-in', { email: 'Mara@Example.org' })
  expect(asked).toMatchObject({ status: 302, location: '/sign-in/code' })
  expect(await visit(typeCode, '/sign-in/code')).toMatchObject({ body: { email: 'mara@example.org' } })
  const signedIn = await visit(typeCode, '/sign-in/code', { code: await readCode() })
  expect(signedIn).toMatchObject({ status: 302, location: '/account' })
  const saved = await visit(account, '/account', { intent: 'save', name: 'Mara Quill', over18: 'on' })
  expect(await visit(account, saved.location!)).toMatchObject({
    body: { saved: true, person: { name: 'Mara Quill', over18: true }, sessions: [{ here: true }] },
  })
  expect(await visit(signOut, '/sign-out', {})).toMatchObject({ status: 302, location: '/' })
  expect(await visit(account, '/account')).toMatchObject({ status: 302, location: '/sign-in?to=%2Faccount' })
})

test('whoever was sent to sign in comes back to the page they wanted, never to another site', async () => {
  await visit(signIn, '/sign-in?to=/hazards', { email: 'mara@example.org' })
  const here = await visit(typeCode, '/sign-in/code?to=/hazards', { code: await readCode() })
  expect(here.location).toBe('/hazards')
  jar.delete(sessionCookie)
  await own.empty()
  await visit(signIn, '/sign-in', { email: 'mara@example.org' })
  const away = await visit(typeCode, '/sign-in/code?to=//evil.example', { code: await readCode() })
  expect(away.location).toBe('/account')
})

test('an address that is none is named, with what was typed still there and no mail sent', async () => {
  expect(await visit(signIn, '/sign-in', { email: 'mara at example' })).toMatchObject({
    status: 400,
    body: {
      errors: { email: expect.stringContaining('mara@example.org') },
      typed: { email: 'mara at example' },
    },
  })
  expect(await own.db.select().from(messages)).toEqual([])
})

test('a wrong code says how many tries are left and keeps what was typed', async () => {
  await visit(signIn, '/sign-in', { email: 'mara@example.org' })
  expect(await visit(typeCode, '/sign-in/code', { code: '0000 000' })).toMatchObject({ status: 400 })
  const wrong = (await readCode()) === '1111 1111' ? '2222 2222' : '1111 1111'
  expect(await visit(typeCode, '/sign-in/code', { code: wrong })).toMatchObject({
    status: 400,
    body: {
      errors: { code: expect.stringContaining('4 tries are left') },
      typed: { code: wrong },
    },
  })
})

test('with the database away what was typed is still in the form', async () => {
  const gone = openDatabase('mysql://root@127.0.0.1:1/none')
  const answer = await visit(signIn, '/sign-in', { email: 'mara@example.org' }, gone.db)
  expect(answer).toMatchObject({ status: 503, body: { typed: { email: 'mara@example.org' } } })
  const code = await visit(typeCode, '/sign-in/code', { code: '4821 9306' }, gone.db)
  expect(code).toMatchObject({ status: 400, body: { errors: { code: expect.stringContaining('browser') } } })
  await visit(signIn, '/sign-in', { email: 'mara@example.org' })
  expect(await visit(typeCode, '/sign-in/code', { code: '4821 9306' }, gone.db)).toMatchObject({
    status: 503,
    body: { typed: { code: '4821 9306' } },
  })
  await gone.close()
})

test('signing out everywhere ends the other browsers too', async () => {
  const signInAnew = async () => {
    jar = new Map()
    await own.db.delete(messages)
    await visit(signIn, '/sign-in', { email: 'mara@example.org' })
    await visit(typeCode, '/sign-in/code', { code: await readCode() })
    return jar
  }
  const phone = await signInAnew()
  await signInAnew()
  await visit(account, '/account', { intent: 'sign-out-everywhere' })
  jar = phone
  expect(jar.has(sessionCookie)).toBe(true)
  expect((await visit(account, '/account')).status).toBe(302)
})

test('an account without a name is not saved', async () => {
  await visit(signIn, '/sign-in', { email: 'mara@example.org' })
  await visit(typeCode, '/sign-in/code', { code: await readCode() })
  expect(await visit(account, '/account', { intent: 'save', name: ' ' })).toMatchObject({
    status: 400,
    body: { errors: { name: expect.stringContaining('Mara Quill') } },
  })
  expect(await own.db.select({ name: people.name }).from(people)).toEqual([{ name: 'mara' }])
})
