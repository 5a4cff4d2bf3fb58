import { execFileSync } from 'node:child_process'
import { cpSync, mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, relative } from 'node:path'
import { createConnection, type RowDataPacket } from 'mysql2/promise'
import { expect, inject, it } from 'vitest'
import { migrateDatabase } from '~/db/migrate.server'

const root = join(import.meta.dirname, '../../..')

it('The migrations bring exactly the tables that the code knows', () => {
  const out = mkdtempSync(join(tmpdir(), 'migrations-'))
  try {
    cpSync(join(root, 'drizzle/migrations'), out, { recursive: true })
    const before = readdirSync(out)
    const said = execFileSync(
      process.execPath,
      [
        'node_modules/drizzle-kit/bin.cjs',
        'generate',
        '--dialect',
        'mysql',
        '--schema',
        './app/db/schema/*.ts',
        '--out',
        relative(root, out),
      ],
      { cwd: root, encoding: 'utf8' },
    )
    expect(said).toContain('No schema changes')
    expect(readdirSync(out)).toEqual(before)
  } finally {
    rmSync(out, { recursive: true, force: true })
  }
})

it('Migrating a second time does nothing', async () => {
  const { ownerUrl } = inject('databases')[0]!
  expect(await migrateDatabase({ ownerUrl })).toEqual({ applied: 0 })
})

it('The record of activity can be added to, and neither changed nor deleted, by the app', async () => {
  const { appUrl } = inject('databases')[0]!
  const connection = await createConnection({ uri: appUrl })
  try {
    await expect(connection.query("UPDATE activities SET verb = 'forged'")).rejects.toThrow(/denied/)
    await expect(connection.query('DELETE FROM activities')).rejects.toThrow(/denied/)
    const [rows] = await connection.query<RowDataPacket[]>('SELECT COUNT(*) AS count FROM activities')
    expect(rows).toHaveLength(1)
  } finally {
    await connection.end()
  }
})
