import type { Request, RequestHandler } from 'express'
import { hasOurCookie } from './cookies'
import { isLinkPath } from './link-paths'
import { toPlainPage } from './plain-page'

const harmless = new Set(['GET', 'HEAD', 'OPTIONS'])

function isFromHere(request: Request, origin: string): boolean {
  const site = request.get('sec-fetch-site')
  if (site === 'same-origin' || request.get('origin') === origin) return true
  // a page without referrer sends `Origin: null`; an older browser says nothing else, and the secret in the path
  // of a mailed link is one that no other site can know
  return site === undefined && request.get('origin') === 'null' && isLinkPath(request.path)
}

/**
 * Refuses every request that would change something, carries a cookie of ours and does not come from a page of
 * ours: the browser must say `Sec-Fetch-Site: same-origin`, or an `Origin` equal to the application's address.
 * Without a cookie of ours a request acts for nobody and goes on.
 */
export function refuseForeignOrigins({ appUrl }: { appUrl: string }): RequestHandler {
  const { origin } = new URL(appUrl)
  return (request, response, next) => {
    if (harmless.has(request.method) || !hasOurCookie(request.headers.cookie)) return next()
    if (isFromHere(request, origin)) return next()
    response
      .status(403)
      .type('html')
      .send(
        toPlainPage('This did not come from our own page', [
          'What was sent came from another address than this one, or your browser did not say from where. Nothing was changed.',
          `Open ${origin} and send it from there. If you came that way, let your browser send the origin of forms, or try another browser.`,
        ]),
      )
  }
}
