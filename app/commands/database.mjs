import { spawn } from 'node:child_process'
import { existsSync, mkdirSync, openSync, renameSync, rmSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { createConnection } from 'mysql2/promise'
import {
  claimFolder,
  readLastLines,
  rememberRunning,
  requireAccess,
  toSocketPath,
  writeSecret,
} from './database-folder.mjs'
import { findProgram } from './debian.mjs'
import { Problem } from './problem.mjs'
import { endProcess, findProcess } from './processes.mjs'

/** @typedef {import('./database-folder.mjs').Access} Access */

/**
 * @typedef {object} RunningDatabase
 * @property {string} ownerUrl may change the tables; migrations and grants go through it
 * @property {string} appUrl reads and writes rows, by the grants the owner gave
 * @property {number} port
 * @property {() => Promise<void>} stop ends the server we started, and nothing else
 * @property {() => void} stopNow asks it to end without waiting, for a process that is about to exit
 */

const host = '127.0.0.1'
const name = 'cragfettle'
/** the name of the database user whom the app works as */
export const appUser = 'cragfettle_app'
const ownerUser = 'cragfettle_owner'

/**
 * Starts a MariaDB of our own in `folder`, made when new, on loopback. Nobody gets in as root but the owner of the
 * folder through its socket. `onStep` is told of what takes long, `onLoss` when the server ends unasked.
 * @param {{ folder: string, onStep?: (words: string) => void, onLoss?: (words: string) => void }} options
 * @returns {Promise<RunningDatabase>}
 */
export async function startDatabase({ folder: given, onStep = () => {}, onLoss = () => {} }) {
  const folder = resolve(given)
  const data = join(folder, 'data')
  const access = await requireAccess(folder)
  await claimFolder(folder, data)
  if (!existsSync(data)) {
    onStep('making the database folder')
    await install(folder, data)
  }
  const server = launch(folder, data, access)
  const running = findProcess(server.child.pid ?? 0)
  rememberRunning(folder, running)
  let isStopping = false
  server.child.once('exit', code => {
    rememberRunning(folder, null)
    if (!isStopping) onLoss(`The database has ended (${code ?? 'killed'}). Its log: ${server.log}`)
  })
  const stopNow = () => {
    isStopping = true
    server.child.kill('SIGTERM')
  }
  const urls = toUrls(access)
  try {
    await untilReady(urls.ownerUrl, server)
  } catch (error) {
    stopNow()
    throw error
  }
  rmSync(server.setup, { force: true })
  return {
    ...urls,
    port: access.port,
    stopNow,
    async stop() {
      isStopping = true
      if (running !== null && !(await endProcess(running)))
        throw new Problem(`The database (process ${running.pid}) does not end. Its log: ${server.log}`)
      if (dirname(server.socket) !== folder) rmSync(dirname(server.socket), { recursive: true, force: true })
    },
  }
}

/** @param {Access} access */
function toUrls({ port, ownerPassword, appPassword }) {
  return {
    ownerUrl: `mysql://${ownerUser}:${ownerPassword}@${host}:${port}/${name}`,
    appUrl: `mysql://${appUser}:${appPassword}@${host}:${port}/${name}`,
  }
}

const asUser = () => (process.getuid?.() === 0 ? ['--user=root'] : [])

/**
 * Makes the data folder whole or not at all: a first start that was broken off begins anew.
 * @param {string} folder
 * @param {string} data
 */
async function install(folder, data) {
  const half = `${data}.new`
  rmSync(half, { recursive: true, force: true })
  mkdirSync(half, { mode: 0o700 })
  const log = join(folder, 'install.log')
  const out = openSync(log, 'w', 0o600)
  const child = spawn(
    findProgram('mariadb-install-db') ?? 'mariadb-install-db',
    [
      '--no-defaults',
      `--datadir=${half}`,
      '--auth-root-authentication-method=normal',
      '--skip-test-db',
      ...asUser(),
    ],
    { stdio: ['ignore', out, out], detached: true },
  )
  const code = await new Promise(done => {
    child.once('error', () => done(null))
    child.once('exit', done)
  })
  if (code !== 0) throw new Problem(`The database folder could not be made:\n${readLastLines(log)}`)
  renameSync(half, data)
}

/**
 * @param {string} folder
 * @param {string} data
 * @param {Access} access
 */
function launch(folder, data, access) {
  const socket = toSocketPath(folder)
  const log = join(folder, 'database.log')
  const setup = join(folder, 'setup.sql')
  rmSync(socket, { force: true })
  writeSecret(setup, toSetup(access))
  const out = openSync(log, 'w', 0o600)
  const [program = '', ...before] = [...endingWithUs(), findProgram('mariadbd') ?? 'mariadbd']
  // detached: Ctrl-C in the terminal must reach the app first, and the database only through us
  const child = spawn(
    program,
    [
      ...before,
      '--no-defaults',
      `--datadir=${data}`,
      `--socket=${socket}`,
      `--pid-file=${join(folder, 'mariadb.pid')}`,
      `--init-file=${setup}`,
      `--bind-address=${host}`,
      `--port=${access.port}`,
      '--skip-name-resolve',
      '--character-set-server=utf8mb4',
      '--collation-server=utf8mb4_unicode_ci',
      '--default-time-zone=+00:00',
      ...asUser(),
    ],
    { stdio: ['ignore', out, out], detached: true },
  )
  return { child, socket, log, setup }
}

/** What stands before a program so that it is asked to end when we are killed without having time for it. */
function endingWithUs() {
  const setpriv = findProgram('setpriv')
  return setpriv === null ? [] : [setpriv, '--pdeathsig', 'TERM', '--']
}

/**
 * What the server does before it lets anybody in, at every start: one statement a line, each harmless when done before.
 * @param {Access} access
 */
function toSetup({ ownerPassword, appPassword }) {
  return [
    `CREATE DATABASE IF NOT EXISTS ${name};`,
    `DELETE FROM mysql.global_priv WHERE User IN ('root', '') AND Host <> 'localhost';`,
    'FLUSH PRIVILEGES;',
    `CREATE USER IF NOT EXISTS '${ownerUser}'@'${host}';`,
    `ALTER USER '${ownerUser}'@'${host}' IDENTIFIED BY '${ownerPassword}';`,
    `GRANT ALL ON \`${name}%\`.* TO '${ownerUser}'@'${host}' WITH GRANT OPTION;`,
    `CREATE USER IF NOT EXISTS '${appUser}'@'${host}';`,
    `ALTER USER '${appUser}'@'${host}' IDENTIFIED BY '${appPassword}';`,
    '',
  ].join('\n')
}

/**
 * @param {string} url
 * @param {{ child: import('node:child_process').ChildProcess, log: string }} server
 */
async function untilReady(url, { child, log }) {
  const patience = Date.now() + 90_000
  for (;;) {
    try {
      const connection = await createConnection({ uri: url, connectTimeout: 2_000 })
      await connection.end()
      return
    } catch (error) {
      const lines = readLastLines(log)
      if (/unable to lock|can't lock/i.test(lines))
        throw new Problem(`Another process holds the database folder:\n${lines}`)
      if (child.exitCode !== null || child.pid === undefined)
        throw new Problem(`The database did not start:\n${lines}`)
      if (Date.now() > patience) throw new Problem(`The database does not answer: ${error}\n${lines}`)
      await pause(50)
    }
  }
}
