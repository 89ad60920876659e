import pg from 'pg';
import { pino } from 'pino';
import type { TestProject } from 'vitest/node';
import { connect, migrate } from '../database/database';
import { startJobs } from '../jobs/jobs';
import { withDatabase } from './with-database';

declare module 'vitest' {
  interface ProvidedContext {
    /** A database of the test server, migrated and with a job queue; each test file copies it. */
    templateUrl: string;
  }
}

/** The PostgreSQL the tests use: TEST_DATABASE_URL, or a private one on loopback, started here and stopped at the end. */
async function findServer(): Promise<{ url: string; stop: () => Promise<void> }> {
  const given = process.env['TEST_DATABASE_URL'];
  if (given) return { url: given, stop: () => Promise.resolve() };
  const { startPostgres } = await import('../../scripts/postgres.mjs');
  return startPostgres({ dataDir: '.oriel/test-postgres', durable: false });
}

async function asAdmin(url: string, statement: string): Promise<void> {
  const admin = new pg.Client({ connectionString: url });
  await admin.connect();
  await admin.query(statement).finally(() => admin.end());
}

export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { url, stop } = await findServer();
  const template = `oriel_test_template_${process.pid}`;
  await asAdmin(url, `create database ${template}`);
  const templateUrl = withDatabase(url, template);
  const connection = connect(templateUrl, () => undefined);
  await migrate(connection.db);
  await connection.db.destroy();
  await (await startJobs(templateUrl, pino({ level: 'silent' }))).stop();
  project.provide('templateUrl', templateUrl);
  return async () => {
    await asAdmin(url, `drop database ${template} with (force)`);
    await stop();
  };
}
