import { sql } from 'kysely';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { migrations } from '../../migrations';
import { createTestApp, type TestApp } from '../testing/test-app';
import { createTestDatabase } from '../testing/test-database';
import { connect, migrate } from './database';

describe('the database', () => {
  let app: TestApp;
  beforeAll(async () => void (app = await createTestApp()));
  afterAll(() => app.close());

  it('is found again after every connection was cut, sessions included', async () => {
    const { browser, id } = await app.signedIn('owner');
    const other = new pg.Client({ connectionString: app.parts.config.databaseUrl });
    await other.connect();
    await other.query('select pg_terminate_backend(pid) from pg_stat_activity where datname = current_database() and pid <> pg_backend_pid()');
    await other.end();
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect((await browser.ask('get', '/ready')).status).toBe(200);
    expect((await browser.ask('get', '/api/me')).body.account.id).toBe(id);
  });

  it('that is lost in the midst of a transaction fails that transaction and nothing else', async () => {
    const { db } = app;
    const cut = db.transaction().execute(async (transaction) => {
      const { rows } = await sql<{ pid: number }>`select pg_backend_pid() as pid`.execute(transaction);
      await sql`select pg_terminate_backend(${rows[0].pid})`.execute(db);
      await new Promise((resolve) => setTimeout(resolve, 200));
      await sql`select 1`.execute(transaction);
    });
    await expect(cut).rejects.toThrow();
    expect((await app.browser().ask('get', '/ready')).status).toBe(200);
  });

  it('is migrated once, however many servers start together', async () => {
    const database = await createTestDatabase();
    await sql`drop schema public cascade`.execute(database.connection.db);
    await sql`create schema public`.execute(database.connection.db);
    const servers = [1, 2, 3].map(() => connect(database.url, () => undefined));
    await Promise.all(servers.map(({ db }) => migrate(db)));
    const { rows } = await sql<{ name: string }>`select name from kysely_migration order by name`.execute(database.connection.db);
    expect(rows.map(({ name }) => name)).toEqual(Object.keys(migrations).sort());
    await Promise.all(servers.map(({ db }) => db.destroy()));
    await database.drop();
  });
});
