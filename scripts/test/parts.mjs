import { buildProduct } from '../build/product.mjs';
import { run } from '../command.mjs';
import { inProject, root } from '../project.mjs';
import { countPlaywright, countVitest } from './counts.mjs';

/** @typedef {import('./counts.mjs').Counts} Counts */
/** @typedef {{ env: NodeJS.ProcessEnv, signal: AbortSignal }} Context */
/** @typedef {{ code: number, output: string, counts: Counts }} Result */

const none = { passed: 0, failed: 0 };
const tool = (path, ...args) => [process.execPath, [inProject('node_modules', path), ...args]];
const report = (name) => inProject('.oriel', 'reports', `${name}.json`);

/** A part that holds no tests: it is counted only where it fails. */
const gate =
  (...commands) =>
  async (context) => {
    const results = [];
    for (const [program, args] of commands) results.push(await run(program, args, { cwd: root, ...context }));
    const failed = results.filter(({ code }) => code !== 0);
    return { code: failed.length, output: failed.map(({ output }) => output).join('\n'), counts: none };
  };

/** A part whose tests write a report. */
const tests =
  (file, count, [program, args]) =>
  async (context) => ({ ...(await run(program, args, { cwd: root, ...context })), counts: count(file) });

async function build({ signal }) {
  try {
    await buildProduct(signal);
    return { code: 0, output: '', counts: none };
  } catch (error) {
    return { code: 1, output: error.message, counts: none };
  }
}

/**
 * What `npm test` does, in order.
 * @type {readonly { name: string, run: (context: Context) => Promise<Result> }[]}
 */
export const parts = [
  { name: 'Lint', run: gate(tool('eslint/bin/eslint.js', '.', '--max-warnings', '0')) },
  {
    name: 'Types',
    run: gate(
      ...['tsconfig.json', 'tsconfig.app.json', 'tsconfig.worker.json', 'tsconfig.spec.json'].map((project) =>
        tool('typescript/bin/tsc', '-p', project, '--noEmit'),
      ),
    ),
  },
  {
    name: 'Mathematics and server',
    run: tests(
      report('vitest'),
      countVitest,
      tool(
        'vitest/vitest.mjs',
        'run',
        '--config=tests/vitest.config.ts',
        ...['default', 'json'].map((name) => `--reporter=${name}`),
        `--outputFile.json=${report('vitest')}`,
      ),
    ),
  },
  {
    name: 'Components',
    run: tests(
      report('components'),
      countVitest,
      tool(
        '@angular/cli/bin/ng.js',
        'test',
        '--watch=false',
        '--progress=false',
        '--reporters=json',
        `--output-file=${report('components')}`,
        '--reporters=default',
      ),
    ),
  },
  { name: 'Production build', run: build },
  {
    name: 'End to end',
    run: tests(
      report('end-to-end'),
      countPlaywright,
      tool('@playwright/test/cli.js', 'test', '--config=tests/e2e/playwright.config.ts'),
    ),
  },
];
