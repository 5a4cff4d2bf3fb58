import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { buildApp } from './build.mjs'
import { countCheck, countPlaywright, countVitest, sumCounts } from './counts.mjs'
import { Problem } from './problem.mjs'
import { formatSeconds, showStep } from './progress.mjs'
import { runToEnd } from './run.mjs'

/** @typedef {import('./counts.mjs').Counts} Counts */
/**
 * @typedef {object} Part
 * @property {string} title
 * @property {boolean} [isTelling] whether it says itself how far it is
 * @property {(say: (line: string) => void) => Promise<Counts>} run
 */

/** @param {string} name */
const bin = name => resolve('node_modules/.bin', name)

/**
 * A part that is one program, or several one after another, and holds when each ends well.
 * @param {string} title
 * @param {string[][]} commands
 * @returns {Part}
 */
function check(title, commands) {
  return {
    title,
    async run(say) {
      for (const [name = '', ...given] of commands) {
        const { code, output } = await runToEnd(bin(name), given)
        if (code === 0) continue
        say(output.trimEnd())
        return countCheck(code, `${title}: ${name}`)
      }
      return countCheck(0, title)
    },
  }
}

/**
 * A part of Vitest's projects.
 * @param {string} project
 * @returns {Part}
 */
function tests(project) {
  return {
    title: project,
    run: say =>
      withReport(async file => {
        const given = [
          'run',
          '--project',
          project,
          '--reporter=dot',
          '--reporter=json',
          `--outputFile.json=${file}`,
        ]
        const { code, output } = await runToEnd(bin('vitest'), given, {
          env: { NODE_ENV: 'test', NO_COLOR: '1' },
        })
        const counts = countVitest(readReport(file), code)
        if (counts.failed > 0) say(output.trimEnd())
        return counts
      }),
  }
}

/** @type {Record<'types' | 'lint' | 'unused' | 'unit' | 'published' | 'integration' | 'build' | 'journeys', Part>} */
export const parts = {
  types: check('types', [['react-router', 'typegen'], ['tsc']]),
  lint: check('lint', [['biome', 'check', '--error-on-warnings']]),
  unused: check('unused code', [['knip', '--config', 'app/commands/knip.json']]),
  unit: tests('unit'),
  published: tests('published'),
  integration: tests('integration'),
  build: {
    title: 'build',
    isTelling: true,
    async run(say) {
      try {
        await buildApp()
        return countCheck(0, 'build')
      } catch (error) {
        if (!(error instanceof Problem)) throw error
        say(error.message)
        return countCheck(1, 'build')
      }
    },
  },
  journeys: {
    title: 'journeys',
    isTelling: true,
    run: say =>
      withReport(async file => {
        const given = ['test', '--config', 'tests/playwright.config.ts', '--reporter=list,json']
        const { code } = await runToEnd(bin('playwright'), given, {
          onLine: say,
          env: { PLAYWRIGHT_JSON_OUTPUT_NAME: file },
        })
        return countPlaywright(readReport(file), code)
      }),
  },
}

/**
 * Runs parts one after another; one that fails does not stop the next. Prints seconds per part, what failed, and as
 * the very last line the sum.
 * @param {Part[]} list
 * @returns {Promise<Counts>}
 */
export async function runParts(list) {
  /** @type {Counts[]} */
  const all = []
  for (const part of list) {
    const { say, done } = part.isTelling ? showTelling(part.title) : showStep(part.title)
    const counts = await part.run(say).catch(error => {
      say(error.stack)
      return countCheck(1, part.title)
    })
    done(`${counts.passed} passed, ${counts.failed} failed`)
    all.push(counts)
  }
  const sum = sumCounts(all)
  if (sum.failed > 0) console.log(`\nFailed:\n${sum.failures.map(title => `  ${title}`).join('\n')}`)
  console.log(`\n${sum.passed} passed, ${sum.failed} failed`)
  return sum
}

/**
 * The frame around a part that says itself how far it is.
 * @param {string} title
 */
function showTelling(title) {
  const began = Date.now()
  console.log(`  ${title} …`)
  return {
    /** @param {string} line */
    say: line => console.log(line),
    /** @param {string} note */
    done: note => console.log(`  ${title}: ${note}, ${formatSeconds(Date.now() - began)}`),
  }
}

/**
 * @template T
 * @param {(file: string) => Promise<T>} work
 */
async function withReport(work) {
  const folder = mkdtempSync(join(tmpdir(), 'cragfettle-report-'))
  const remove = () => rmSync(folder, { recursive: true, force: true })
  // a run that is interrupted comes to no end of its own
  process.once('exit', remove)
  try {
    return await work(join(folder, 'report.json'))
  } finally {
    process.off('exit', remove)
    remove()
  }
}

/** @param {string} file */
function readReport(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'))
  } catch {
    return null
  }
}
