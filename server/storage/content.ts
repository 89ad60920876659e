import { sql, type Transaction } from 'kysely';
import type { Database } from '../database/database';
import type { Tables } from '../database/tables';
import { allKeys } from './keys';
import type { Storage } from './storage';

/** Holds everyone else off the objects of one content until the transaction ends. */
export async function lockContent(transaction: Transaction<Tables>, sha256: string): Promise<void> {
  await sql`select pg_advisory_xact_lock(hashtextextended(${sha256}, 0))`.execute(transaction);
}

/** Removes a content's objects once no photo and no layer image of any household refers to it. */
export async function removeUnreferenced(db: Database, storage: Storage, sha256: string): Promise<void> {
  await db.transaction().execute(async (transaction) => {
    await lockContent(transaction, sha256);
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
