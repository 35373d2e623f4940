/**
 * Passed and failed of a vitest run from its JSON report, null when it wrote none. A file that could not be loaded
 * holds no tests and counts as one failure; so does a run that ended badly though every test passed.
 */
export function countsOf(report, status) {
  if (report === null) return { passed: 0, failed: 1 }
  const brokenFiles = report.testResults.filter(
    ({ status: outcome, assertionResults }) =>
      outcome === 'failed' && assertionResults.every((result) => result.status !== 'failed'),
  ).length
  const failed = report.numFailedTests + brokenFiles
  return { passed: report.numPassedTests, failed: failed === 0 && status !== 0 ? 1 : failed }
}

export const add = (left, right) => ({
  passed: left.passed + right.passed,
  failed: left.failed + right.failed,
})

export const closingLine = ({ passed, failed }) => `${passed} passed, ${failed} failed`
