import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { setTimeout as pause } from 'node:timers/promises'
import { Problem } from './problem.mjs'

/** @typedef {{ code: number | null, output: string }} Ended */

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set()

/** how long a program may take to put its own things away */
const patience = 20_000
let isEnding = false

/** Asks every program that still runs to end, and waits a while for it. From then on no other is begun. */
export async function endRunning() {
  isEnding = true
  if (running.size === 0) return
  const ended = Promise.all([...running].map(child => once(child, 'close')))
  for (const child of running) child.kill('SIGTERM')
  await Promise.race([ended, pause(patience)])
}

/**
 * Runs a program to its end and gives its exit code (null when it could not start or was killed) and all it wrote;
 * `onLine` gets each line as it comes. There is no answer once everything is being ended: whoever waits for it must not
 * go on to the next thing.
 * @param {string} program
 * @param {string[]} given
 * @param {{ onLine?: (line: string) => void, env?: Record<string, string | undefined>, cwd?: string }} [options]
 * @returns {Promise<Ended>}
 */
export function runToEnd(program, given, { onLine = () => {}, env = {}, cwd } = {}) {
  return new Promise(settle => {
    /** @param {Ended} ended */
    const done = ended => {
      if (!isEnding) settle(ended)
    }
    if (isEnding) return
    const child = spawn(program, given, {
      cwd,
      env: { ...process.env, ...env },
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    running.add(child)
    child.once('close', () => running.delete(child))
    let output = ''
    let rest = ''
    /** @param {Buffer} chunk */
    const take = chunk => {
      output += chunk
      const lines = `${rest}${chunk}`.split('\n')
      rest = lines.pop() ?? ''
      for (const line of lines) onLine(line)
    }
    child.stdout.on('data', take)
    child.stderr.on('data', take)
    child.once('error', error => done({ code: null, output: `${output}${error.message}` }))
    child.once('close', code => {
      if (rest !== '') onLine(rest)
      done({ code, output })
    })
  })
}

/**
 * Runs a program that must succeed; a Problem says which one did not, with the end of what it wrote.
 * @param {string} program
 * @param {string[]} given
 * @param {Parameters<typeof runToEnd>[2]} [options]
 */
export async function runOrFail(program, given, options) {
  const { code, output } = await runToEnd(program, given, options)
  if (code === 0) return output
  throw new Problem(
    `\`${[program, ...given].join(' ')}\` failed:\n${output.trimEnd().split('\n').slice(-25).join('\n')}`,
  )
}
