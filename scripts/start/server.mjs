import { spawn } from 'node:child_process';
import { request as plain } from 'node:http';
import { request as secure } from 'node:https';
import { setTimeout as pause } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { inProject, root } from '../project.mjs';
import { rotatingLog } from './rotating-log.mjs';
import { whatWentWrong } from './server-log.mjs';

const readyMs = 120_000;
const stopMs = 10_000;
const pollMs = 50;
const recentCharacters = 32_768;

/**
 * Starts the built server as a process of its own group and waits until it is ready: migrated, demo loaded, database answering.
 * @param {{ settings: NodeJS.ProcessEnv, logFile: string, signal?: AbortSignal }} options
 * @returns {Promise<{ stop: () => Promise<void>, kill: () => Promise<number>, ended: Promise<number> }>} ended: the exit code, once it has
 *   ended by itself or not; kill ends it as a power cut would
 * @throws Error with what the server's log says
 */
export async function startServer({ settings, logFile, signal }) {
  const log = rotatingLog(logFile);
  const guard = pathToFileURL(inProject('scripts/start/end-with-parent.mjs')).href;
  const child = spawn(process.execPath, ['--enable-source-maps', '--import', guard, inProject('dist/server/main.js')], {
    cwd: root,
    env: settings,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  });
  let recent = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream.on('data', (chunk) => {
      log.write(chunk);
      recent = (recent + chunk.toString()).slice(-recentCharacters);
    });
  }
  let gone = false;
  const ended = new Promise((resolve) =>
    child.once('close', (code) => {
      gone = true;
      log.close();
      resolve(code ?? 1);
    }),
  );
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
      if (gone) throw new Error(whatWentWrong(recent));
      if (Date.now() > end) throw new Error(`The server is not ready after ${readyMs / 1000} s. Its log: ${logFile}`);
    }
    // Another program on this port may have answered in its place.
    if (gone) throw new Error(whatWentWrong(recent));
  } catch (error) {
    await stop();
    throw error;
  }
  const kill = () => {
    child.kill('SIGKILL');
    return ended;
  };
  return { stop, kill, ended };
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
