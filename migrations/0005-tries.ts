import { sql, type Kysely, type Migration } from 'kysely';

/** Tries counted against limits. Unlogged, for after a crash of the database the counts may begin anew. */
export const tries: Migration = {
  async up(db: Kysely<unknown>) {
    await sql`create unlogged table tries (key bytea primary key, count integer not null, ends_at timestamptz not null)`.execute(db);
  },
};
