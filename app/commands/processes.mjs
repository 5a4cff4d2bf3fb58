import { readFileSync } from 'node:fs'
import { setTimeout as pause } from 'node:timers/promises'

/** @typedef {{ pid: number, began: string }} Running a process, told apart from a later one of the same number */

/**
 * The process of a number as it runs now, or null when there is none.
 * @param {number} pid
 * @returns {Running | null}
 */
export function findProcess(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    // behind the name in parentheses, which may hold blanks, stand the state and, as the 20th field, the start time
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    return fields[0] === 'Z' ? null : { pid, began: fields[19] ?? '' }
  } catch {
    return null
  }
}

/**
 * Whether that very process still runs: another one that got its number later does not count.
 * @param {Running} known
 */
export function isRunning(known) {
  return findProcess(known.pid)?.began === known.began
}

/**
 * The arguments a process was started with; none when it has ended.
 * @param {number} pid
 * @returns {string[]}
 */
export function listArguments(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').filter(Boolean)
  } catch {
    return []
  }
}

/**
 * Asks a process to end (SIGTERM) and waits until it has; false when it still runs after `seconds`.
 * @param {Running} known
 * @param {number} [seconds]
 */
export async function endProcess(known, seconds = 30) {
  if (!isRunning(known)) return true
  try {
    process.kill(known.pid, 'SIGTERM')
  } catch {
    // it ended just now, or it belongs to somebody else: looked at below
  }
  for (let tries = 0; tries < seconds * 20; tries++) {
    if (!isRunning(known)) return true
    await pause(50)
  }
  return false
}
