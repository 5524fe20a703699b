import { existsSync, readFileSync } from 'node:fs'

/** @typedef {{ passed: number, failed: number }} Count */

/**
 * The counts of a vitest JSON report. A file that could not be read has no tests that failed, and still is a failure.
 * @param {{ numPassedTests: number, numFailedTests: number, testResults: Array<{ status: string, assertionResults: unknown[] }> }} report
 * @returns {Count}
 */
export function countVitest(report) {
  const unread = report.testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && assertionResults.length === 0,
  )
  return { passed: report.numPassedTests, failed: report.numFailedTests + unread.length }
}

/**
 * The counts of a Playwright JSON report. A test that passed only at a second try counts as failed; so does an error
 * outside any test.
 * @param {{ stats: { expected: number, unexpected: number, flaky: number }, errors?: unknown[] }} report
 * @returns {Count}
 */
export function countPlaywright({ stats, errors = [] }) {
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length }
}

/**
 * What a tool reported, made to agree with its exit code: one that failed without naming a test counts one failure.
 * @template T
 * @param {string} path of the report
 * @param {(report: T) => Count} count
 * @param {string | number} exitCode
 * @returns {Count}
 */
export function readCount(path, count, exitCode) {
  const found = existsSync(path) ? count(JSON.parse(readFileSync(path, 'utf8'))) : { passed: 0, failed: 0 }
  return exitCode !== 0 && found.failed === 0 ? { ...found, failed: 1 } : found
}
