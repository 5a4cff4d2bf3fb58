import { sql } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { openDatabase } from '~/db/client.server'
import { isDatabaseAway } from '~/web/database-away'
import { testDatabase } from '../database'

const { db, url } = await testDatabase()
const failureOf = (work: Promise<unknown>) =>
  work.then(
    () => null,
    error => error as unknown,
  )

test('a database nobody serves is away', async () => {
  const gone = openDatabase('mysql://root@127.0.0.1:1/none')
  expect(isDatabaseAway(await failureOf(gone.db.execute(sql`select 1`)))).toBe(true)
  await gone.close()
})

test('a connection cut in the middle of a query or of a transaction is away, and the next one works', async () => {
  const { db: own, close } = openDatabase(url)
  const cut = sql`kill connection_id()`
  expect(isDatabaseAway(await failureOf(own.execute(cut)))).toBe(true)
  await expect.poll(() => failureOf(own.execute(sql`select 1`))).toBeNull()
  const inside = own.transaction(async tx => {
    await failureOf(tx.execute(cut))
    await tx.execute(sql`select 1`)
  })
  expect(isDatabaseAway(await failureOf(inside))).toBe(true)
  await expect.poll(() => failureOf(own.execute(sql`select 1`))).toBeNull()
  await close()
})

test('a query that is wrong does not count as a database that is away', async () => {
  expect(isDatabaseAway(await failureOf(db.execute(sql`select nothing from nowhere`)))).toBe(false)
})
