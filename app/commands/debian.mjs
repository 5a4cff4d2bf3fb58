import { accessSync, constants } from 'node:fs'
import { join } from 'node:path'
import { Problem } from './problem.mjs'
import { inStep } from './progress.mjs'
import { runOrFail, runToEnd } from './run.mjs'

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

/** What the product needs of Debian: the programs looked for, and the packages they come in. */
const needs = {
  database: {
    programs: ['mariadbd', 'mariadb-install-db', 'mariadb-dump'],
    packages: ['mariadb-server-core', 'mariadb-client'],
  },
  browser: { programs: ['chromium'], packages: ['chromium'] },
}

/**
 * Installs the Debian packages of what is missing, when root or sudo without a password allow it; else a Problem
 * gives the one command to run.
 * @param {(keyof typeof needs)[]} wanted
 */
export async function installDebian(wanted) {
  const packages = listMissing(wanted)
  if (packages.length === 0) return
  const install = ['apt-get', 'install', '-y', '--no-install-recommends', ...packages]
  const byHand = `sudo apt-get update && sudo ${install.join(' ')}`
  const as = await findRight()
  if (findProgram('apt-get') === null || as === null)
    throw new Problem(
      `${packages.join(', ')} must be installed first. Run this, then the same command again:\n\n  ${byHand}\n`,
    )
  /** @param {string[]} command @param {(line: string) => void} tell */
  const run = ([program, ...given], tell) => {
    const [first = '', ...rest] = [...as, program ?? '', ...given]
    return runOrFail(first, rest, { onLine: tell, env: { DEBIAN_FRONTEND: 'noninteractive' } })
  }
  await inStep(`Installing ${packages.join(', ')}`, async tell => {
    await run(['apt-get', 'update'], tell)
    await run(install, tell)
  })
  const missing = listMissing(wanted)
  if (missing.length > 0)
    throw new Problem(
      `${missing.join(', ')} is installed, but its programs are not found on PATH: ${process.env.PATH}`,
    )
}

/**
 * The packages whose programs are not all there.
 * @param {(keyof typeof needs)[]} wanted
 */
function listMissing(wanted) {
  return wanted
    .map(name => needs[name])
    .filter(({ programs }) => programs.some(program => findProgram(program) === null))
    .flatMap(need => need.packages)
}

/** What stands before a command to run it as root: nothing, sudo, or null when neither is allowed. */
async function findRight() {
  if (process.getuid?.() === 0) return []
  const sudo = findProgram('sudo')
  if (sudo === null) return null
  // sudo drops the environment, so apt's own switch goes with it
  const allowed = await runToEnd(sudo, ['-n', 'true'])
  return allowed.code === 0 ? [sudo, '-n', 'env', 'DEBIAN_FRONTEND=noninteractive'] : null
}
