import { PassThrough } from 'node:stream'
import { createReadableStreamFromReadable } from '@react-router/node'
import { isbot } from 'isbot'
import { renderToPipeableStream } from 'react-dom/server'
import {
  type EntryContext,
  isRouteErrorResponse,
  type RouterContextProvider,
  ServerRouter,
} from 'react-router'
import { nonceContext } from './web/context'
import { isDatabaseAway } from './web/database-away'
import { log } from './web/log.server'

const patience = 10_000

/** Renders a page on the server; robots and error pages wait for all of it. */
export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  entry: EntryContext,
  context: RouterContextProvider,
): Promise<Response> {
  const nonce = context.get(nonceContext)
  const whole = isbot(request.headers.get('user-agent')) || entry.isSpaMode
  return new Promise((answer, fail) => {
    let answered = false
    const { pipe, abort } = renderToPipeableStream(
      <ServerRouter context={entry} url={request.url} nonce={nonce} />,
      {
        nonce,
        [whole ? 'onAllReady' : 'onShellReady']() {
          answered = true
          const body = new PassThrough()
          headers.set('Content-Type', 'text/html; charset=utf-8')
          answer(new Response(createReadableStreamFromReadable(body), { headers, status }))
          pipe(body)
        },
        onShellError: fail,
        onError(error: unknown) {
          if (answered) log.error({ err: error }, 'page broke off')
        },
      },
    )
    setTimeout(abort, patience).unref()
  })
}

/** Errors of loaders and actions: answers under 500 are no fault of ours, and a database away is said on the page. */
export function handleError(error: unknown, { request }: { request: Request }): void {
  if (request.signal.aborted || isDatabaseAway(error)) return
  if (isRouteErrorResponse(error) && error.status < 500) return
  log.error({ err: error }, 'page failed')
}
