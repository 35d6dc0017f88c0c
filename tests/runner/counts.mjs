import { readFileSync } from 'node:fs'

const FAILED_TO_REPORT = { passed: 0, failed: 1 }

/** Reads a report, or counts one failure when there is none: a runner that crashed has not passed. */
function readReport(file, count) {
  try {
    return count(JSON.parse(readFileSync(file, 'utf8')))
  } catch {
    return FAILED_TO_REPORT
  }
}

/** A run that ended badly without a failed test, or that ran nothing, is a failure of its own. */
const honest = ({ passed, failed }, exitCode) => ({ passed, failed: failed === 0 && (exitCode !== 0 || passed === 0) ? 1 : failed })

/** One check, judged by its exit code. */
export const countCheck = (exitCode) => (exitCode === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 })

/** Vitest's JSON report. A file that could not be loaded has no tests and counts as one failure; a skipped test proves nothing. */
export function countVitest(file, exitCode) {
  return honest(
    readReport(file, (report) => {
      const unloaded = report.testResults.filter((suite) => suite.status === 'failed' && !suite.assertionResults.some(({ status }) => status === 'failed'))
      return { passed: report.numPassedTests, failed: report.numTotalTests - report.numPassedTests + unloaded.length }
    }),
    exitCode,
  )
}

/** Playwright's JSON report. A test that passed only at a second try has failed. */
export function countPlaywright(file, exitCode) {
  const count = ({ stats, errors }) => ({ passed: stats.expected, failed: stats.unexpected + stats.flaky + stats.skipped + errors.length })
  return honest(readReport(file, count), exitCode)
}
