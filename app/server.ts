import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { resolve } from 'node:path'
import compression from 'compression'
import express, { type ErrorRequestHandler, type Express } from 'express'
import type { ViteDevServer } from 'vite'
import { type Database, openDatabase } from './db/client.server'
import { keepGround } from './map/ground.server'
import { groundHandler } from './map/ground-handler.server'
import { toPages } from './pages.server'
import { adoptFirstModel } from './rating/models.server'
import { toAct } from './record/acts.server'
import { servePhotos } from './reports/photo-serving.server'
import { capBodies } from './web/body.server'
import { toClock } from './web/clock.server'
import { isDatabaseAway } from './web/database-away'
import { answerHealth, answerReadiness } from './web/health.server'
import { log, logRequests } from './web/log.server'
import { refuseForeignOrigins } from './web/origin.server'
import { toPlainPage } from './web/plain-page'
import { securityHeaders } from './web/security.server'
import type { Settings } from './web/settings'
import { startWork } from './worker.server'

export { grantApp } from './db/grants.server'
export { isEmpty, migrateDatabase } from './db/migrate.server'

const formBytes = 256 * 1024

const answerError: ErrorRequestHandler = (error, _request, response, next) => {
  if (response.headersSent) return next(error)
  const away = isDatabaseAway(error)
  if (!away) log.error({ err: error }, 'request failed')
  response
    .status(away ? 503 : 500)
    .type('html')
    .send(
      away
        ? toPlainPage('The record cannot be reached just now', [
            'Nothing was saved. Go back: what you typed is still there. Send it again in a minute.',
          ])
        : toPlainPage('Something went wrong here', [
            'It is our fault, and it is written down. Nothing was saved. Go back and try again.',
          ]),
    )
}

function serveFiles(app: Express): void {
  const client = resolve('build/client')
  app.use(
    '/assets',
    express.static(`${client}/assets`, { immutable: true, maxAge: '1y', fallthrough: false }),
  )
  app.use(express.static(client, { maxAge: '1h', index: false }))
}

/** An installation rates by model 1 from its first start; a database that is away is met again at the next one. */
async function adoptModel(db: Database, clock: () => Date): Promise<void> {
  try {
    await adoptFirstModel(db, toAct(clock(), { kind: 'system', personId: null }))
  } catch (error) {
    log.warn({ err: error }, 'the rating model could not be looked up')
  }
}

/**
 * Serves the product on the settings' address until `close`: pages, photos, ground tiles, and the worker that sends
 * mails and does jobs. With `vite` the pages come from the sources (development).
 */
export async function serve(
  settings: Settings,
  vite?: ViteDevServer,
): Promise<{ url: string; close(): Promise<void> }> {
  const { db, close: closeDatabase } = openDatabase(settings.databaseUrl)
  const clock = toClock(settings.clockAt)
  await adoptModel(db, clock)
  const work = startWork({ db, settings, clock })
  const given = { db, clock, settings, vite, wake: work.wake }

  const app = express()
  app.disable('x-powered-by')
  app.set('trust proxy', settings.trustProxy)
  app.get('/healthz', answerHealth)
  app.get('/readyz', answerReadiness({ db, lastPass: work.lastPass, groundFile: settings.groundFile, clock }))
  app.use(logRequests())
  app.use(securityHeaders(settings))
  app.get('/ground/:z/:x/:y.mvt', groundHandler(keepGround(settings.groundFile)))
  app.use(compression())
  if (vite === undefined) serveFiles(app)
  else app.use(vite.middlewares)
  app.use(refuseForeignOrigins(settings))
  app.use(capBodies({ bytes: formBytes, isExempt: path => /^\/(report|orders)\//.test(path) }))
  app.get('/photos/:key/:file', servePhotos(given))
  app.use(toPages(given))
  app.use(answerError)

  const server = createServer(app)
  server.requestTimeout = 120_000
  await new Promise<void>((done, failed) => {
    server.once('error', failed)
    server.listen(settings.port, settings.host, done)
  })
  return {
    url:
      settings.port === 0
        ? `http://${settings.host}:${(server.address() as AddressInfo).port}`
        : settings.appUrl,
    async close() {
      server.closeIdleConnections()
      await new Promise<void>(done => {
        server.close(() => done())
        setTimeout(() => server.closeAllConnections(), 2_000).unref()
      })
      await work.stop()
      await closeDatabase()
    },
  }
}
