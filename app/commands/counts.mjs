/** @typedef {{ passed: number, failed: number, failures: string[] }} Counts */

/**
 * What a run of the unit tests came to, by its report: a file that could not even be loaded counts as one failure,
 * and so does an error outside of every test.
 * @param {any} report as written by Vitest's json reporter, or null when it wrote none
 * @param {number | null} code the exit code of the run
 * @returns {Counts}
 */
export function countVitest(report, code) {
  if (report === null) return fault('the tests could not be run')
  /** @type {{ name: string, status: string, message?: string, assertionResults: any[] }[]} */
  const files = report.testResults
  const results = files.flatMap(file => file.assertionResults)
  const failures = [
    ...results.filter(each => each.status === 'failed').map(each => each.fullName),
    ...files
      .filter(
        file => file.status === 'failed' && !file.assertionResults.some(each => each.status === 'failed'),
      )
      .map(file => `${file.name}: ${file.message || 'could not be loaded'}`),
  ]
  return settle(results.filter(each => each.status === 'passed').length, failures, code)
}

/**
 * What a run of the browser journeys came to. One that passed only when tried again counts as failed.
 * @param {any} report as written by Playwright's json reporter, or null when it wrote none
 * @param {number | null} code
 * @returns {Counts}
 */
export function countPlaywright(report, code) {
  if (report === null) return fault('the journeys could not be run')
  const tests = listSpecs(report.suites ?? [])
  const failures = [
    ...tests.filter(each => each.status === 'unexpected' || each.status === 'flaky').map(each => each.title),
    ...(report.errors ?? []).map((/** @type {any} */ error) => String(error.message ?? error)),
  ]
  return settle(tests.filter(each => each.status === 'expected').length, failures, code)
}

/**
 * @param {any[]} suites
 * @returns {{ title: string, status: string }[]}
 */
function listSpecs(suites) {
  return suites.flatMap(suite => [
    ...(suite.specs ?? []).flatMap((/** @type {any} */ spec) =>
      spec.tests.map((/** @type {any} */ test) => ({
        title: `${test.projectName}: ${spec.title}`,
        status: test.status,
      })),
    ),
    ...listSpecs(suite.suites ?? []),
  ])
}

/**
 * A check that either holds or does not, such as the types.
 * @param {number | null} code
 * @param {string} title
 * @returns {Counts}
 */
export function countCheck(code, title) {
  return code === 0 ? { passed: 1, failed: 0, failures: [] } : fault(title)
}

/**
 * Sums up parts: nothing at all counts as a failure, so that an empty run never looks good.
 * @param {Counts[]} parts
 * @returns {Counts}
 */
export function sumCounts(parts) {
  const passed = parts.reduce((sum, part) => sum + part.passed, 0)
  const failures = parts.flatMap(part => part.failures)
  return settle(passed, failures, 0)
}

/**
 * @param {number} passed
 * @param {string[]} failures
 * @param {number | null} code
 * @returns {Counts}
 */
function settle(passed, failures, code) {
  if (failures.length > 0) return { passed, failed: failures.length, failures }
  if (passed === 0) return fault('nothing was run')
  if (code !== 0) return { passed, ...onlyFault('an error outside of every test') }
  return { passed, failed: 0, failures: [] }
}

/** @param {string} title */
const onlyFault = title => ({ failed: 1, failures: [title] })

/**
 * @param {string} title
 * @returns {Counts}
 */
function fault(title) {
  return { passed: 0, ...onlyFault(title) }
}
