import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { inject } from 'vitest';
import { connect, type Connection } from '../database/database';
import { withDatabase } from './with-database';

export interface TestDatabase {
  readonly url: string;
  readonly connection: Connection;
  drop(): Promise<void>;
}

async function asAdmin(statement: string): Promise<void> {
  const admin = new pg.Client({ connectionString: withDatabase(inject('templateUrl'), 'postgres') });
  await admin.connect();
  await admin.query(statement).finally(() => admin.end());
}

/** A migrated database of its own, on a real PostgreSQL. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const templateUrl = inject('templateUrl');
  const name = `oriel_test_${randomBytes(6).toString('hex')}`;
  // Two files that start together may not copy the template at the same moment.
  for (let tries = 1; ; tries++) {
    try {
      await asAdmin(`create database ${name} template ${new URL(templateUrl).pathname.slice(1)}`);
      break;
    } catch (error) {
      if (tries === 50) throw error;
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  }
  const url = withDatabase(templateUrl, name);
  const connection = connect(url, () => undefined);
  return {
    url,
    connection,
    drop: async () => {
      await connection.db.destroy();
      await asAdmin(`drop database ${name} with (force)`);
    },
  };
}
