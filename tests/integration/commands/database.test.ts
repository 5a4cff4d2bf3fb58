import { type ChildProcess, spawn } from 'node:child_process'
import { once } from 'node:events'
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { createConnection } from 'mysql2/promise'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { type RunningDatabase, startDatabase } from '../../../app/commands/database.mjs'
import { claimFolder } from '../../../app/commands/database-folder.mjs'
import { findProcess } from '../../../app/commands/processes.mjs'

let folder: string
let running: RunningDatabase[]
let child: ChildProcess | null
beforeEach(() => {
  folder = mkdtempSync('/dev/shm/cragfettle-test-')
  running = []
  child = null
})
afterEach(async () => {
  await kill(child)
  for (const database of running) await database.stop()
  // ends the server of a start that was killed, should it still run
  await claimFolder(folder)
  rmSync(folder, { recursive: true })
})

async function start(): Promise<RunningDatabase> {
  const database = await startDatabase({ folder })
  running.push(database)
  return database
}

/** Another start on the same folder, in a process of its own. */
async function startElsewhere(): Promise<ChildProcess> {
  const code = `import { startDatabase } from './app/commands/database.mjs'
await startDatabase({ folder: ${JSON.stringify(folder)} })
console.log('up')`
  child = spawn(process.execPath, ['--input-type=module', '-e', code], {
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  await once(child.stdout!, 'data')
  return child
}

async function kill(process: ChildProcess | null): Promise<void> {
  if (process === null || process.exitCode !== null || process.signalCode !== null) return
  process.kill('SIGKILL')
  await once(process, 'exit')
}

const serverPid = () => Number(readFileSync(`${folder}/mariadb.pid`, 'utf8'))
const rowsOf = async (url: string, query: string) => {
  const connection = await createConnection(url)
  try {
    return (await connection.query(query))[0]
  } finally {
    await connection.end()
  }
}

test('what was written is there after the database was stopped and started', async () => {
  const first = await start()
  await rowsOf(first.ownerUrl, 'CREATE TABLE kept (word varchar(20)) SELECT "still here" AS word')
  await first.stop()
  const second = await start()
  expect(await rowsOf(second.ownerUrl, 'SELECT word FROM kept')).toEqual([{ word: 'still here' }])
})

test('nobody comes in as root over the network, nor as the app into tables it was not granted', async () => {
  const { port, ownerUrl, appUrl } = await start()
  await expect(rowsOf(`mysql://root@127.0.0.1:${port}/mysql`, 'SELECT 1')).rejects.toThrow('Access denied')
  await rowsOf(ownerUrl, 'CREATE TABLE closed (word varchar(20))')
  await expect(rowsOf(appUrl, 'SELECT * FROM closed')).rejects.toThrow('denied')
})

test('a second start on a folder in use says who uses it and leaves it running', async () => {
  const other = await startElsewhere()
  await expect(start()).rejects.toThrow(`in use by process ${other.pid}`)
  expect(() => process.kill(serverPid(), 0)).not.toThrow()
})

test('a database whose start was killed is taken over by the next start', async () => {
  const other = await startElsewhere()
  const left = serverPid()
  await kill(other)
  const { ownerUrl } = await start()
  expect(serverPid()).not.toBe(left)
  expect(await rowsOf(ownerUrl, 'SELECT 1 AS one')).toEqual([{ one: 1 }])
})

test('the pid file and the socket of a database that crashed do not block the next start', async () => {
  const other = await startElsewhere()
  process.kill(serverPid(), 'SIGKILL')
  await kill(other)
  const { ownerUrl } = await start()
  expect(await rowsOf(ownerUrl, 'SELECT 1 AS one')).toEqual([{ one: 1 }])
})

test('the database of a start that was killed ends by itself', async () => {
  const other = await startElsewhere()
  const left = serverPid()
  await kill(other)
  await expect.poll(() => findProcess(left), { timeout: 10_000 }).toBeNull()
})
