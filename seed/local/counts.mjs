import { existsSync, readFileSync } from 'node:fs'

/** @typedef {{ passed: number, failed: number }} Count */

/** One check that passed or failed as a whole. @returns {Count} */
export const single = (passed) => ({ passed: passed ? 1 : 0, failed: passed ? 0 : 1 })

/** @param {Count[]} counts */
export const sum = (counts) => ({
  passed: counts.reduce((total, count) => total + count.passed, 0),
  failed: counts.reduce((total, count) => total + count.failed, 0),
})

const readReport = (file) => (existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : undefined)

/** A run that ended badly without any failed test has failed all the same: it found no tests, or broke outside them. */
function withExitCode({ passed, failed }, code) {
  return { passed, failed: code !== 0 && failed === 0 ? 1 : failed }
}

/** Counts a report of Vitest. A file that could not be loaded counts as one failed test. @returns {Count} */
export function countVitest(file, code) {
  const report = readReport(file)
  if (!report) return single(false)
  const unloaded = report.testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && !assertionResults.some((test) => test.status === 'failed'),
  )
  return withExitCode({ passed: report.numPassedTests, failed: report.numFailedTests + unloaded.length }, code)
}

/** Counts a report of Playwright. A test that passed only when tried again counts as failed. @returns {Count} */
export function countPlaywright(file, code) {
  const report = readReport(file)
  if (!report) return single(false)
  const { expected, unexpected, flaky } = report.stats
  return withExitCode({ passed: expected, failed: unexpected + flaky + report.errors.length }, code)
}
