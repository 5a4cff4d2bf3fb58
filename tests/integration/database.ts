import { createPool, type RowDataPacket } from 'mysql2/promise'
import { afterAll, inject } from 'vitest'
import { type Database, openDatabase } from '~/db/client.server'

/** Tables that hold what migrations did, not what people did. */
const kept = new Set(['migrations_done'])

/**
 * This worker's own database, used with the rights the app has. `empty()` takes every row out of it, which the app
 * itself could not do; call it before each test.
 */
export async function testDatabase(): Promise<{ db: Database; url: string; empty(): Promise<void> }> {
  const databases = inject('databases')
  const worker = Number(process.env.VITEST_POOL_ID ?? 1)
  const { ownerUrl, appUrl } = databases[(worker - 1) % databases.length]!
  const { db, close } = openDatabase(appUrl)
  const owner = createPool({ uri: ownerUrl, connectionLimit: 1, multipleStatements: true })
  const [tables] = await owner.query<RowDataPacket[]>(
    "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE'",
  )
  const deletes = tables.filter(({ name }) => !kept.has(name)).map(({ name }) => `DELETE FROM \`${name}\`;`)
  afterAll(async () => {
    await close()
    await owner.end()
  })
  return {
    db,
    url: appUrl,
    async empty() {
      await owner.query(`SET foreign_key_checks = 0; ${deletes.join(' ')} SET foreign_key_checks = 1;`)
    },
  }
}
