import { asc, eq } from 'drizzle-orm'
import { beforeEach, expect, test } from 'vitest'
import { jobs } from '~/db/schema/record'
import { toAct } from '~/record/acts.server'
import { jobStep, queueJob } from '~/record/jobs.server'
import { failLease, finishLease, releaseLease, renewLease, takeLeases } from '~/record/leases.server'
import { testDatabase } from '../database'

const { db, empty } = await testDatabase()
beforeEach(empty)

const noon = new Date('2027-03-12T12:00:00.000Z')
const minute = 60_000
const later = (minutes: number) => new Date(noon.getTime() + minutes * minute)
const act = toAct(noon, { kind: 'system', personId: null })
const queue = (dedupeKey: string, dueAt = noon, kind = 'tidy') =>
  queueJob(db, act, { kind, dedupeKey, dueAt })
const take = (token: string, now = noon) => takeLeases(db, jobs, { token, now })
const read = async () => (await db.select().from(jobs).orderBy(asc(jobs.dedupeKey)))[0]!

test('the same job asked for twice is queued once', async () => {
  await queue('a')
  await queue('a')
  expect(await take('w1')).toHaveLength(1)
})

test('only what is due is taken, the earliest first, twenty at most', async () => {
  await queue('tomorrow', later(1440))
  for (let i = 0; i < 22; i++) await queue(`job ${String(i).padStart(2, '0')}`, later(-i))
  const taken = await take('w1')
  expect(taken.map(({ dedupeKey }) => dedupeKey)).toEqual(
    Array.from({ length: 20 }, (_, i) => `job ${String(21 - i).padStart(2, '0')}`),
  )
})

test('two workers at the same moment never take the same job', async () => {
  for (let i = 0; i < 40; i++) await queue(`job ${i}`)
  const taken = await Promise.all(['w1', 'w2', 'w3', 'w4'].map(token => take(token)))
  const ids = taken.flat().map(({ id }) => id)
  expect(ids).toHaveLength(40)
  expect(new Set(ids).size).toBe(40)
})

test('what a killed worker held comes free after two minutes, and its late word counts no more', async () => {
  await queue('a')
  const [job] = await take('killed')
  expect(await take('w2', later(1.9))).toEqual([])
  expect(await take('w2', later(2.1))).toMatchObject([{ tries: 2 }])
  expect(await renewLease(db, jobs, job!.id, { token: 'killed', now: later(2.2) })).toBe(false)
  expect(await finishLease(db, jobs, job!.id, { token: 'killed', now: later(2.2) })).toBe(false)
  expect(await finishLease(db, jobs, job!.id, { token: 'w2', now: later(2.2) })).toBe(true)
  expect(await read()).toMatchObject({ state: 'done', leaseBy: null })
})

test('a job that kills its worker each time is given up like one that fails', async () => {
  await queue('a')
  for (let i = 0; i < 6; i++) expect(await take(`w${i}`, later(3 * i))).toHaveLength(1)
  expect(await take('w6', later(18))).toEqual([])
  expect(await read()).toMatchObject({ state: 'dead', error: expect.stringContaining('ended in the middle') })
})

test('a job that fails is put off further each time, then waits for a person', async () => {
  await queue('a')
  let now = noon
  for (const pause of [1, 5, 25, 120, 600]) {
    const [job] = await take('w1', now)
    await failLease(db, jobs, job!, { token: 'w1', now }, { error: 'no luck' })
    now = new Date(now.getTime() + pause * minute)
    expect(await read()).toMatchObject({ state: 'waiting', dueAt: now, error: 'no luck' })
  }
  const [job] = await take('w1', now)
  await failLease(db, jobs, job!, { token: 'w1', now }, { error: 'no luck' })
  expect(await read()).toMatchObject({ state: 'dead', tries: 6 })
})

test('what can never succeed is given up at once', async () => {
  await queue('a')
  const [job] = await take('w1')
  await failLease(db, jobs, job!, { token: 'w1', now: noon }, { error: 'never', permanent: true })
  expect(await read()).toMatchObject({ state: 'dead' })
})

test('a job given back is as if it had not been taken', async () => {
  await queue('a')
  const [job] = await take('w1')
  await releaseLease(db, jobs, job!.id, { token: 'w1', now: noon })
  expect(await read()).toMatchObject({ state: 'waiting', tries: 0, leaseBy: null, dueAt: noon })
})

function run(handlers: Parameters<typeof jobStep>[0], stopping = false) {
  const errors: unknown[] = []
  const step = jobStep(handlers, error => errors.push(error))
  return step.run({ db, clock: () => noon, stopping: () => stopping }).then(count => ({ count, errors }))
}

test('jobs run by their kind with their parameters; kinds nobody here knows are left', async () => {
  await queueJob(db, act, { kind: 'tidy', dedupeKey: 'a', params: { place: 'Keld' } })
  await queue('b', noon, 'unknown')
  const seen: unknown[] = []
  expect(await run({ tidy: async (_, __, params) => void seen.push(params) })).toEqual({
    count: 1,
    errors: [],
  })
  expect(seen).toEqual([{ place: 'Keld' }])
  const states = await db
    .select({ key: jobs.dedupeKey, state: jobs.state })
    .from(jobs)
    .orderBy(jobs.dedupeKey)
  expect(states).toEqual([
    { key: 'a', state: 'done' },
    { key: 'b', state: 'waiting' },
  ])
})

test('a job that throws is put off and told, the next still runs', async () => {
  await queue('a', later(-1))
  await queue('b')
  let ran = 0
  const tidy = async () => {
    ran++
    if (ran === 1) throw new Error('broken')
  }
  expect(await run({ tidy })).toMatchObject({ count: 2, errors: [expect.any(Error)] })
  const [first] = await db.select().from(jobs).where(eq(jobs.dedupeKey, 'a'))
  expect(first).toMatchObject({ state: 'waiting', dueAt: later(1), error: 'Error: broken' })
})

test('a worker told to stop gives back what it has not begun', async () => {
  await queue('a')
  await run({ tidy: async () => Promise.reject(new Error('must not run')) }, true)
  expect(await read()).toMatchObject({ state: 'waiting', tries: 0, error: null })
})
