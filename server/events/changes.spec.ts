import pg from 'pg';
import { pino } from 'pino';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createTestDatabase, type TestDatabase } from '../testing/test-database';
import { announce, listenForChanges, type Changes } from './changes';

const log = pino({ level: 'silent' });
let database: TestDatabase;
let here: Changes;
beforeEach(async () => {
  database = await createTestDatabase();
  here = await listenForChanges(database.url, log);
});
afterEach(async () => {
  await here.stop();
  await database.drop();
});

const tell = (...topics: string[]) =>
  database.connection.db.transaction().execute((change) => announce(change, topics));
const counter = (changes: Changes, topic: string) => {
  const counted = { times: 0, stop: changes.subscribe(topic, () => counted.times++) };
  return counted;
};
async function cutListeners(): Promise<number> {
  const admin = new pg.Client({ connectionString: database.url });
  await admin.connect();
  const { rowCount } = await admin.query(
    `select pg_terminate_backend(pid) from pg_stat_activity where datname = current_database() and application_name = 'oriel changes'`,
  );
  await admin.end();
  return rowCount ?? 0;
}

describe('changes', () => {
  it('are heard of by every server, by topic', async () => {
    const there = await listenForChanges(database.url, log);
    const [a, b, other] = [counter(here, 'wall 1'), counter(there, 'wall 1'), counter(there, 'wall 2')];
    await tell('wall 1');
    await expect.poll(() => [a.times, b.times], { timeout: 1000 }).toEqual([1, 1]);
    await tell('wall 2', 'wall 1');
    await expect.poll(() => [a.times, b.times, other.times], { timeout: 1000 }).toEqual([2, 2, 1]);
    await there.stop();
  });

  it('are told once the transaction is committed, and never when it is not', async () => {
    const counted = counter(here, 'wall 1');
    await expect(
      database.connection.db.transaction().execute(async (change) => {
        await announce(change, ['wall 1']);
        throw new Error('thought better of it');
      }),
    ).rejects.toThrow('thought better');
    await database.connection.db.transaction().execute(async (change) => {
      await announce(change, ['wall 1']);
      await new Promise((resolve) => setTimeout(resolve, 150));
      expect(counted.times).toBe(0);
    });
    await expect.poll(() => counted.times, { timeout: 1000 }).toBe(1);
  });

  it('may have been missed while the connection was lost: everyone is told, and hears again', async () => {
    const [one, two] = [counter(here, 'wall 1'), counter(here, 'wall 2')];
    expect(await cutListeners()).toBe(1);
    await expect.poll(() => [one.times, two.times], { timeout: 5000 }).toEqual([1, 1]);
    await tell('wall 2');
    await expect.poll(() => [one.times, two.times], { timeout: 1000 }).toEqual([1, 2]);
    expect(await cutListeners()).toBe(1);
    await expect.poll(() => [one.times, two.times], { timeout: 5000 }).toEqual([2, 3]);
  });

  it('are not told to whoever has left', async () => {
    const [gone, stays] = [counter(here, 'wall 1'), counter(here, 'wall 1')];
    gone.stop();
    await tell('wall 1');
    await expect.poll(() => stays.times, { timeout: 1000 }).toBe(1);
    expect(gone.times).toBe(0);
  });

  it('stop for good, and leave no connection', async () => {
    await here.stop();
    await expect.poll(cutListeners, { timeout: 2000 }).toBe(0);
    await new Promise((resolve) => setTimeout(resolve, 400));
    expect(await cutListeners()).toBe(0);
  });
});
