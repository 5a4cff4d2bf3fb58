import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'

/** What the build is made from. */
export const buildSources = [
  'app',
  'drizzle',
  'fakes',
  'tiles',
  'public',
  'package-lock.json',
  'vite.config.ts',
  'react-router.config.ts',
  'tsconfig.json',
]

/** What the ground tiles are made from. */
export const groundSources = ['tiles', 'package-lock.json']

/** Plain commands are not built: a change there needs no new build. */
const unbuilt = /^app\/commands(\/|$)/

/**
 * One hash over the names and contents of files and folders; the same sources give the same hash on every machine.
 * @param {string[]} paths
 */
export function hashSources(paths) {
  const hash = createHash('sha256').update(process.version)
  for (const file of paths.flatMap(listFiles)) hash.update(`\0${file}\0`).update(readFileSync(file))
  return hash.digest('hex')
}

/**
 * @param {string} path
 * @returns {string[]}
 */
function listFiles(path) {
  if (unbuilt.test(path) || !existsSync(path)) return []
  if (!statSync(path).isDirectory()) return [path]
  return readdirSync(path)
    .sort()
    .flatMap(name => listFiles(join(path, name)))
}

/**
 * Runs `make` unless `stamp` says that it was done from these very sources and `results` are still there. The stamp
 * is written only after `make` has succeeded. Gives whether it ran.
 * @param {{ stamp: string, sources: string[], results: string[] }} what
 * @param {() => Promise<unknown>} make
 */
export async function makeWhenChanged({ stamp, sources, results }, make) {
  const wanted = hashSources(sources)
  const known = existsSync(stamp) ? readFileSync(stamp, 'utf8') : null
  if (known === wanted && results.every(result => existsSync(result))) return false
  await make()
  mkdirSync(dirname(stamp), { recursive: true })
  writeFileSync(stamp, wanted)
  return true
}
