import { randomUUID } from 'node:crypto'
import type { RequestHandler } from 'express'
import { pino } from 'pino'
import { redactPath } from './link-paths'

/** The log: JSON lines on standard output, without names, addresses or secrets. `LOG_LEVEL` sets how much (tests: none). */
export const log = pino({
  level: process.env.LOG_LEVEL ?? (process.env.VITEST ? 'silent' : 'info'),
  base: undefined,
  timestamp: pino.stdTimeFunctions.isoTime,
})

type Line = { id: string; method: string; path: string; status: number; ms: number }

/** One line for each request when it is answered; its id goes back in `X-Request-Id` and stands in `locals.requestId`. */
export function logRequests(write: (line: Line) => void = line => log.info(line, 'request')): RequestHandler {
  return (request, response, next) => {
    const id = randomUUID()
    const started = performance.now()
    // the query is left out: it may hold what somebody typed
    const path = redactPath(request.path)
    response.locals.requestId = id
    response.setHeader('X-Request-Id', id)
    response.once('close', () => {
      const ms = Math.round(performance.now() - started)
      write({ id, method: request.method, path, status: response.statusCode, ms })
    })
    next()
  }
}
