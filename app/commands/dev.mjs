import { buildGround } from './build.mjs'
import { installDebian } from './debian.mjs'
import { requireFolders } from './folders.mjs'
import { live } from './life.mjs'
import { installPackages } from './packages.mjs'
import { findFreePort, requireFreePort } from './ports.mjs'
import { serveUntilEnd } from './serving.mjs'
import { readSettings } from './settings.mjs'

await live(develop, { runsUntilStopped: true })

/** @param {import('./life.mjs').Life} life */
async function develop(life) {
  const installation = readSettings(process.env)
  await requireFolders(installation)
  await requireFreePort(installation)
  if (installation.databaseUrl === null) await installDebian(['database'])
  await installPackages()
  await buildGround(installation.groundFile, { isFromSource: true })

  const { createServer } = await import('vite')
  const vite = await createServer({
    appType: 'custom',
    server: { middlewareMode: true, hmr: { port: await findFreePort(24_678) } },
  })
  life.onEnd(() => vite.close())
  const { startServices } = await import('./services.mjs')
  const app = /** @type {typeof import('../server')} */ (await vite.ssrLoadModule('./app/server.ts'))
  const demo = /** @type {typeof import('../../drizzle/seed')} */ (
    await vite.ssrLoadModule('./drizzle/seed.ts')
  )
  const { start } = await vite.ssrLoadModule('./fakes/mail/server.ts')
  const parts = {
    migrateDatabase: app.migrateDatabase,
    grantApp: app.grantApp,
    isEmpty: app.isEmpty,
    seed: demo.seed,
    startMail: /** @type {typeof import('../../fakes/mail/server').start} */ (start),
  }
  const { settings, inboxUrl } = await startServices(installation, parts, life)
  const ready = { settings: { ...settings, production: false }, inboxUrl, accounts: demo.demoAccounts }
  await serveUntilEnd({ serve: app.serve, ...ready, vite }, life)
}
