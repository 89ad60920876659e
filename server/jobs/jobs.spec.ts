import * as z from 'zod';
import { pino } from 'pino';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createTestDatabase, type TestDatabase } from '../testing/test-database';
import { defineJob } from './job';
import { startJobs, type Jobs } from './jobs';

const job = defineJob({ name: 'count', data: z.object({ n: z.number() }), retries: 1, expiresAfterS: 60, atOnce: 2 });
const log = pino({ level: 'silent' });
let database: TestDatabase;
let jobs: Jobs;
beforeEach(async () => {
  database = await createTestDatabase();
  jobs = await startJobs(database.url, log);
});
afterEach(async () => {
  await jobs.stop();
  await database.drop();
});

describe('jobs', () => {
  it('do each job sent, two at a time and without resting in between', async () => {
    const seen: number[] = [];
    let running = 0;
    let most = 0;
    await jobs.work(job, {
      run: async ({ n }) => {
        most = Math.max(most, ++running);
        await new Promise((resolve) => setTimeout(resolve, 30));
        running--;
        seen.push(n);
      },
    });
    for (let n = 0; n < 20; n++) await jobs.send(job, { n });
    jobs.nudge(job);
    await expect.poll(() => seen.length, { timeout: 8000 }).toBe(20);
    expect([...seen].sort((a, b) => a - b)).toEqual(Array.from({ length: 20 }, (_, n) => n));
    expect(most).toBe(2);
  });

  it('are sent only if the transaction they belong to is committed', async () => {
    const seen: number[] = [];
    await jobs.work(job, { run: ({ n }) => Promise.resolve(void seen.push(n)) });
    const { db } = database.connection;
    await db.transaction().execute((transaction) => jobs.send(job, { n: 1 }, transaction));
    await expect(
      db.transaction().execute(async (transaction) => {
        await jobs.send(job, { n: 2 }, transaction);
        throw new Error('thought better of it');
      }),
    ).rejects.toThrow('thought better');
    await jobs.send(job, { n: 3 });
    jobs.nudge(job);
    await expect.poll(() => seen.length, { timeout: 8000 }).toBe(2);
    expect(seen.sort()).toEqual([1, 3]);
  });

  it('try again what failed, and give up at the end', async () => {
    let tries = 0;
    const givenUp: number[] = [];
    await jobs.work(job, {
      run: () => {
        tries++;
        return Promise.reject(new Error('no'));
      },
      giveUp: ({ n }) => Promise.resolve(void givenUp.push(n)),
    });
    await jobs.send(job, { n: 7 });
    await expect.poll(() => givenUp, { timeout: 25_000 }).toEqual([7]);
    expect(tries).toBe(2);
  });

  it('under way are waited for when the server stops', async () => {
    let done = false;
    let begun = false;
    await jobs.work(job, {
      run: async () => {
        begun = true;
        await new Promise((resolve) => setTimeout(resolve, 800));
        done = true;
      },
    });
    await jobs.send(job, { n: 1 });
    jobs.nudge(job);
    await expect.poll(() => begun, { timeout: 8000 }).toBe(true);
    await jobs.stop();
    expect(done).toBe(true);
  });

  it('of another server that is at work are left alone', async () => {
    let tries = 0;
    await jobs.work(job, {
      run: () => {
        tries++;
        return new Promise((resolve) => setTimeout(resolve, 7000));
      },
    });
    await jobs.send(job, { n: 1 });
    jobs.nudge(job);
    await expect.poll(() => tries, { timeout: 8000 }).toBe(1);
    const second = await startJobs(database.url, log);
    await second.work(job, { run: () => Promise.resolve(void tries++) });
    await new Promise((resolve) => setTimeout(resolve, 6500));
    await second.stop();
    expect(tries).toBe(1);
  });
});
