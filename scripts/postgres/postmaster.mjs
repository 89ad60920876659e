import { closeSync, openSync, readFileSync, rmSync } from 'node:fs';
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { lastLines } from '../command.mjs';
import { processMark } from '../processes.mjs';

const startMs = 60_000;
const stopMs = 15_000;
const pollMs = 25;

/**
 * The server that runs on this cluster, from postmaster.pid (line 1 its process, line 4 its port, line 8 its state; PostgreSQL's
 * source, miscadmin.h). A file left by a server that is gone, even where its number now belongs to another process, gives null.
 * @param {string} cluster
 * @returns {{ pid: number, port: number, ready: boolean } | null}
 */
export function runningServer(cluster) {
  let lines;
  try {
    lines = readFileSync(join(cluster, 'postmaster.pid'), 'utf8').split('\n');
  } catch {
    return null;
  }
  const pid = Number(lines[0]);
  if (!pid || processMark(pid) === null || !worksIn(pid, cluster)) return null;
  return { pid, port: Number(lines[3]), ready: lines[7]?.trim() === 'ready' };
}

/** Told by its command line, which everybody may read, unlike its working folder. */
function worksIn(pid, cluster) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes(`\0-D\0${cluster}\0`);
  } catch {
    return process.platform !== 'linux';
  }
}

/**
 * Starts the server as a process of its own group, so that Ctrl-C in the terminal reaches it only through us.
 * @param {{ bin: string, cluster: string, port: number, owner: { uid?: number, gid?: number }, logFile: string, settings: readonly string[] }} options
 * @throws Error with the end of the server's log
 */
export async function startServer({ bin, cluster, port, owner, logFile, settings }) {
  // Left by a dead server whose number lives on (a zombie, or another process), it would keep PostgreSQL from starting; that nobody
  // still uses the data PostgreSQL checks by its shared memory as well.
  rmSync(join(cluster, 'postmaster.pid'), { force: true });
  const all = ['listen_addresses=127.0.0.1', 'unix_socket_directories=', `port=${port}`, ...settings];
  const log = openSync(logFile, 'w');
  const args = ['-D', cluster, ...all.flatMap((setting) => ['-c', setting])];
  const child = spawn(join(bin, 'postgres'), args, {
    ...owner,
    cwd: cluster,
    detached: true,
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  let failure = null;
  child.once('error', (error) => (failure = error.message));
  const ended = () => (failure ??= lastLines(readFileSync(logFile, 'utf8'), 10));
  child.once('exit', ended);
  child.unref();
  try {
    await untilReady(cluster, () => failure);
  } finally {
    child.off('exit', ended);
  }
}

/** Waits until the server takes connections. */
export async function untilReady(cluster, failed = () => null) {
  for (const end = Date.now() + startMs; Date.now() < end; await pause(pollMs)) {
    if (failed() !== null) break;
    if (runningServer(cluster)?.ready) return;
  }
  throw new Error(`PostgreSQL did not start:\n${failed() ?? `no answer within ${startMs / 1000} s`}`);
}

/** Fast shutdown (SIGINT: sessions are ended, everything is written); after 15 s an immediate one. */
export async function stopServer(cluster) {
  for (const name of ['SIGINT', 'SIGQUIT']) {
    const server = runningServer(cluster);
    if (!server) return;
    process.kill(server.pid, name);
    for (const end = Date.now() + stopMs; Date.now() < end; await pause(pollMs)) {
      if (processMark(server.pid) === null) return;
    }
  }
}
