import { mkdtempSync, rmSync } from 'node:fs'
import { createConnection } from 'mysql2/promise'
import type { TestProject } from 'vitest/node'
import { appUser, startDatabase } from '../../app/commands/database.mjs'
import { sweepFolders } from '../../app/commands/database-folder.mjs'
import { grantApp } from '../../app/db/grants.server'
import { migrateDatabase } from '../../app/db/migrate.server'

declare module 'vitest' {
  export interface ProvidedContext {
    /** the urls of each worker's own database, the first worker's first */
    databases: { ownerUrl: string; appUrl: string }[]
  }
}

/** One MariaDB in memory for all integration tests, with a migrated database per worker; gone when they are done. */
export default async function setUp(project: TestProject): Promise<() => Promise<void>> {
  await sweepFolders('/dev/shm', 'cragfettle-test-')
  const folder = mkdtempSync('/dev/shm/cragfettle-test-')
  const server = await startDatabase({ folder })
  // a worker's number counts those of the other projects too, when all run together
  const workers = Math.max(
    Number(project.config.maxWorkers) || 1,
    Number(project.vitest.config.maxWorkers) || 1,
  )
  const databases = []
  for (let worker = 1; worker <= workers; worker++) databases.push(await addDatabase(server, worker))
  project.provide('databases', databases)
  return async () => {
    await server.stop()
    rmSync(folder, { recursive: true, force: true })
  }
}

async function addDatabase(server: { ownerUrl: string; appUrl: string }, worker: number) {
  const name = `cragfettle_${worker}`
  const connection = await createConnection(server.ownerUrl)
  await connection.query(`CREATE DATABASE ${name}`)
  await connection.end()
  const urls = { ownerUrl: toUrl(server.ownerUrl, name), appUrl: toUrl(server.appUrl, name) }
  await migrateDatabase({ ownerUrl: urls.ownerUrl })
  await grantApp({ ownerUrl: urls.ownerUrl, appUser })
  return urls
}

const toUrl = (url: string, database: string) =>
  Object.assign(new URL(url), { pathname: `/${database}` }).href
