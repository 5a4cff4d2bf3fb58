import { randomBytes } from 'node:crypto'
import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { findFreePort } from './ports.mjs'
import { Problem } from './problem.mjs'
import { endProcess, findProcess, isRunning, listArguments } from './processes.mjs'

/** @typedef {{ port: number, ownerPassword: string, appPassword: string }} Access */
/** @typedef {import('./processes.mjs').Running} Running */

/** the longest path a Unix socket may have, with some room */
const longestSocket = 100

/**
 * Port and passwords of the database in a folder, made when new and kept readable for its owner alone. A port that
 * somebody else has taken meanwhile is exchanged for a free one.
 * @param {string} folder
 * @returns {Promise<Access>}
 */
export async function requireAccess(folder) {
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  chmodSync(folder, 0o700)
  const file = join(folder, 'access.json')
  const kept = readJson(file)
  const known = {
    port: Number(kept?.port ?? 0),
    ownerPassword: kept?.ownerPassword ?? randomBytes(24).toString('hex'),
    appPassword: kept?.appPassword ?? randomBytes(24).toString('hex'),
  }
  const access = { ...known, port: await findFreePort(known.port) }
  if (JSON.stringify(access) !== JSON.stringify(kept)) writeSecret(file, JSON.stringify(access))
  return access
}

/**
 * Writes a file that only its owner may read.
 * @param {string} file
 * @param {string} text
 */
export function writeSecret(file, text) {
  rmSync(file, { force: true })
  writeFileSync(file, text, { mode: 0o600 })
}

/** @param {string} file */
function readJson(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'))
  } catch {
    return null
  }
}

/**
 * Where the socket of a folder stands: in it, or in a new private folder of its own when the path would be too long.
 * @param {string} folder
 */
export function toSocketPath(folder) {
  const inside = join(folder, 'db.sock')
  if (Buffer.byteLength(inside) <= longestSocket) return inside
  return join(mkdtempSync(join(tmpdir(), 'cragfettle-')), 'db.sock')
}

/**
 * The database server that runs on the data of a folder, whoever started it, or null.
 * @param {string} data
 * @returns {Running | null}
 */
function findServer(data) {
  for (const name of readdirSync('/proc')) {
    if (!/^\d+$/.test(name)) continue
    const [program, ...given] = listArguments(Number(name))
    if (program?.endsWith('mariadbd') && given.includes(`--datadir=${data}`)) return findProcess(Number(name))
  }
  return null
}

/**
 * Makes sure that nobody else works on the folder. A server left over by a start that was killed is ended; one whose
 * start still runs is not touched, and the person is told.
 * @param {string} folder
 * @param {string} [data]
 */
export async function claimFolder(folder, data = join(folder, 'data')) {
  const server = findServer(data)
  if (server === null) return
  const holder = readJson(join(folder, 'running.json'))
  const isLeftOver = holder?.server?.pid === server.pid && !isRunning(holder.starter)
  if (isLeftOver && (await endProcess(server))) return
  const who = isLeftOver ? server.pid : (holder?.starter?.pid ?? server.pid)
  throw new Problem(
    `Cragfettle already runs here: the database folder ${folder} is in use by process ${who}. End that one first ` +
      '(Ctrl-C where it was started), or start another one beside it, for example: DATA_DIR=.data-two PORT=3001 npm start',
  )
}

/**
 * Ends and removes the passing databases that tests left behind when they were killed: folders `prefix`… of `parent`
 * whose starter no longer runs.
 * @param {string} parent
 * @param {string} prefix
 */
export async function sweepFolders(parent, prefix) {
  for (const name of readdirSync(parent).filter(each => each.startsWith(prefix))) {
    const folder = join(parent, name)
    const holder = readJson(join(folder, 'running.json'))
    if (!holder?.starter || isRunning(holder.starter)) continue
    if (await endProcess(holder.server)) rmSync(folder, { recursive: true, force: true })
  }
}

/**
 * Writes down who runs the folder's server, for the next start.
 * @param {string} folder
 * @param {Running | null} server
 */
export function rememberRunning(folder, server) {
  const file = join(folder, 'running.json')
  if (server === null) rmSync(file, { force: true })
  else writeFileSync(file, JSON.stringify({ server, starter: findProcess(process.pid) }))
}

/**
 * The last lines of a log, for a person who has to find out what went wrong.
 * @param {string} file
 */
export function readLastLines(file) {
  if (!existsSync(file)) return ''
  return readFileSync(file, 'utf8').trimEnd().split('\n').slice(-8).join('\n')
}
