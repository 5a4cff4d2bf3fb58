import { createHash } from 'node:crypto'
import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { inStep } from './progress.mjs'
import { runOrFail } from './run.mjs'

const stamp = 'node_modules/.cragfettle-installed'

/**
 * Installs the npm packages when those there are not the ones of package-lock.json. Gives whether it did.
 * @returns {Promise<boolean>}
 */
export async function installPackages() {
  const wanted = `${createHash('sha256').update(readFileSync('package-lock.json')).digest('hex')} ${process.version}`
  if (readStamp() === wanted) return false
  if (!existsSync(stamp) && isCurrent()) {
    writeFileSync(stamp, wanted)
    return false
  }
  await inStep('Installing npm packages', tell =>
    runOrFail('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], { onLine: line => tell(line) }),
  )
  writeFileSync(stamp, wanted)
  return true
}

function readStamp() {
  return existsSync(stamp) ? readFileSync(stamp, 'utf8') : null
}

/** Whether npm itself, called by hand, has installed exactly what package-lock.json lists. */
function isCurrent() {
  const file = 'node_modules/.package-lock.json'
  if (!existsSync(file)) return false
  /** @param {string} path @returns {Record<string, { version?: string, optional?: boolean }>} */
  const read = path => JSON.parse(readFileSync(path, 'utf8')).packages
  const installed = read(file)
  return Object.entries(read('package-lock.json')).every(
    ([name, { version, optional }]) => name === '' || optional || installed[name]?.version === version,
  )
}
