import { randomBytes } from 'node:crypto'
import { createRequestHandler } from '@react-router/express'
import { type Request, type RequestHandler, Router } from 'express'
import { RouterContextProvider, type ServerBuild } from 'react-router'
import type { ViteDevServer } from 'vite'
import type { Database } from './db/client.server'
import { findViewer } from './people/sessions.server'
import { type KnownViewer, viewerContext } from './people/viewer-context'
import { toAct } from './record/acts.server'
import { takeUploads } from './reports/uploads.server'
import { type Uploads, uploadsContext } from './reports/uploads-context'
import { answerWhileAway } from './web/away-answers.server'
import { clockContext, databaseContext, nonceContext, settingsContext, wakeContext } from './web/context'
import { findCookie, guestCookie, sessionCookie, toSetCookie } from './web/cookies'
import { isDatabaseAway } from './web/database-away'
import { createLimits } from './web/limits.server'
import { networkContext } from './web/network'
import { hashNetwork } from './web/network.server'
import { findNonce } from './web/security.server'
import type { Settings } from './web/settings'

interface Given {
  db: Database
  clock: () => Date
  settings: Settings
  vite: ViteDevServer | undefined
  wake: () => void
}

type Known = Request & { viewer?: KnownViewer; uploads?: Uploads }

const nobody: KnownViewer = {
  person: null,
  memberships: [],
  sessionHash: null,
  guestHash: null,
  confirmedAt: null,
}

/** Knows who looks before anything is read; while the database is away it is nobody, and the page says what is wrong. */
function knowViewer({ db, clock }: Given): RequestHandler {
  return (request: Known, _response, next) => {
    const header = request.headers.cookie
    const secrets = { session: findCookie(header, sessionCookie), guest: findCookie(header, guestCookie) }
    findViewer(db, secrets, clock())
      .catch(error => {
        if (isDatabaseAway(error)) return { ...nobody, away: true as const }
        throw error
      })
      .then(viewer => {
        request.viewer = viewer
        next()
      }, next)
  }
}

/** Gives a browser that opens a form the cookie its codes and staged photos hang on. */
const nameBrowser: RequestHandler = (request, response, next) => {
  if (request.method === 'GET' && findCookie(request.headers.cookie, guestCookie) === null)
    response.append('Set-Cookie', toSetCookie(guestCookie, randomBytes(32).toString('base64url')))
  next()
}

const ownerOf = (request: Known) => request.viewer?.sessionHash ?? request.viewer?.guestHash ?? null

/** Why no more forms with photos are taken from here just now, or null; reports and work are counted apart. */
function countForm({ db, settings }: Given): (request: Request) => Promise<string | null> {
  const limits = createLimits({ db, dbName: new URL(settings.databaseUrl).pathname.slice(1) })
  return async (request: Known) => {
    const network = hashNetwork(request.ip, settings.appSecret)
    const limited = request.path.startsWith('/report/') ? 'report' : 'upload'
    const answer = await limits.take(limited, { network, browser: ownerOf(request) })
    return answer.ok ? null : answer.reason
  }
}

/** Paths whose forms carry photos, each with the `.data` twin the framework posts to. */
const photoForms = [
  '/report/:climb/:point',
  '/report/:climb/:point.data',
  '/orders/:code/record',
  '/orders/:code/record.data',
]

/** Paths that need a named browser even before anybody signs in. */
const namedForms = ['/sign-in', '/sign-in/code', '/report/:climb/:point', '/orders/:code/record'].flatMap(
  path => [path, `${path}.data`],
)

async function loadBuild(vite: ViteDevServer | undefined): Promise<ServerBuild> {
  if (vite === undefined) return await import('virtual:react-router/server-build')
  return (await vite.ssrLoadModule('virtual:react-router/server-build')) as ServerBuild
}

/** The pages of the product, by the framework, behind knowing the viewer and taking photos up. */
export function toPages(given: Given): Router {
  const { db, clock, settings, vite } = given
  const pages = Router()
  pages.use((_request, response, next) => {
    // a page is made for who looks: kept for going back, asked for anew otherwise
    response.set('Cache-Control', 'private, no-cache')
    next()
  })
  pages.use(knowViewer(given))
  pages.use(namedForms, nameBrowser)
  pages.post(
    photoForms,
    takeUploads({
      photoDir: settings.photoDir,
      db,
      ownerOf,
      countForm: countForm(given),
      toAct: (request: Known) =>
        toAct(clock(), {
          kind: request.viewer?.person ? 'person' : 'guest',
          personId: request.viewer?.person?.id ?? null,
        }),
    }),
  )
  pages.use(
    createRequestHandler({
      build: async () => answerWhileAway(await loadBuild(vite)),
      mode: settings.production ? 'production' : 'development',
      getLoadContext(request: Known, response) {
        const context = new RouterContextProvider()
        context.set(databaseContext, db)
        context.set(clockContext, clock)
        context.set(settingsContext, settings)
        context.set(nonceContext, findNonce(response))
        context.set(networkContext, hashNetwork(request.ip, settings.appSecret))
        context.set(wakeContext, given.wake)
        context.set(viewerContext, request.viewer ?? nobody)
        context.set(uploadsContext, request.uploads ?? null)
        return context
      },
    }),
  )
  return pages
}
