import { Kysely, Migrator, PostgresDialect } from 'kysely';
import pg from 'pg';
import { migrations } from '../../migrations';
import type { Tables } from './tables';

export type Database = Kysely<Tables>;

/** The connections of one server: Kysely for queries, and the same pool for the session store. */
export interface Connection {
  readonly db: Database;
  readonly pool: pg.Pool;
}

export function connect(databaseUrl: string, onLost: (error: Error) => void): Connection {
  const pool = new pg.Pool({ connectionString: databaseUrl, max: 12, connectionTimeoutMillis: 5_000 });
  // An idle connection that the server closes would otherwise end the process; the pool opens another.
  pool.on('error', onLost);
  // So would one that is lost while a transaction waits for something else: its next query is told.
  pool.on('connect', (client) => client.on('error', () => undefined));
  return { pool, db: new Kysely<Tables>({ dialect: new PostgresDialect({ pool }) }) };
}

/** Brings the schema to the newest migration, once, however many servers start together (Kysely holds a lock). */
export async function migrate(db: Database): Promise<void> {
  const migrator = new Migrator({ db, provider: { getMigrations: () => Promise.resolve(migrations) } });
  const { error } = await migrator.migrateToLatest();
  if (error) throw error instanceof Error ? error : new Error(String(error));
}
