import { accessSync, constants } from 'node:fs'
import { join } from 'node:path'

/**
 * The full path of a program, or null; servers stand in folders that are not on everybody's PATH.
 * @param {string} name
 */
export function findProgram(name) {
  const folders = [...(process.env.PATH ?? '').split(':'), '/usr/local/bin', '/usr/bin', '/usr/sbin', '/sbin']
  return folders.map(folder => join(folder, name)).find(isExecutable) ?? null
}

/** @param {string} file */
function isExecutable(file) {
  try {
    accessSync(file, constants.X_OK)
    return true
  } catch {
    return false
  }
}
