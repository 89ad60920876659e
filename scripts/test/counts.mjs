import { existsSync, readFileSync } from 'node:fs';

/** @typedef {{ passed: number, failed: number, secondTry?: readonly string[] }} Counts `secondTry`: what passed only when it was tried again */

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
 * Playwright's JSON report. An error outside any test, as in the set-up, counts as one failed; a test that came right only
 * when it was tried again has passed, and is named.
 * @param {string} file @returns {Counts}
 */
export function countPlaywright(file) {
  const report = read(file);
  if (!report) return nothing;
  const { expected, unexpected, flaky } = report.stats;
  return { passed: expected + flaky, failed: unexpected + report.errors.length, secondTry: flakyIn(report) };
}

/** @returns {string[]} their titles */
const flakyIn = ({ suites = [], specs = [] }) => [
  ...suites.flatMap(flakyIn),
  ...specs.filter(({ tests }) => tests.some(({ status }) => status === 'flaky')).map(({ title }) => title),
];

const nothing = { passed: 0, failed: 0 };

const read = (file) => (existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null);
