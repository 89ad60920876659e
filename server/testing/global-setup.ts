import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { connect, migrate } from '../database/database';
import { withDatabase } from './with-database';

declare module 'vitest' {
  interface ProvidedContext {
    /** A database of the test server, migrated; each test file copies it. */
    templateUrl: string;
  }
}

const templateName = 'oriel_test_template';

/** The PostgreSQL the tests use: TEST_DATABASE_URL, or a private one on loopback, started here and stopped at the end. */
async function findServer(): Promise<{ url: string; stop: () => Promise<void> }> {
  const given = process.env['TEST_DATABASE_URL'];
  if (given) return { url: given, stop: () => Promise.resolve() };
  const { startPostgres } = (await import('../../scripts/postgres.mjs')) as {
    startPostgres: (settings: { dataDir: string }) => Promise<{ url: string; stop: () => Promise<void> }>;
  };
  return startPostgres({ dataDir: '.oriel/test-postgres' });
}

export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { url, stop } = await findServer();
  const admin = new pg.Client({ connectionString: url });
  await admin.connect();
  await admin.query(`drop database if exists ${templateName} with (force)`);
  await admin.query(`create database ${templateName}`);
  await admin.end();

  const templateUrl = withDatabase(url, templateName);
  const connection = connect(templateUrl, () => undefined);
  await migrate(connection.db);
  await connection.db.destroy();
  project.provide('templateUrl', templateUrl);
  return stop;
}
