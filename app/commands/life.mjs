import { constants } from 'node:os'
import { fileURLToPath } from 'node:url'
import { Problem } from './problem.mjs'
import { endRunning } from './run.mjs'

/**
 * @typedef {object} Life
 * @property {(close: () => Promise<unknown>, closeNow?: () => void) => void} onEnd what to do at the end; what was
 *   started last is ended first. `closeNow` stands in when the process goes without having time.
 * @property {(code: number) => Promise<never>} end ends everything and the process
 * @property {() => boolean} isEnding
 */

/** Commands work from the top of the project, wherever they are called. */
export const root = fileURLToPath(new URL('../..', import.meta.url))

/**
 * Runs a command to its end or until Ctrl-C or SIGTERM, and ends whatever it started and nothing else. A Problem is
 * printed as its words, any other error with its stack; both exit with 1. Being stopped counts as a fault (128 and the
 * signal's number, as shells have it), unless the command `runsUntilStopped`. Asked again while it ends, it goes at once.
 * @param {(life: Life) => Promise<unknown>} command
 * @param {{ runsUntilStopped?: boolean }} [options]
 */
export async function live(command, { runsUntilStopped = false } = {}) {
  process.chdir(root)
  /** @type {{ close: () => Promise<unknown>, closeNow: () => void, isClosed: boolean }[]} */
  const started = []
  /** @type {Promise<never> | null} */
  let ending = null

  /** @param {number} code */
  async function closeAll(code) {
    await endRunning()
    let worst = code
    for (const each of [...started].reverse()) {
      try {
        await each.close()
        each.isClosed = true
      } catch (error) {
        worst = 1
        tellError(error)
      }
    }
    return process.exit(worst)
  }

  /** @type {Life} */
  const life = {
    onEnd(close, closeNow = () => {}) {
      started.push({ close, closeNow, isClosed: false })
    },
    end(code) {
      ending ??= closeAll(code)
      return ending
    },
    isEnding: () => ending !== null,
  }
  let askedAt = 0
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP']))
    process.on(signal, () => {
      const code = runsUntilStopped ? 0 : 128 + constants.signals[signal]
      if (ending === null) {
        console.log('\nEnding …')
        askedAt = Date.now()
        life.end(code)
      } else if (Date.now() - askedAt > 1_000) {
        // within the second it is the same Ctrl-C, passed on by npm
        process.exit(code)
      }
    })
  process.on('uncaughtException', error => {
    tellError(error)
    life.end(1)
  })
  process.on('exit', () => {
    for (const each of started) if (!each.isClosed) each.closeNow()
  })

  try {
    await command(life)
  } catch (error) {
    // what breaks because everything is being ended is no news
    if (ending !== null) return
    tellError(error)
    await life.end(1)
  }
}

/** @param {unknown} error */
function tellError(error) {
  console.error(error instanceof Problem ? `\n${error.message}` : error)
}
