import type { Selectable } from 'kysely';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import type { Wall } from '@oriel/shared/contracts/walls';
import type { Database } from '../database/database';
import { saverOf } from '../database/revisions';
import type { Tables } from '../database/tables';

export type WallRow = Selectable<Tables['wall']> & { saver: string | null };

export const setUpOf = ({ set_up, scene_id }: Pick<WallRow, 'set_up' | 'scene_id'>): WallSetUp => ({
  ...set_up,
  // Not there in what was stored before there was such a thing.
  followingBefore: set_up.followingBefore ?? null,
  sceneId: scene_id,
});

export const toWall = (row: WallRow): Wall => ({
  id: row.id,
  householdId: row.household_id,
  setUp: setUpOf(row),
  revision: row.revision,
  savedAt: row.saved_at.toISOString(),
  savedBy: saverOf(row),
  pairedAt: row.paired_at?.toISOString() ?? null,
  heardAt: row.heard_at?.toISOString() ?? null,
  report: row.report,
});

const walls = (db: Database) =>
  db
    .selectFrom('wall')
    .leftJoin('account', 'account.id', 'wall.saved_by')
    .selectAll('wall')
    .select('account.name as saver');

export const findWall = (db: Database, id: string): Promise<WallRow | undefined> =>
  walls(db).where('wall.id', '=', id).executeTakeFirst();

/** The wall, which nobody else can change until the transaction ends. Held first and then read, as in `holdScene`. */
export async function holdWall(db: Database, id: string): Promise<WallRow | undefined> {
  await db.selectFrom('wall').select('id').where('id', '=', id).forUpdate().execute();
  return findWall(db, id);
}

/** By name. */
export const wallsOf = async (db: Database, householdId: string): Promise<WallRow[]> => {
  const rows = await walls(db)
    .where('wall.household_id', '=', householdId)
    .orderBy('wall.created_at')
    .orderBy('wall.id')
    .execute();
  return rows.sort((a, b) => a.set_up.name.localeCompare(b.set_up.name, 'en-GB', { numeric: true }));
};
