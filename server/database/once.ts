import { sql } from 'kysely';
import type { Database } from './database';

const isReached = async (db: Database, name: string) =>
  (await db.selectFrom('milestone').select('name').where('name', '=', name).executeTakeFirst()) !== undefined;

/** Does something once in the life of the database, by one server of several that start together; again, if it was cut off. */
export async function once(db: Database, name: string, act: () => Promise<void>): Promise<void> {
  if (await isReached(db, name)) return;
  // The lock goes with the transaction that holds it.
  await db.transaction().execute(async (transaction) => {
    await sql`select pg_advisory_xact_lock(hashtextextended(${name}, 0))`.execute(transaction);
    if (await isReached(transaction, name)) return;
    await act();
    await transaction.insertInto('milestone').values({ name }).execute();
  });
}
