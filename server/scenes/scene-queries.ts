import type { Selectable } from 'kysely';
import type { Scene } from '@oriel/shared/contracts/scenes';
import type { Database } from '../database/database';
import { saverOf } from '../database/revisions';
import type { Tables } from '../database/tables';

export type SceneRow = Selectable<Tables['scene']> & { saver: string | null };

export const toScene = (row: SceneRow): Scene => ({
  id: row.id,
  householdId: row.household_id,
  document: row.document,
  revision: row.revision,
  savedAt: row.saved_at.toISOString(),
  savedBy: saverOf(row),
  savedById: row.saved_by,
});

const scenes = (db: Database) =>
  db
    .selectFrom('scene')
    .leftJoin('account', 'account.id', 'scene.saved_by')
    .selectAll('scene')
    .select('account.name as saver');

export const findScene = (db: Database, id: string): Promise<SceneRow | undefined> =>
  scenes(db).where('scene.id', '=', id).executeTakeFirst();

/**
 * The scene, which nobody else can save until the transaction ends. Held first and then read: one statement that had to wait would see the new
 * row beside the accounts it had found for the old one, and so nobody's name (PostgreSQL manual, 13.2.1).
 */
export async function holdScene(db: Database, id: string): Promise<SceneRow | undefined> {
  await db.selectFrom('scene').select('id').where('id', '=', id).forUpdate().execute();
  return findScene(db, id);
}

export const scenesOf = (db: Database, householdId: string, bin: boolean): Promise<SceneRow[]> =>
  scenes(db)
    .where('scene.household_id', '=', householdId)
    .where('scene.binned_at', bin ? 'is not' : 'is', null)
    .orderBy('scene.saved_at', 'desc')
    .orderBy('scene.id')
    .execute();
