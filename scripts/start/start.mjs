import { mkdirSync } from 'node:fs';
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
    const ownDatabase = !settings.DATABASE_URL;
    settings.PORT = await usablePort(settings, signal);

    // First, for on a machine without PostgreSQL an ordinary user learns here what to install.
    if (ownDatabase) {
      const open = (say) => startPostgres({ dataDir: inProject('.oriel', 'postgres'), say, signal });
      const postgres = await steps.step('Starting the database', open);
      running.push(postgres);
      settings.DATABASE_URL = postgres.url;
    }
    if (!dependenciesInstalled()) await steps.step('Installing the packages', () => installDependencies(signal));
    if (!productBuilt()) await steps.step('Building', () => buildProduct(signal));
    // Photographs of a household: nobody else on this machine may look.
    mkdirSync(settings.STORAGE_DIR, { recursive: true, mode: 0o700 });
    const logFile = inProject('.oriel', 'server.log');
    const server = await steps.step('Starting the server', () =>
      startServer({ settings, logFile, signal }).catch((error) => {
        throw ownDatabase ? error : aboutGivenDatabase(error);
      }),
    );
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

/** Names the setting where the server could not use the database it was given. */
function aboutGivenDatabase(error) {
  const database =
    /ECONNREFUSED|ENOTFOUND|ETIMEDOUT|EHOSTUNREACH|timeout|authentication failed|does not exist|permission denied/;
  if (!database.test(error.message)) return error;
  return new Error(
    `The database at DATABASE_URL cannot be used. Check that address, or leave it out for a private one.\n${error.message}`,
  );
}
