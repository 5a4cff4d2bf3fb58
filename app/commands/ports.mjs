import { createServer } from 'node:net'
import { Problem } from './problem.mjs'

/**
 * Listens for a moment: the port that was free (`port` 0 is any free one), or the code of the error.
 * @param {number} port
 * @param {string} host
 * @returns {Promise<{ port: number } | { code: string }>}
 */
function tryPort(port, host) {
  return new Promise(done => {
    const server = createServer()
    server.once('error', error =>
      done({ code: /** @type {NodeJS.ErrnoException} */ (error).code ?? 'unknown' }),
    )
    server.listen({ port, host, exclusive: true }, () => {
      const found = /** @type {import('node:net').AddressInfo} */ (server.address()).port
      server.close(() => done({ port: found }))
    })
  })
}

/**
 * The wanted port of loopback when it is free, else any free one.
 * @param {number} [wanted]
 * @returns {Promise<number>}
 */
export async function findFreePort(wanted = 0) {
  for (const port of [wanted, 0]) {
    const found = await tryPort(port, '127.0.0.1')
    if ('port' in found) return found.port
  }
  throw new Problem('No port of 127.0.0.1 is free on this machine.')
}

/**
 * Makes sure that the pages can be served there, before anything long is begun.
 * @param {{ port: number, host: string }} settings
 */
export async function requireFreePort({ port, host }) {
  const found = await tryPort(port, host)
  if ('port' in found) return
  throw new Problem(toWords(found.code, port, host))
}

/**
 * @param {string} code
 * @param {number} port
 * @param {string} host
 */
export function toWords(code, port, host) {
  if (code === 'EADDRINUSE')
    return `Port ${port} of ${host} is in use by another program. End that one, or take another port, for example: PORT=${port < 65535 ? port + 1 : 3000} npm start`
  if (code === 'EACCES')
    return `Port ${port} may only be used by root. Take one from 1024 on, for example: PORT=3000 npm start`
  return `HOST ${host} is no address of this machine (${code}). Take one that is, for example: HOST=127.0.0.1 npm start`
}
