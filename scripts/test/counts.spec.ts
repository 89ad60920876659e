import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { countPlaywright, countVitest } from './counts.mjs';

const folder = mkdtempSync(join(tmpdir(), 'oriel-counts-'));

function report(content: object): string {
  const file = join(folder, `${Math.random()}.json`);
  writeFileSync(file, JSON.stringify(content));
  return file;
}

// The shapes below are those of reports written by Vitest 4.1 and Playwright 1.65 (read).
test('vitest: passed and failed tests, and a file that could not be loaded', () => {
  const testResults = [
    { status: 'passed', assertionResults: [{ status: 'passed' }, { status: 'passed' }, { status: 'skipped' }] },
    { status: 'failed', assertionResults: [{ status: 'failed' }] },
    { status: 'failed', assertionResults: [], message: 'Cannot find module' },
  ];
  expect(countVitest(report({ numPassedTests: 2, numFailedTests: 1, testResults }))).toEqual({ passed: 2, failed: 2 });
});

test('playwright: what was expected, what was not, what came right only at the second try, and errors in the set-up', () => {
  const stats = { expected: 7, unexpected: 1, flaky: 1, skipped: 3 };
  expect(countPlaywright(report({ stats, errors: [{ message: 'no server' }] }))).toEqual({ passed: 7, failed: 3 });
});

test('a report that was never written counts nothing', () => {
  expect(countVitest(join(folder, 'none.json'))).toEqual({ passed: 0, failed: 0 });
});
