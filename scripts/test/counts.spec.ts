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
  const spec = (title: string, status: string) => ({ title, tests: [{ status }] });
  const suites = [{ specs: [spec('steady', 'expected')], suites: [{ specs: [spec('shaky', 'flaky'), spec('broken', 'unexpected')] }] }];
  const counts = { passed: 8, failed: 2, secondTry: ['shaky'] };
  expect(countPlaywright(report({ stats, suites, errors: [{ message: 'no server' }] }))).toEqual(counts);
});

test('a report that was never written counts nothing', () => {
  expect(countVitest(join(folder, 'none.json'))).toEqual({ passed: 0, failed: 0 });
});
