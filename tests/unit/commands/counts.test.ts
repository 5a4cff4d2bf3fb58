import { expect, test } from 'vitest'
import { countCheck, countPlaywright, countVitest, sumCounts } from '../../../app/commands/counts.mjs'

const file = (status: string, assertionResults: object[], message = '') => ({
  name: 'a.test.ts',
  status,
  message,
  assertionResults,
})
const good = { status: 'passed', fullName: 'a ring holds' }
const bad = { status: 'failed', fullName: 'a ring breaks' }

test('tests that pass and fail are counted apart, and the failed ones named', () => {
  expect(countVitest({ testResults: [file('failed', [good, good, bad])] }, 1)).toEqual({
    passed: 2,
    failed: 1,
    failures: ['a ring breaks'],
  })
})

test('a test file that cannot be loaded counts as one failure', () => {
  expect(
    countVitest({ testResults: [file('passed', [good]), file('failed', [], 'no such module')] }, 1),
  ).toEqual({
    passed: 1,
    failed: 1,
    failures: ['a.test.ts: no such module'],
  })
})

test('an error outside of every test counts as a failure', () => {
  expect(countVitest({ testResults: [file('passed', [good])] }, 1)).toMatchObject({ passed: 1, failed: 1 })
})

test('a run without a report and a run of nothing are failures', () => {
  expect(countVitest(null, 0)).toMatchObject({ passed: 0, failed: 1 })
  expect(countVitest({ testResults: [] }, 0)).toMatchObject({ passed: 0, failed: 1 })
  expect(countPlaywright(null, 0)).toMatchObject({ passed: 0, failed: 1 })
  expect(sumCounts([])).toMatchObject({ passed: 0, failed: 1 })
})

test('a journey counts once per size of window, and one that needed a second try has failed', () => {
  const suites = [
    {
      suites: [
        {
          specs: [
            {
              title: 'a report is closed',
              tests: [
                { projectName: 'desktop', status: 'expected' },
                { projectName: 'phone', status: 'flaky' },
              ],
            },
          ],
        },
      ],
    },
  ]
  expect(countPlaywright({ suites }, 1)).toEqual({
    passed: 1,
    failed: 1,
    failures: ['phone: a report is closed'],
  })
})

test('the sum names the failures of every part', () => {
  expect(sumCounts([countCheck(0, 'types'), countCheck(2, 'lint'), countCheck(1, 'build')])).toEqual({
    passed: 1,
    failed: 2,
    failures: ['lint', 'build'],
  })
})
