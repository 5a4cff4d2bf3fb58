import { createConnection, type RowDataPacket } from 'mysql2/promise'

/** Tables the app may only add to: the record of what was done stays as it was written. */
const appendOnly = new Set(['activities'])

/**
 * Gives the app's user (`name@host` parts apart) what it needs on every table, table by table: the record of
 * activity may be read, added to, and its details erased, never changed or deleted.
 */
export async function grantApp({
  ownerUrl,
  appUser,
  appHost = '127.0.0.1',
}: {
  ownerUrl: string
  appUser: string
  appHost?: string
}): Promise<void> {
  const connection = await createConnection({ uri: ownerUrl })
  const user = `${connection.escape(appUser)}@${connection.escape(appHost)}`
  try {
    const [tables] = await connection.query<RowDataPacket[]>(
      'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE()',
    )
    for (const { name } of tables) {
      const rights = appendOnly.has(name)
        ? 'SELECT, INSERT, UPDATE (details)'
        : 'SELECT, INSERT, UPDATE, DELETE'
      await connection.query(`GRANT ${rights} ON \`${name}\` TO ${user}`)
    }
  } finally {
    await connection.end()
  }
}
