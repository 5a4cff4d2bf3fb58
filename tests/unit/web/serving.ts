import type { AddressInfo } from 'node:net'
import express, { type RequestHandler } from 'express'

/** Serves `handlers` before an answer `reached` and gives what `ask` gets from it. */
export async function serve(handlers: RequestHandler[]) {
  const app = express()
  app.use(...handlers)
  app.use((_, response) => void response.send('reached'))
  const server = app.listen(0, '127.0.0.1')
  await new Promise(resolve => server.once('listening', resolve))
  const address = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  return {
    address,
    ask: (path: string, init?: RequestInit) => fetch(address + path, init),
    close: () => new Promise(resolve => server.close(resolve)),
  }
}
