import { buildApp, buildGround, importBuilt } from './build.mjs'
import { installDebian } from './debian.mjs'
import { requireFolders } from './folders.mjs'
import { live } from './life.mjs'
import { installPackages } from './packages.mjs'
import { requireFreePort } from './ports.mjs'
import { serveUntilEnd } from './serving.mjs'
import { readSettings } from './settings.mjs'

await live(start, { runsUntilStopped: true })

/** @param {import('./life.mjs').Life} life */
async function start(life) {
  const installation = readSettings(process.env)
  await requireFolders(installation)
  await requireFreePort(installation)
  if (installation.databaseUrl === null) await installDebian(['database'])
  await installPackages()
  await buildApp()
  await buildGround(installation.groundFile)

  process.env.NODE_ENV = 'production'
  // packages of npm and the build are there from here on
  const { startServices } = await import('./services.mjs')
  const app = /** @type {typeof import('../server')} */ (await importBuilt('index'))
  const demo = /** @type {typeof import('../../drizzle/seed')} */ (await importBuilt('seed'))
  const { start: startMail } = await importBuilt('fake-mail')
  const ready = await startServices(installation, { ...app, seed: demo.seed, startMail }, life)
  await serveUntilEnd({ serve: app.serve, ...ready, accounts: demo.demoAccounts }, life)
}
