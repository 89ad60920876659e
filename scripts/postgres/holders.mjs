import { mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { processMark } from '../processes.mjs';

const waitMs = 120_000;

/**
 * Which processes use one cluster: a file each, named by process id, holding its mark. The last one to leave stops the server,
 * and a killed one does not count.
 * @param {string} folder
 */
export function holdersIn(folder) {
  const own = join(folder, String(process.pid));
  return {
    join() {
      mkdirSync(folder, { recursive: true });
      writeFileSync(own, processMark(process.pid) ?? '');
    },
    leave: () => rmSync(own, { force: true }),
    /** Whether another living process uses it. */
    others: () =>
      readdirSync(folder).some(
        (name) =>
          Number(name) !== process.pid && processMark(Number(name)) === readFileSync(join(folder, name), 'utf8'),
      ),
  };
}

/**
 * Does `work` while no other process does work under the same lock file. A lock left by a killed process is taken over.
 * @template T @param {string} file @param {() => Promise<T>} work @returns {Promise<T>}
 */
export async function underLock(file, work) {
  const mine = `${process.pid} ${processMark(process.pid)}`;
  for (const end = Date.now() + waitMs; ; await pause(50)) {
    try {
      writeFileSync(file, mine, { flag: 'wx' });
      break;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
    }
    const [pid, mark] = readOrEmpty(file).split(' ');
    if (pid && processMark(Number(pid)) !== mark) rmSync(file, { force: true });
    if (Date.now() > end)
      throw new Error(
        `Another process (${pid}) has been starting or stopping PostgreSQL for two minutes. End it and try again.`,
      );
  }
  try {
    return await work();
  } finally {
    rmSync(file, { force: true });
  }
}

function readOrEmpty(file) {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return '';
  }
}
