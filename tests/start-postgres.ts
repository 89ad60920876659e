import { startPostgres } from '../scripts/postgres.mjs';

/** Vitest's global set-up: one private PostgreSQL for the whole run, unless TEST_DATABASE_URL names one that runs already. */
export default async function startPostgresForTests() {
  if (process.env['TEST_DATABASE_URL']) return undefined;
  const postgres = await startPostgres({ dataDir: '.oriel/test-postgres', durable: false });
  process.env['TEST_DATABASE_URL'] = postgres.url;
  return () => postgres.stop();
}
