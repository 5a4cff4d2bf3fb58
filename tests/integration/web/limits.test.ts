import { beforeEach, expect, test } from 'vitest'
import { openDatabase } from '~/db/client.server'
import { rateLimits } from '~/db/schema/record'
import { createLimits } from '~/web/limits.server'
import { testDatabase } from '../database'

const { db, url, empty } = await testDatabase()
const dbName = new URL(url).pathname.slice(1)
beforeEach(empty)

async function takeUntilRefused(
  limits: ReturnType<typeof createLimits>[],
  browser: string | null,
  network = 'net',
) {
  for (let taken = 0; taken < 500; taken++) {
    const answer = await limits[taken % limits.length]!.take('report', { network, browser })
    if (!answer.ok) return { taken, answer }
  }
  return null
}

test('a browser sends twenty reports an hour, counted over two processes, and then hears when to try again', async () => {
  const two = [createLimits({ db, dbName }), createLimits({ db, dbName })]
  const refused = await takeUntilRefused(two, 'phone')
  expect(refused?.taken).toBe(20)
  expect(refused?.answer).toMatchObject({ reason: expect.stringContaining('Try again in 60 minutes') })
  expect(refused!.answer.ok || refused!.answer.retryAfter).toBeGreaterThan(3590)
  expect(await two[0]!.take('report', { network: 'net', browser: 'laptop' })).toEqual({ ok: true })
})

test('browsers that are thrown away are counted by their network, and photos apart from reports', async () => {
  const limits = createLimits({ db, dbName })
  expect((await takeUntilRefused([limits], null))?.taken).toBe(60)
  expect(await limits.take('upload', { network: 'net', browser: null })).toEqual({ ok: true })
  expect(await limits.take('report', { network: 'other', browser: null })).toEqual({ ok: true })
})

test('no row of the counter names a browser or network in any other form than it was given', async () => {
  await createLimits({ db, dbName }).take('report', { network: 'hash1', browser: 'hash2' })
  const keys = (await db.select().from(rateLimits)).map(({ key }) => key)
  expect(keys.sort()).toEqual(['report-browser:hash2', 'report-network:hash1'])
})

test('while the database is away the process counts by itself', async () => {
  const gone = openDatabase('mysql://root@127.0.0.1:1/none')
  const limits = createLimits({ db: gone.db, dbName: 'none' })
  expect((await takeUntilRefused([limits], 'phone'))?.taken).toBe(20)
  await gone.close()
})
