import { randomBytes } from 'node:crypto'
import type { Request, RequestHandler, Response } from 'express'
import helmet from 'helmet'
import { isLinkPath } from './link-paths'

/** The nonce of this answer's own scripts, for `ServerRouter` and `Scripts`; undefined in development. */
export function findNonce(response: Response): string | undefined {
  return response.locals.nonce as string | undefined
}

const self = "'self'"
const none = "'none'"

function toPolicy(production: boolean) {
  const nonce = (_: unknown, response: unknown) => `'nonce-${findNonce(response as Response)}'`
  // vite's development pages carry inline scripts and styles and talk over a web socket
  const loose = [self, "'unsafe-inline'"]
  return {
    defaultSrc: [none],
    scriptSrc: production ? [self, nonce] : loose,
    styleSrc: production ? [self, nonce] : loose,
    imgSrc: [self, 'data:', 'blob:'],
    fontSrc: [self],
    connectSrc: production ? [self] : [self, 'ws:', 'wss:'],
    workerSrc: [self, 'blob:'],
    manifestSrc: [self],
    formAction: [self],
    frameAncestors: [none],
    baseUri: [none],
    objectSrc: [none],
  }
}

const features = ['browsing-topics', 'camera', 'microphone', 'payment', 'usb', 'display-capture']
const permissions = ['geolocation=(self)', ...features.map(name => `${name}=()`)].join(', ')

function nameReferrerPolicy(request: Request): string {
  return isLinkPath(request.path) ? 'no-referrer' : 'same-origin'
}

/**
 * The headers of every answer: in production only scripts of this house or with this answer's nonce run; nobody may
 * frame a page; strict transport only where the address is https; a page behind a mailed link sends no referrer.
 */
export function securityHeaders({
  appUrl,
  production,
}: {
  appUrl: string
  production: boolean
}): RequestHandler {
  const protect = helmet({
    contentSecurityPolicy: { useDefaults: false, directives: toPolicy(production) },
    strictTransportSecurity: new URL(appUrl).protocol === 'https:' && { maxAge: 31_536_000 },
    referrerPolicy: false,
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
    xXssProtection: false,
  })
  return (request, response, next) => {
    if (production) response.locals.nonce = randomBytes(18).toString('base64url')
    response.setHeader('Referrer-Policy', nameReferrerPolicy(request))
    response.setHeader('Permissions-Policy', permissions)
    protect(request, response, next)
  }
}
