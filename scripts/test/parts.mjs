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

/** One project of playwright.config.ts, with a report of its own. */
const endToEnd = (project) => {
  const file = report(`end-to-end-${project}`);
  const command = tool(
    '@playwright/test/cli.js',
    'test',
    '--config=tests/e2e/playwright.config.ts',
    `--project=${project}`,
  );
  const part = tests(file, countPlaywright, command);
  return ({ env, signal }) => part({ env: { ...env, PLAYWRIGHT_JSON_OUTPUT_FILE: file }, signal });
};

async function build({ signal }) {
  try {
    await buildProduct(signal);
    return { code: 0, output: '', counts: none };
  } catch (error) {
    return { code: 1, output: error.message, counts: none };
  }
}

/** @typedef {{ name: string, run: (context: Context) => Promise<Result> }} Part */

/** @type {Part} */
const lint = { name: 'Lint', run: gate(tool('eslint/bin/eslint.js', '.', '--max-warnings', '0')) };

/** @type {Part} */
const types = {
  name: 'Types',
  run: gate(
    ...['tsconfig.json', 'tsconfig.app.json', 'tsconfig.worker.json', 'tsconfig.spec.json'].map((project) =>
      tool('typescript/bin/tsc', '-p', project, '--noEmit'),
    ),
  ),
};

/** @type {Part} */
const mathematicsAndServer = {
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
};

/** @type {Part} */
const components = {
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
};

/**
 * What `npm test` does: one stage after another, in each the lanes side by side, in a lane one part after another. The tests of the
 * server wait for clocks half the time, which leaves a core to compilers; what a camera sees is timed, and has the machine to itself.
 * @type {readonly (readonly (readonly Part[])[])[]}
 */
export const stages = [
  [
    [mathematicsAndServer, lint],
    [{ name: 'Production build', run: build }, types, components],
  ],
  [[{ name: 'End to end, pages', run: endToEnd('page') }]],
  [[{ name: 'End to end, camera', run: endToEnd('camera') }]],
];
