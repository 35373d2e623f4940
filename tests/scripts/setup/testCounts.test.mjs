import { expect, it } from 'vitest'
import { add, closingLine, countsOf } from '../../../scripts/setup/testCounts.mjs'

const file = (...outcomes) => ({
  status: outcomes.includes('failed') ? 'failed' : 'passed',
  assertionResults: outcomes.map((status) => ({ status })),
})
const broken = (...outcomes) => ({ ...file(...outcomes), status: 'failed' })
const report = (...testResults) => {
  const count = (wanted) =>
    testResults.flatMap((one) => one.assertionResults).filter(({ status }) => status === wanted).length
  return { numPassedTests: count('passed'), numFailedTests: count('failed'), testResults }
}

it('counts what passed and failed', () => {
  expect(countsOf(report(file('passed', 'passed'), file('failed', 'passed')), 1)).toEqual({
    passed: 3,
    failed: 1,
  })
})

it('counts a file that could not be loaded, or whose clearing up broke, as a failure', () => {
  expect(countsOf(report(file('passed'), broken()), 1)).toEqual({ passed: 1, failed: 1 })
  expect(countsOf(report(broken('passed')), 1)).toEqual({ passed: 1, failed: 1 })
})

it('counts a run that ended badly though every test passed, or left no report, as a failure', () => {
  expect(countsOf(report(file('passed')), 1)).toEqual({ passed: 1, failed: 1 })
  expect(countsOf(null, 0)).toEqual({ passed: 0, failed: 1 })
})

it('ends with the line that is asked for', () => {
  expect(closingLine(add({ passed: 2, failed: 0 }, { passed: 5, failed: 1 }))).toBe('7 passed, 1 failed')
})
