import { buildApp, buildGround, importBuilt } from './build.mjs'
import { installDebian } from './debian.mjs'
import { live } from './life.mjs'
import { installPackages } from './packages.mjs'
import { requireFreePort, toWords } from './ports.mjs'
import { Problem } from './problem.mjs'
import { readSettings } from './settings.mjs'
import { toWelcome } from './welcome.mjs'

await live(async life => {
  const installation = readSettings(process.env)
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
  const { settings, inboxUrl } = await startServices(
    installation,
    { ...app, seed: demo.seed, startMail },
    life,
  )

  const server = await app.serve(settings).catch(error => {
    if (['EADDRINUSE', 'EACCES', 'EADDRNOTAVAIL'].includes(error.code))
      throw new Problem(toWords(error.code, settings.port, settings.host))
    throw error
  })
  life.onEnd(() => server.close())
  console.log(toWelcome({ url: server.url, inboxUrl, accounts: settings.demo ? demo.demoAccounts : [] }))
})
