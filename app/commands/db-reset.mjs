import { rmSync } from 'node:fs'
import { join } from 'node:path'
import { buildApp, importBuilt } from './build.mjs'
import { installDebian } from './debian.mjs'
import { requireFolders } from './folders.mjs'
import { live } from './life.mjs'
import { installPackages } from './packages.mjs'
import { Problem } from './problem.mjs'
import { readSettings } from './settings.mjs'

/** Throws away what the demo's database holds, with its photos, and makes the demo anew. */
await live(async life => {
  const installation = readSettings(process.env)
  const { dataDir, photoDir, databaseUrl, demo } = installation
  if (databaseUrl !== null)
    throw new Problem(
      'db:reset empties the database of the data folder, never one given by DATABASE_URL. Leave it out, for example: env -u DATABASE_URL npm run db:reset',
    )
  if (!demo)
    throw new Problem(
      `db:reset is for the demo on this machine, and APP_URL is ${installation.appUrl}. For another data folder, for example: env -u APP_URL DATA_DIR=.data-two npm run db:reset`,
    )
  await requireFolders(installation)
  await installDebian(['database'])
  await installPackages()
  await buildApp()

  const { markForReset, ownDatabase } = await import('./services.mjs')
  const app = /** @type {typeof import('../server')} */ (await importBuilt('index'))
  const { seed } = /** @type {typeof import('../../drizzle/seed')} */ (await importBuilt('seed'))
  markForReset(dataDir)
  if (photoDir === join(dataDir, 'photos')) rmSync(photoDir, { recursive: true, force: true })
  await ownDatabase(installation, { ...app, seed }, life)
  console.log('The demo is as new.')
  await life.end(0)
})
