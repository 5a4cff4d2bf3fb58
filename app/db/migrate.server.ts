import { type Connection, createConnection, type RowDataPacket } from 'mysql2/promise'

const lock = 'cragfettle:migrate'

/** The migrations as written, in the order of their names, each cut into its statements. */
export function listMigrations(): { file: string; statements: string[] }[] {
  const files = import.meta.glob<string>('../../drizzle/migrations/*.sql', {
    query: '?raw',
    import: 'default',
    eager: true,
  })
  return Object.entries(files)
    .map(([path, text]) => ({ file: path.split('/').at(-1)!, statements: toStatements(text) }))
    .sort((a, b) => (a.file < b.file ? -1 : 1))
}

function toStatements(text: string): string[] {
  return text
    .split('--> statement-breakpoint')
    .map(statement => statement.trim())
    .filter(statement => statement.replace(/^--.*$/gm, '').trim() !== '')
}

async function listDone(connection: Connection): Promise<Set<string>> {
  await connection.query(
    'CREATE TABLE IF NOT EXISTS migrations_done (file varchar(120), statement int, done_at datetime(3) NOT NULL, PRIMARY KEY (file, statement))',
  )
  const [rows] = await connection.query<RowDataPacket[]>('SELECT file, statement FROM migrations_done')
  return new Set(rows.map(row => `${row.file}#${row.statement}`))
}

/**
 * Brings the database at `ownerUrl` to the newest schema and gives how many statements ran. Only one process migrates
 * at a time; every statement is remembered once done, since the database commits each by itself, so a run that was
 * broken off goes on where it stopped.
 */
export async function migrateDatabase({
  ownerUrl,
  onStep = () => {},
}: {
  ownerUrl: string
  onStep?: (words: string) => void
}): Promise<{ applied: number }> {
  const connection = await createConnection({ uri: ownerUrl, timezone: 'Z', charset: 'utf8mb4_unicode_ci' })
  try {
    const [[got]] = await connection.query<RowDataPacket[]>('SELECT GET_LOCK(?, 60) AS got', [lock])
    if (got?.got !== 1)
      throw new Error('Another process has been migrating this database for a minute; try again.')
    const done = await listDone(connection)
    let applied = 0
    for (const { file, statements } of listMigrations()) {
      for (const [index, statement] of statements.entries()) {
        if (done.has(`${file}#${index}`)) continue
        onStep(`${file}, statement ${index + 1} of ${statements.length}`)
        await connection.query(statement)
        await connection.query('INSERT INTO migrations_done VALUES (?, ?, UTC_TIMESTAMP(3))', [file, index])
        applied++
      }
    }
    return { applied }
  } finally {
    await connection.end()
  }
}

/** Whether the database holds no organisation yet, so that the demo may be put in. */
export async function isEmpty({ databaseUrl }: { databaseUrl: string }): Promise<boolean> {
  const connection = await createConnection({ uri: databaseUrl })
  try {
    const [rows] = await connection.query<RowDataPacket[]>('SELECT 1 FROM organisations LIMIT 1')
    return rows.length === 0
  } finally {
    await connection.end()
  }
}
