import { chmodSync, chownSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { mustRun } from '../command.mjs';

/** The role and the database of the private cluster. */
export const roleName = 'oriel';
export const databaseName = 'oriel';

/**
 * Makes the cluster with one role, known by its password alone, and one database. It appears under its name only when whole,
 * so that a start killed halfway leaves nothing that looks finished.
 * @param {{ bin: string, cluster: string, password: string, owner: { uid?: number, gid?: number }, signal?: AbortSignal }} options
 */
export async function makeCluster({ bin, cluster, password, owner, signal }) {
  const unfinished = `${cluster}.unfinished`;
  const passwordFile = join(dirname(cluster), 'password.unfinished');
  rmSync(unfinished, { recursive: true, force: true });
  rmSync(passwordFile, { force: true });
  mkdirSync(unfinished, { recursive: true, mode: 0o700 });
  chmodSync(dirname(cluster), 0o711);
  writeFileSync(passwordFile, password, { mode: 0o600 });
  for (const path of [unfinished, passwordFile]) if (owner.uid !== undefined) chownSync(path, owner.uid, owner.gid);

  const as = { ...owner, cwd: '/', signal };
  const choices = [
    '--encoding=UTF8',
    '--locale=C.UTF-8',
    '--auth=scram-sha-256',
    `--username=${roleName}`,
    `--pwfile=${passwordFile}`,
  ];
  try {
    // --no-sync: the first start is followed by a checkpoint that writes everything.
    await mustRun(join(bin, 'initdb'), ['-D', unfinished, '--no-instructions', '--no-sync', ...choices], as);
  } finally {
    rmSync(passwordFile, { force: true });
  }
  const made = await mustRun(join(bin, 'postgres'), ['--single', '-D', unfinished, 'template1'], {
    ...as,
    input: `create database ${databaseName}\n`,
  });
  if (made.includes('ERROR')) throw new Error(`PostgreSQL could not make the database:\n${made}`);
  renameSync(unfinished, cluster);
}
