import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import pg from 'pg';
import { afterAll, expect, test } from 'vitest';
import { startPostgres } from './postgres.mjs';
import { processMark } from './processes.mjs';
import { inProject } from './project.mjs';

const folder = mkdtempSync(join(tmpdir(), 'oriel-postgres-'));
// Where PostgreSQL's own user can reach it, if root runs this.
chmodSync(folder, 0o711);
const dataDir = join(folder, 'postgres');
const start = () => startPostgres({ dataDir, durable: false });
afterAll(() => {
  const { cluster } = JSON.parse(readFileSync(join(dataDir, 'access.json'), 'utf8')) as { cluster: string };
  if (cluster.startsWith('/')) rmSync(dirname(cluster), { recursive: true });
  rmSync(folder, { recursive: true });
});

async function ask(url: string, question: string): Promise<unknown> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  const { rows } = await client.query<{ answer: unknown }>(question).finally(() => client.end());
  return rows[0]?.answer;
}

/** Starts PostgreSQL in a process of its own and kills that outright. @returns the server's address */
async function startAndKill(): Promise<string> {
  const program = `import { startPostgres } from ${JSON.stringify(inProject('scripts', 'postgres.mjs'))};
    console.log((await startPostgres({ dataDir: ${JSON.stringify(dataDir)}, durable: false })).url);
    setInterval(() => undefined, 1000);`;
  const child = spawn(process.execPath, ['--input-type=module', '-e', program], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const [url] = (await once(child.stdout, 'data')) as [Buffer];
  child.kill('SIGKILL');
  await once(child, 'exit');
  return url.toString().trim();
}

test('a cluster of its own: kept over a restart, known by its password, listening on loopback, secret to others', async () => {
  const first = await start();
  await ask(first.url, 'create table kept as select 42 as answer');
  expect(await ask(first.url, "select current_setting('listen_addresses') as answer")).toBe('127.0.0.1');
  const stranger = new URL(first.url);
  stranger.password = 'guess';
  await expect(ask(stranger.href, 'select 1 as answer')).rejects.toThrow('password authentication failed');
  expect(statSync(join(dataDir, 'access.json')).mode & 0o777).toBe(0o600);
  await first.stop();
  await expect(ask(first.url, 'select 1 as answer')).rejects.toThrow('ECONNREFUSED');

  const second = await start();
  expect(await ask(second.url, 'select answer from kept')).toBe(42);
  await second.stop();
});

test('a server left by a killed process is used again, and then stopped', async () => {
  const left = await startAndKill();
  expect(await ask(left, 'select 1 as answer')).toBe(1);
  const again = await start();
  expect(again.url).toBe(left);
  await again.stop();
  await expect(ask(left, 'select 1 as answer')).rejects.toThrow('ECONNREFUSED');
});

test('a server that was killed itself, leaving its postmaster.pid, is started anew', async () => {
  const left = await startAndKill();
  const pid = Number(await ask(left, "select split_part(pg_read_file('postmaster.pid'), E'\\n', 1) as answer"));
  process.kill(pid, 'SIGKILL');
  await expect.poll(() => processMark(pid)).toBeNull();
  const again = await start();
  expect(await ask(again.url, 'select answer from kept')).toBe(42);
  await again.stop();
});
