import { execFile } from 'node:child_process'
import { cpSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { promisify } from 'node:util'
import { createConnection } from 'mysql2/promise'
import { appUser, type RunningDatabase, startDatabase } from '../../app/commands/database.mjs'
import { sweepFolders } from '../../app/commands/database-folder.mjs'
import { startTask } from './tasks'

/** The moment every journey begins at, on the app's own clock. */
export const dawn = '2027-05-14T08:30:00.000Z'

const run = promisify(execFile)
const toUrl = (url: string, name: string) => Object.assign(new URL(url), { pathname: `/${name}` }).href

export interface DemoCopy {
  databaseUrl: string
  photoDir: string
  drop(): Promise<void>
}

export interface DemoServer {
  copy(): Promise<DemoCopy>
  stop(): Promise<void>
  start(): Promise<void>
  close(): Promise<void>
}

/** A MariaDB in memory with the demo, made once; each journey gets a copy of its rows and its photos. */
export async function startDemoServer(): Promise<DemoServer> {
  await sweepFolders('/dev/shm', 'cragfettle-journeys-')
  const folder = mkdtempSync('/dev/shm/cragfettle-journeys-')
  let server: RunningDatabase | null = await startDatabase({ folder })
  const { ownerUrl, appUrl } = server
  const seeded = join(folder, 'photos')
  mkdirSync(seeded)
  await startTask('seed', { ownerUrl, appUser, photoDir: seeded, now: dawn })
  const dump = join(folder, 'demo.sql')
  await shell(
    ownerUrl,
    'mariadb-dump "$@" --single-transaction --skip-lock-tables --no-tablespaces "$NAME" > "$FILE"',
    dump,
  )
  let copies = 0

  async function start() {
    server ??= await startDatabase({ folder })
  }
  async function stop() {
    await server?.stop()
    server = null
  }
  return {
    start,
    stop,
    async copy() {
      const name = `cragfettle_${++copies}`
      const photoDir = join(folder, `photos-${copies}`)
      cpSync(seeded, photoDir, { recursive: true })
      await query(ownerUrl, `CREATE DATABASE ${name}`)
      await shell(toUrl(ownerUrl, name), 'mariadb "$@" "$NAME" < "$FILE"', dump)
      await startTask('grant', { ownerUrl: toUrl(ownerUrl, name), appUser })
      return {
        databaseUrl: toUrl(appUrl, name),
        photoDir,
        async drop() {
          await start()
          await query(ownerUrl, `DROP DATABASE ${name}`)
          rmSync(photoDir, { recursive: true, force: true })
        },
      }
    },
    async close() {
      await stop()
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

async function query(url: string, text: string): Promise<void> {
  const connection = await createConnection(url)
  await connection.query(text)
  await connection.end()
}

/** Runs a client program; the password goes by the environment, where no list of processes shows it. */
async function shell(url: string, command: string, file: string): Promise<void> {
  const { username, password, hostname, port, pathname } = new URL(url)
  const given = [
    '--no-defaults',
    `--host=${hostname}`,
    `--port=${port}`,
    `--user=${username}`,
    '--default-character-set=utf8mb4',
  ]
  await run('sh', ['-ec', command, 'sh', ...given], {
    env: { ...process.env, MYSQL_PWD: password, NAME: pathname.slice(1), FILE: file },
  })
}
