import { existsSync, readFileSync } from 'node:fs';

/** @typedef {{ passed: number, failed: number }} Counts */

/**
 * Vitest's JSON report (that of Jest). A file that could not be loaded holds no tests and counts as one failed.
 * @param {string} file @returns {Counts}
 */
export function countVitest(file) {
  const report = read(file);
  if (!report) return nothing;
  const broken = report.testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && assertionResults.length === 0,
  );
  return { passed: report.numPassedTests, failed: report.numFailedTests + broken.length };
}

/**
 * Playwright's JSON report. An error outside any test, as in the set-up, counts as one failed, and so does a test that
 * came right only when it was tried again.
 * @param {string} file @returns {Counts}
 */
export function countPlaywright(file) {
  const report = read(file);
  if (!report) return nothing;
  const { expected, unexpected, flaky } = report.stats;
  return { passed: expected, failed: unexpected + flaky + report.errors.length };
}

const nothing = { passed: 0, failed: 0 };

const read = (file) => (existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null);
