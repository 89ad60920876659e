import { accessSync, chmodSync, constants, existsSync, mkdirSync, readFileSync, readdirSync, rmdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import type { Computer } from './computers';

const mounted = '/sys/fs/cgroup/cpu';
/** Short, so that a share of a core is felt as slowness and not as stops. */
const periodUs = 10_000;
const rescanMs = 150;

/** Why no smaller computer can be emulated here; null where one can: cgroup v1, its cpu controller mounted, and the right to write there. */
export function whyNoQuota(): string | null {
  if (process.platform !== 'linux') return 'quotas need Linux';
  if (!existsSync(join(mounted, 'cpu.cfs_quota_us')))
    return existsSync('/sys/fs/cgroup/cgroup.controllers') ? 'this machine has cgroup v2, which gives no quota to single threads of a running browser' : 'no cgroup v1 cpu controller is mounted';
  try {
    accessSync(ownGroup(), constants.W_OK);
    return null;
  } catch {
    return 'only root may set quotas here';
  }
}

/** The group this process is in itself: what it makes stands within, and shares its lot. */
function ownGroup(): string {
  const line = readFileSync('/proc/self/cgroup', 'utf8').split('\n').find((entry) => entry.split(':')[1]?.split(',').includes('cpu'));
  const path = join(mounted, line?.split(':')[2] ?? '');
  return existsSync(path) ? path : mounted;
}

/** A group of processes that share what a smaller computer would have. */
export interface Quota {
  /** A program that starts `program` within the group, from its first instruction on. */
  starter(program: string, folder: string): string;
  /** Ends what may be left of it, and takes the group away. */
  end(): Promise<void>;
}

let groups = 0;

/** Emulates a computer by a cgroup v1 quota; for slow cores each thread has a group of its own within, found anew several times a second. */
export function quotaFor({ eachThread, inAll }: Computer): Quota | null {
  if (inAll === null) return null;
  const group = join(ownGroup(), `oriel-bench-${String(process.pid)}-${String(++groups)}`);
  mkdirSync(group);
  limit(group, inAll);
  const timer = eachThread === null ? null : setInterval(() => spread(group, eachThread), rescanMs);
  return {
    starter(program, folder) {
      const path = join(folder, `start-${String(groups)}`);
      writeFileSync(path, `#!/bin/sh\necho $$ > '${group}/tasks' && exec '${program}' "$@"\n`);
      chmodSync(path, 0o755);
      return path;
    },
    async end() {
      if (timer) clearInterval(timer);
      // A browser that closed needs a moment; what is in this group was started by it.
      for (let tries = 0; tries < 40 && !removed(group); tries++) {
        if (tries === 20) for (const pid of new Set([group, ...childrenOf(group)].flatMap((path) => numbersIn(join(path, 'cgroup.procs'))))) endProcess(pid);
        await pause(100);
      }
    },
  };
}

function limit(group: string, cores: number): void {
  writeFileSync(join(group, 'cpu.cfs_period_us'), String(periodUs));
  writeFileSync(join(group, 'cpu.cfs_quota_us'), String(Math.round(cores * periodUs)));
}

/** Gives every thread a group of its own. A new thread begins in the group of the one that made it. */
function spread(group: string, share: number): void {
  for (const path of [group, ...childrenOf(group)]) {
    const threads = numbersIn(join(path, 'tasks'));
    if (path !== group && threads.length === 0) {
      attempt(() => rmdirSync(path));
      continue;
    }
    for (const thread of threads) {
      const own = join(group, String(thread));
      if (own === path) continue;
      attempt(() => {
        if (!existsSync(own)) {
          mkdirSync(own);
          limit(own, share);
        }
        writeFileSync(join(own, 'tasks'), String(thread));
      });
    }
  }
}

function childrenOf(group: string): string[] {
  return existsSync(group) ? readdirSync(group, { withFileTypes: true }).filter((entry) => entry.isDirectory()).map(({ name }) => join(group, name)) : [];
}

function numbersIn(file: string): number[] {
  try {
    return readFileSync(file, 'utf8').split('\n').filter(Boolean).map(Number);
  } catch {
    return [];
  }
}

function removed(group: string): boolean {
  for (const path of [...childrenOf(group), group]) attempt(() => rmdirSync(path));
  return !existsSync(group);
}

function endProcess(pid: number): void {
  attempt(() => process.kill(pid, 'SIGKILL'));
}

/** Threads and groups come and go while they are looked at. */
function attempt(act: () => void): void {
  try {
    act();
  } catch {
    return;
  }
}
