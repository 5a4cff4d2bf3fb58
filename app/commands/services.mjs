import { randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { createConnection } from 'mysql2/promise'
import { appUser, startDatabase } from './database.mjs'
import { writeSecret } from './database-folder.mjs'
import { findFreePort } from './ports.mjs'
import { Problem } from './problem.mjs'
import { inStep } from './progress.mjs'

/** @typedef {import('./settings.mjs').Installation} Installation */
/** @typedef {import('./life.mjs').Life} Life */
/** @typedef {import('../web/settings').Settings} Settings */

/**
 * What of the product the commands call: from the build, or in development from the sources.
 * @typedef {object} Parts
 * @property {typeof import('../server').migrateDatabase} migrateDatabase
 * @property {typeof import('../server').grantApp} grantApp
 * @property {typeof import('../server').isEmpty} isEmpty
 * @property {typeof import('../../drizzle/seed').seed} seed
 */

/** @typedef {{ startMail: typeof import('../../fakes/mail/server').start }} Fakes */

/**
 * Brings up everything the pages need: the database, migrated and for a demo filled, the secret, and the mail server
 * of the demo when none is given. All of it ends with `life`.
 * @param {Installation} installation
 * @param {Parts & Fakes} parts
 * @param {Life} life
 * @returns {Promise<{ settings: Settings, inboxUrl: string | null }>}
 */
export async function startServices(installation, parts, life) {
  const { github: _, migrate: __, ...rest } = installation
  const databaseUrl = installation.databaseUrl
    ? await givenDatabase(installation, installation.databaseUrl, parts)
    : await ownDatabase(installation, parts, life)
  const mail = installation.smtpUrl ? null : await startInbox(installation, parts, life)
  const settings = {
    ...rest,
    databaseUrl,
    smtpUrl: installation.smtpUrl ?? mail?.smtpUrl ?? '',
    appSecret: installation.appSecret ?? requireSecret(installation.dataDir),
    production: true,
  }
  return { settings, inboxUrl: mail?.url ?? null }
}

/**
 * The secret of this installation, made at the first start.
 * @param {string} dataDir
 */
export function requireSecret(dataDir) {
  const file = join(dataDir, 'app-secret')
  if (!existsSync(file)) writeSecret(file, randomBytes(32).toString('hex'))
  return readFileSync(file, 'utf8')
}

/**
 * @param {Installation} installation
 * @param {Fakes} fakes
 * @param {Life} life
 */
async function startInbox({ port }, { startMail }, life) {
  const mail = await startMail({ port: await findFreePort(port < 65_535 ? port + 1 : 0), smtpPort: 0 })
  life.onEnd(() => mail.close())
  return mail
}

/**
 * Says that whatever the database of a data folder holds is to be thrown away at the next start.
 * @param {string} dataDir
 */
export function markForReset(dataDir) {
  mkdirSync(dataDir, { recursive: true, mode: 0o700 })
  writeFileSync(join(dataDir, 'seeding'), '')
}

/**
 * Our own MariaDB, brought to the newest tables, and for a demo filled; gives the address the app uses.
 * @param {Installation} installation
 * @param {Parts} parts
 * @param {Life} life
 */
export async function ownDatabase(installation, parts, life) {
  const database = await inStep('Starting the database', tell =>
    startDatabase({ folder: join(installation.dataDir, 'database'), onStep: tell, onLoss: console.error }),
  )
  life.onEnd(database.stop, database.stopNow)
  const { ownerUrl, appUrl } = database
  const half = join(installation.dataDir, 'seeding')
  if (existsSync(half)) await emptyDatabase(ownerUrl)
  await migrate(ownerUrl, parts)
  await parts.grantApp({ ownerUrl, appUser })
  if (installation.demo && (await parts.isEmpty({ databaseUrl: appUrl }))) {
    // a demo that was broken off is thrown away at the next start, and made whole
    markForReset(installation.dataDir)
    await fill(installation, appUrl, parts)
    rmSync(half)
  }
  return appUrl
}

/**
 * Takes a database apart and makes it anew, without tables.
 * @param {string} ownerUrl
 */
export async function emptyDatabase(ownerUrl) {
  const name = new URL(ownerUrl).pathname.slice(1)
  const connection = await createConnection(ownerUrl)
  try {
    await connection.query(`DROP DATABASE \`${name}\``)
    await connection.query(`CREATE DATABASE \`${name}\``)
  } finally {
    await connection.end()
  }
}

/**
 * A database given by its address: its tables change only when that was asked for.
 * @param {Installation} installation
 * @param {string} url
 * @param {Parts} parts
 */
async function givenDatabase(installation, url, parts) {
  const { host } = new URL(url)
  await createConnection({ uri: url, connectTimeout: 5_000 }).then(
    connection => connection.end(),
    error => {
      throw new Problem(
        `DATABASE_URL: the database at ${host} cannot be used (${error.message || error.code}). Start it or mend user and password, ` +
          'or leave DATABASE_URL out to use a database of our own.',
      )
    },
  )
  if (installation.migrate) await migrate(url, parts)
  const isEmpty = await parts.isEmpty({ databaseUrl: url }).catch(error => {
    if (error.errno !== 1146) throw error
    throw new Problem(
      `DATABASE_URL: the database at ${host} has no tables of Cragfettle yet. To let them be made there: MIGRATE=1 npm start`,
    )
  })
  if (isEmpty && installation.demo && installation.migrate) await fill(installation, url, parts)
  return url
}

/**
 * @param {string} ownerUrl
 * @param {Parts} parts
 */
function migrate(ownerUrl, parts) {
  return inStep('Bringing the tables up to date', tell => parts.migrateDatabase({ ownerUrl, onStep: tell }))
}

/**
 * @param {Installation} installation
 * @param {string} databaseUrl
 * @param {Parts} parts
 */
function fill({ photoDir, clockAt }, databaseUrl, parts) {
  const now = clockAt === null ? new Date() : new Date(clockAt)
  return inStep('Making the demo', tell => parts.seed({ databaseUrl, photoDir, now, onStep: tell }))
}
