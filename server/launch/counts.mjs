import { existsSync, readFileSync } from 'node:fs';

/** @typedef {{ name: string, passed: number, failed: number, ran: boolean }} Count */

/**
 * What Vitest's JSON report counted; no report, or one without a test, is a failure.
 * @param {string} name
 * @param {string} file
 * @returns {Count}
 */
export function countVitest(name, file) {
  const report = readReport(file);
  if (!report) return { name, passed: 0, failed: 1, ran: false };
  const { numPassedTests: passed, numFailedTests: failedTests, testResults } = report;
  // A file that could not be loaded has no failed test, but has failed.
  const brokenFiles = testResults.filter(
    (/** @type {any} */ result) => result.status === 'failed' && result.assertionResults.length === 0,
  );
  return settle(name, passed, failedTests + brokenFiles.length);
}

/**
 * What Playwright's JSON report counted; a test that only passed at a second try has failed.
 * @param {string} name
 * @param {string} file
 * @returns {Count}
 */
export function countPlaywright(name, file) {
  const report = readReport(file);
  if (!report) return { name, passed: 0, failed: 1, ran: false };
  const { expected, unexpected, flaky } = report.stats;
  return settle(name, expected, unexpected + flaky + (report.errors?.length ?? 0));
}

/**
 * @param {string} name
 * @param {number} passed
 * @param {number} failed
 * @returns {Count}
 */
function settle(name, passed, failed) {
  const ran = passed + failed > 0;
  return { name, passed, failed: ran ? failed : 1, ran };
}

/** @param {string} file */
function readReport(file) {
  if (!existsSync(file)) return null;
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
}

/**
 * The closing line.
 * @param {Count[]} counts
 */
export function closingLine(counts) {
  const sum = (/** @type {'passed' | 'failed'} */ key) => counts.reduce((total, count) => total + count[key], 0);
  return `tests: ${sum('passed')} passed, ${sum('failed')} failed`;
}
