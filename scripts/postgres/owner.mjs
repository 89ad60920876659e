import { randomBytes } from 'node:crypto';
import { existsSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { run } from '../command.mjs';

/**
 * Who runs the database server. PostgreSQL refuses to run as root, so root hands over to the postgres user that Debian's package made.
 * A folder that is there already decides: whoever owns it.
 * @param {string | null} existing a data folder made earlier
 * @returns {Promise<{ uid?: number, gid?: number }>} empty: as whoever runs this process
 */
export async function serverOwner(existing) {
  if (process.getuid?.() !== 0) return {};
  if (existing && existsSync(existing)) {
    const { uid, gid } = statSync(existing);
    if (uid !== 0) return { uid, gid };
  }
  const ids = await Promise.all(['-u', '-g'].map((flag) => run('id', [flag, 'postgres'])));
  if (ids.some(({ code }) => code !== 0)) {
    throw new Error(
      'PostgreSQL refuses to run as root and there is no user named postgres to run it. Start Oriel as an ordinary user.',
    );
  }
  const [uid, gid] = ids.map(({ output }) => Number(output));
  return { uid, gid };
}

/**
 * Where the cluster goes: inside `wanted`, or, where its owner cannot reach that (a clone under root's home), in a folder of its own.
 * @param {string} wanted
 * @param {{ uid?: number, gid?: number }} owner
 */
export async function reachableFolder(wanted, owner) {
  if (owner.uid === undefined) return join(wanted, 'cluster');
  const { code } = await run('/usr/bin/test', ['-x', wanted], { ...owner, cwd: '/' });
  if (code === 0) return join(wanted, 'cluster');
  const home = '/var/lib/postgresql';
  const base = existsSync(home) ? home : tmpdir();
  return join(base, `oriel-${randomBytes(6).toString('hex')}`, 'cluster');
}
