import { buildProduct, productBuilt } from '../build/product.mjs';
import { dependenciesInstalled, installDependencies } from '../dependencies.mjs';
import { startPostgres } from '../postgres.mjs';
import { inProject } from '../project.mjs';
import { stepsOn } from '../steps.mjs';
import { stopSignal } from '../stop-signal.mjs';
import { greeting } from './greeting.mjs';
import { startServer } from './server.mjs';
import { readSettings } from './settings.mjs';
import { usablePort } from './port.mjs';

/**
 * `npm start`: from a bare clone to a served page, and down again.
 * @returns {Promise<number>} the exit code
 */
export async function start() {
  const { signal, stopped } = stopSignal();
  const steps = stepsOn(process.stdout);
  const running = [];
  try {
    const settings = readSettings();
    settings.PORT = await usablePort(settings, signal);

    const install = async () => {
      if (!dependenciesInstalled()) await steps.step('Installing the packages', () => installDependencies(signal));
      if (!productBuilt()) await steps.step('Building', () => buildProduct(signal));
    };
    await install();
    if (!settings.DATABASE_URL) {
      const open = (say) => startPostgres({ dataDir: inProject('.oriel', 'postgres'), say, signal });
      const postgres = await steps.step('Starting the database', open);
      running.push(postgres);
      settings.DATABASE_URL = postgres.url;
    }
    const logFile = inProject('.oriel', 'server.log');
    const server = await steps.step('Starting the server', () => startServer({ settings, logFile, signal }));
    running.push(server);
    process.stdout.write(`${greeting(settings, steps.elapsed())}\n`);

    const ended = await Promise.race([stopped, server.ended]);
    if (ended === undefined) return 0;
    throw new Error(`The server ended by itself (exit code ${ended}). Its log: ${logFile}`);
  } catch (error) {
    if (signal.aborted) return 130;
    process.stderr.write(`\n${error.message}\n`);
    return 1;
  } finally {
    for (const part of running.reverse()) await part.stop();
    if (signal.aborted) process.stdout.write('Stopped.\n');
  }
}
