import { toWords } from './ports.mjs'
import { Problem } from './problem.mjs'
import { toWelcome } from './welcome.mjs'

/**
 * Serves until the end of `life`, and says where.
 * @param {object} given
 * @param {typeof import('../server').serve} given.serve
 * @param {import('../web/settings').Settings} given.settings
 * @param {string | null} given.inboxUrl
 * @param {{ name: string, email: string, does: string }[]} given.accounts
 * @param {import('vite').ViteDevServer} [given.vite]
 * @param {import('./life.mjs').Life} life
 */
export async function serveUntilEnd({ serve, settings, inboxUrl, accounts, vite }, life) {
  const server = await serve(settings, vite).catch(error => {
    if (['EADDRINUSE', 'EACCES', 'EADDRNOTAVAIL'].includes(error.code))
      throw new Problem(toWords(error.code, settings.port, settings.host))
    throw error
  })
  life.onEnd(() => server.close())
  console.log(toWelcome({ url: server.url, inboxUrl, accounts: settings.demo ? accounts : [] }))
}
