import { accessSync, constants, existsSync, mkdirSync, statSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { claimFolder } from './database-folder.mjs'
import { Problem } from './problem.mjs'

/**
 * Makes sure, before anything long is begun, that the folders of an installation are there and can be written to, and
 * that no other start works on them. The database's folder counts only when the database is our own.
 * @param {{ dataDir: string, photoDir: string, databaseUrl: string | null }} installation
 */
export async function requireFolders({ dataDir, photoDir, databaseUrl }) {
  requireFolder('DATA_DIR', dataDir, 'DATA_DIR=.data')
  requireFolder('PHOTO_DIR', photoDir, 'PHOTO_DIR=.data/photos')
  if (databaseUrl === null) await claimFolder(join(dataDir, 'database'))
}

/**
 * @param {string} name
 * @param {string} folder
 * @param {string} example
 */
function requireFolder(name, folder, example) {
  try {
    makeFolder(folder)
    accessSync(folder, constants.R_OK | constants.W_OK | constants.X_OK)
  } catch (error) {
    throw new Problem(`${name} is "${folder}", but ${toWords(error)}, for example: ${example}`)
  }
}

/**
 * Level by level: asked for a whole path, Node 20 never comes back where the kernel refuses new folders, as in /proc.
 * @param {string} folder
 */
function makeFolder(folder) {
  if (!existsSync(folder)) {
    makeFolder(dirname(folder))
    mkdirSync(folder, { mode: 0o700 })
  } else if (!statSync(folder).isDirectory()) {
    throw Object.assign(new Error(`${folder} is a file`), { code: 'ENOTDIR' })
  }
}

/** @param {any} error */
function toWords({ code, message }) {
  if (code === 'ENOTDIR') return 'there is a file in its place; name a folder'
  if (code === 'EACCES' || code === 'EPERM' || code === 'EROFS')
    return `you may not write there (${code}); name a folder of your own`
  return `it cannot be made (${message}); name another folder`
}
