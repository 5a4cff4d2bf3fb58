import type { RequestHandler } from 'express'
import { toPlainPage } from './plain-page'

/**
 * Refuses a body of more than `bytes`, or of unknown length, before anything of it is read. Requests for which
 * `isExempt` says so (uploads, which have their own limit) go on.
 */
export function capBodies({
  bytes,
  isExempt = () => false,
}: {
  bytes: number
  isExempt?: (path: string) => boolean
}): RequestHandler {
  return (request, response, next) => {
    if (isExempt(request.path)) return next()
    const length = Number(request.get('content-length') ?? 0)
    const unknown = request.get('transfer-encoding') !== undefined
    if (!unknown && length <= bytes) return next()
    const kilobytes = Math.floor(bytes / 1024)
    response
      .status(unknown ? 411 : 413)
      .set('Connection', 'close')
      .type('html')
      .send(
        toPlainPage('That is too much at once', [
          `A form may hold ${kilobytes} kB of text. Nothing was changed. Go back: what you typed is still there. Shorten it and send it again.`,
        ]),
      )
  }
}
