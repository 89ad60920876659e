import { existsSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';
import { lastLines, mustRun, run } from './command.mjs';

const updateTries = 6;
const environment = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };

/** Whether this process may install packages without asking anybody: root, where there is apt. */
export const mayInstall = () => process.getuid?.() === 0 && existsSync('/usr/bin/apt-get');

/**
 * Installs packages from Debian, asking nothing. Call only where `mayInstall()`.
 * @param {readonly string[]} packages
 * @param {AbortSignal} [signal]
 * @throws Error with the last lines apt printed
 */
export async function installFromDebian(packages, signal) {
  for (let tried = 1; ; tried++) {
    // Unlike install, apt-get update does not wait for the lock that another apt holds.
    const { code, output } = await run('apt-get', ['update', '-q'], { env: environment, signal });
    if (code === 0) break;
    if (tried === updateTries) throw new Error(`apt-get update failed:\n${lastLines(output, 8)}`);
    await pause(tried * 1500, undefined, { signal });
  }
  const options = ['-o', 'DPkg::Lock::Timeout=300', '-y', '-q', '--no-install-recommends'];
  await mustRun('apt-get', ['install', ...options, ...packages], { env: environment, signal });
}

/** Installs PostgreSQL without the cluster that Debian would otherwise make and start on port 5432. */
export async function installPostgresFromDebian(signal) {
  await installFromDebian(['postgresql-common'], signal);
  await mustRun('pg_conftool', ['/etc/postgresql-common/createcluster.conf', 'set', 'create_main_cluster', 'false'], {
    signal,
  });
  await installFromDebian(['postgresql'], signal);
}
