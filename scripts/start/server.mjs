import { spawn } from 'node:child_process';
import { mkdirSync, openSync, closeSync, readFileSync } from 'node:fs';
import { request as plain } from 'node:http';
import { request as secure } from 'node:https';
import { dirname } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { inProject, root } from '../project.mjs';
import { whatWentWrong } from './server-log.mjs';

const readyMs = 120_000;
const stopMs = 10_000;
const pollMs = 50;

/**
 * Starts the built server as a process of its own group and waits until it is ready: migrated, demo loaded, database answering.
 * @param {{ settings: NodeJS.ProcessEnv, logFile: string, signal?: AbortSignal }} options
 * @returns {Promise<{ stop: () => Promise<void>, ended: Promise<number> }>} ended: the exit code, once it has ended by itself or not
 * @throws Error with what the server's log says
 */
export async function startServer({ settings, logFile, signal }) {
  mkdirSync(dirname(logFile), { recursive: true });
  const log = openSync(logFile, 'w', 0o600);
  const guard = pathToFileURL(inProject('scripts/start/end-with-parent.mjs')).href;
  const child = spawn(process.execPath, ['--enable-source-maps', '--import', guard, inProject('dist/server/main.js')], {
    cwd: root,
    env: settings,
    detached: true,
    stdio: ['ignore', log, log, 'ipc'],
  });
  closeSync(log);
  const ended = new Promise((resolve) => child.once('exit', (code) => resolve(code ?? 1)));
  let gone = false;
  void ended.then(() => (gone = true));
  const stop = async () => {
    child.kill('SIGTERM');
    const timer = setTimeout(() => child.kill('SIGKILL'), stopMs);
    await ended;
    clearTimeout(timer);
  };

  try {
    for (
      const end = Date.now() + readyMs;
      !(await answersReady(settings));
      await pause(pollMs, undefined, { signal })
    ) {
      if (gone) throw new Error(whatWentWrong(readFileSync(logFile, 'utf8')));
      if (Date.now() > end) throw new Error(`The server is not ready after ${readyMs / 1000} s. Its log: ${logFile}`);
    }
    // Another program on this port may have answered in its place.
    if (gone) throw new Error(whatWentWrong(readFileSync(logFile, 'utf8')));
  } catch (error) {
    await stop();
    throw error;
  }
  return { stop, ended };
}

/** @returns {Promise<boolean>} */
function answersReady({ HOST, PORT, HTTPS }) {
  const request = HTTPS === 'self' ? secure : plain;
  const host = HOST === '0.0.0.0' || HOST === '::' ? '127.0.0.1' : HOST;
  return new Promise((resolve) => {
    // Its own certificate is not checked: only whether it answers is asked.
    request({ host, port: PORT, path: '/ready', timeout: 2000, rejectUnauthorized: false }, (response) => {
      response.resume();
      resolve(response.statusCode === 200);
    })
      .once('error', () => resolve(false))
      .once('timeout', function () {
        this.destroy();
      })
      .end();
  });
}
