import { sql } from 'kysely';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { connect } from '../database/database';
import { createTestDatabase, type TestDatabase } from '../testing/test-database';
import { triesFor } from './tries';

const log = pino({ level: 'silent' });
const hourMs = 3_600_000;

describe('tries, counted in the database', () => {
  let database: TestDatabase;
  beforeAll(async () => void (database = await createTestDatabase()));
  afterAll(() => database.drop());
  const tries = (limit: string, windowMs = hourMs) => triesFor(limit, windowMs, database.connection.db, log);

  it('are counted together by two servers, none lost where they come at once', async () => {
    const other = connect(database.url, () => undefined);
    const both = [tries('shared'), triesFor('shared', hourMs, other.db, log)];
    const counted = await Promise.all(Array.from({ length: 40 }, (_, i) => both[i % 2].increment('192.0.2.1')));
    expect(counted.map(({ totalHits }) => totalHits).sort((a, b) => a - b)).toEqual(Array.from({ length: 40 }, (_, i) => i + 1));
    expect(new Set(counted.map(({ resetTime }) => resetTime?.getTime())).size).toBe(1);
    await other.db.destroy();
  });

  it('of other limits and other keys are counted apart', async () => {
    await tries('a').increment('192.0.2.1');
    expect((await tries('a').increment('192.0.2.2')).totalHits).toBe(1);
    expect((await tries('b').increment('192.0.2.1')).totalHits).toBe(1);
    expect((await tries('a').increment('192.0.2.1')).totalHits).toBe(2);
  });

  it('begin anew when their time is over', async () => {
    await tries('brief').increment('x');
    await sql`update tries set ends_at = now()`.execute(database.connection.db);
    const { totalHits, resetTime } = await tries('brief').increment('x');
    expect(totalHits).toBe(1);
    expect(Math.abs(resetTime!.getTime() - Date.now() - hourMs)).toBeLessThan(60_000);
  });

  it('can be taken back, and forgotten', async () => {
    const store = tries('back');
    await store.increment('x');
    await store.increment('x');
    await store.decrement('x');
    expect((await store.increment('x')).totalHits).toBe(2);
    await store.resetKey('x');
    await store.decrement('x');
    expect((await store.increment('x')).totalHits).toBe(1);
  });

  it('security: name nobody', async () => {
    await tries('mail').increment('somebody@example.org');
    const { rows } = await sql<{ row: string }>`select tries::text as row from tries`.execute(database.connection.db);
    expect(rows.map(({ row }) => row).join()).not.toContain('somebody');
  });
});
