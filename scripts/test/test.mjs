import { mkdirSync, rmSync } from 'node:fs';
import { lastLines } from '../command.mjs';
import { dependenciesInstalled, installDependencies } from '../dependencies.mjs';
import { startPostgres } from '../postgres.mjs';
import { inProject } from '../project.mjs';
import { stepsOn } from '../steps.mjs';
import { stopSignal } from '../stop-signal.mjs';
import { installPrograms, programsPresent } from './programs.mjs';
import { stages } from './parts.mjs';

const partMs = 30 * 60_000;

/**
 * `npm test`: everything, to the end, whatever fails on the way. The last line counts the tests.
 * @returns {Promise<number>} the exit code: 0 only where tests ran and none failed
 */
export async function test() {
  const { signal } = stopSignal();
  const { step, write } = stepsOn(process.stdout);
  const total = { passed: 0, failed: 0 };
  let postgres = null;

  const startDatabase = async () => {
    if (!programsPresent()) await step('Installing programs', (say) => installPrograms({ say, signal }));
    postgres = await step('Starting the database', (say) =>
      startPostgres({ dataDir: inProject('.oriel', 'test-postgres'), durable: false, say, signal }),
    );
  };
  const installPackages = async () => {
    if (!dependenciesInstalled()) await step('Installing the packages', () => installDependencies(signal));
  };
  const runLane = async (lane, env) => {
    for (const part of lane) {
      const { passed, failed } = await step(part.name, () => runPart(part, { env, signal, write }), outcome(part));
      total.passed += passed;
      total.failed += failed;
    }
  };

  try {
    await together([startDatabase(), installPackages()]);
    const { FORCE_COLOR: _forced, ...uncoloured } = process.env;
    const env = {
      ...uncoloured,
      CI: 'true',
      NG_CLI_ANALYTICS: 'false',
      NO_COLOR: '1',
      TEST_DATABASE_URL: postgres.url,
    };
    rmSync(inProject('.oriel', 'reports'), { recursive: true, force: true });
    mkdirSync(inProject('.oriel', 'reports'), { recursive: true });
    for (const lanes of stages) await together(lanes.map((lane) => runLane(lane, env)));
  } catch (error) {
    total.failed += 1;
    process.stdout.write(`\n${error.message}\n`);
  } finally {
    await postgres?.stop();
  }
  process.stdout.write(`${total.passed} passed, ${total.failed} failed\n`);
  return total.failed === 0 && total.passed > 0 ? 0 : 1;
}

/** Waits for all of them, so that nothing goes on unwatched, and throws what the first that failed threw. */
async function together(works) {
  const failed = (await Promise.allSettled(works)).find(({ status }) => status === 'rejected');
  if (failed) throw failed.reason;
}

/** Runs one part and tells what it found. A part that fails although no test of it did counts as one failed. */
async function runPart({ name, run }, { env, signal, write }) {
  const limit = AbortSignal.timeout(partMs);
  const result = await run({ env, signal: AbortSignal.any([signal, limit]) }).catch((error) => {
    if (signal.aborted) throw error;
    return {
      code: 1,
      output: limit.aborted ? `not done within ${partMs / 60_000} minutes` : error.message,
      counts: { passed: 0, failed: 0 },
    };
  });
  const { passed } = result.counts;
  const failed = result.code === 0 ? result.counts.failed : Math.max(1, result.counts.failed);
  if (failed > 0) write(`\n${name}:\n\n${lastLines(result.output, 200)}\n`);
  return { passed, failed, secondTry: result.counts.secondTry };
}

/** @param {{ name: string }} part */
const outcome =
  ({ name }) =>
  ({ passed, failed, secondTry = [] }) =>
    [
      `${failed > 0 ? '✗' : '✓'} ${name}${passed + failed > 0 ? `: ${passed} passed, ${failed} failed` : ''}`,
      ...secondTry.map((title) => `at the second try only: ${title}`),
    ].join('; ');
