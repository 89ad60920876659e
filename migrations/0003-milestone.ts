import { sql, type Kysely, type Migration } from 'kysely';

/** What is done once in the life of a database, such as loading the demo. */
export const milestone: Migration = {
  async up(db: Kysely<unknown>) {
    await db.schema
      .createTable('milestone')
      .addColumn('name', 'text', (c) => c.primaryKey())
      .addColumn('reached_at', 'timestamptz', (c) => c.notNull().defaultTo(sql`now()`))
      .execute();
  },
};
