import { readFileSync } from 'node:fs';

/**
 * What tells one process from a later one with the same id: when it started, in the kernel's ticks since boot (proc(5), stat, field 22).
 * A zombie counts as gone: in a container nobody may reap it. Where there is no /proc, a process that answers signal 0 is 'alive'.
 * @param {number} pid
 * @returns {string | null} null where no such process runs
 */
export function processMark(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const [state, ...rest] = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return state === 'Z' || state === 'X' ? null : rest[18];
  } catch {
    return process.platform === 'linux' ? null : answersSignal(pid);
  }
}

function answersSignal(pid) {
  try {
    process.kill(pid, 0);
    return 'alive';
  } catch (error) {
    return error.code === 'EPERM' ? 'alive' : null;
  }
}
