import { sql, type Transaction } from 'kysely';
import type { Database } from '../database/database';
import type { Tables } from '../database/tables';
import { allKeys } from './keys';
import type { Storage } from './storage';

/** Holds everyone else off the objects of one content until the transaction ends. */
export async function lockContent(transaction: Transaction<Tables>, sha256: string): Promise<void> {
  await sql`select pg_advisory_xact_lock(hashtextextended(${sha256}, 0))`.execute(transaction);
}

/**
 * Lets `forget` delete rows that refer to a content, and removes its objects once no photo and no layer image of any household refers to it.
 * The objects go first and the rows last: killed in between, the rows are still there to be purged again.
 */
export async function forgetContent(
  db: Database,
  storage: Storage,
  sha256: string,
  forget: (transaction: Transaction<Tables>) => Promise<void>,
): Promise<void> {
  await db.transaction().execute(async (transaction) => {
    await lockContent(transaction, sha256);
    await forget(transaction);
    const references = await transaction
      .selectFrom('photo')
      .select('id')
      .where('sha256', '=', sha256)
      .unionAll(transaction.selectFrom('layer_image').select('id').where('sha256', '=', sha256))
      .limit(1)
      .execute();
    if (references.length > 0) return;
    for (const key of allKeys(sha256)) await storage.remove(key);
  });
}

/** Removes a content's objects if nothing refers to it. */
export const removeUnreferenced = (db: Database, storage: Storage, sha256: string): Promise<void> =>
  forgetContent(db, storage, sha256, () => Promise.resolve());
