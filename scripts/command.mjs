import { spawn } from 'node:child_process';

const graceMs = 5000;

/**
 * Runs a command to its end and keeps what it printed.
 * The command gets a process group of its own, so that an abort ends everything it started too.
 * @param {string} program
 * @param {readonly string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, uid?: number, gid?: number, input?: string, signal?: AbortSignal, onText?: (text: string) => void }} [options]
 * @returns {Promise<{ code: number, output: string }>} code 127 where there is no such program
 * @throws the signal's reason, once the command has ended after an abort
 */
export function run(program, args, options = {}) {
  const { signal, onText, input, ...spawning } = options;
  signal?.throwIfAborted();
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      ...spawning,
      detached: true,
      stdio: [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
    });
    let output = '';
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (text) => {
        output += text;
        onText?.(text);
      });
    }
    child.stdin?.on('error', () => undefined).end(input);
    let kill;
    const abort = () => {
      signalGroup(child.pid, 'SIGTERM');
      kill = setTimeout(() => signalGroup(child.pid, 'SIGKILL'), graceMs);
    };
    signal?.addEventListener('abort', abort, { once: true });
    const settle = (code) => {
      clearTimeout(kill);
      signal?.removeEventListener('abort', abort);
      if (signal?.aborted) reject(signal.reason);
      else resolve({ code, output });
    };
    child.once('error', (error) => {
      output += error.message;
      settle(127);
    });
    child.once('close', (code) => settle(code ?? 1));
  });
}

/** Like `run`, but a failing command throws, with the last lines it printed. @returns {Promise<string>} the output */
export async function mustRun(program, args, options = {}) {
  const { code, output } = await run(program, args, options);
  if (code === 0) return output;
  throw new Error(`${program} ${args.join(' ')} failed (exit code ${code}):\n${lastLines(output, 25)}`);
}

/** @param {string} text @param {number} count */
export const lastLines = (text, count) => text.trimEnd().split('\n').slice(-count).join('\n');

function signalGroup(pid, name) {
  try {
    process.kill(-pid, name);
  } catch {
    // The group has ended meanwhile.
  }
}
