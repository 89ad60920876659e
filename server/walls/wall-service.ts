import { isDeepStrictEqual } from 'node:util';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import type { Wall } from '@oriel/shared/contracts/walls';
import type { Database } from '../database/database';
import { mustWrite } from '../database/revisions';
import type { ActingMember } from '../http/acting-member';
import { notFound } from '../http/failure';
import { sceneNotHere } from './refusals';
import { announceWall } from './wall-changes';
import { findWall, holdWall, setUpOf, toWall, wallsOf } from './wall-queries';

const columnsOf = ({ sceneId, ...setUp }: WallSetUp) => ({ set_up: JSON.stringify(setUp), scene_id: sceneId });

/** Holds the scene, so that it is still there when the wall is saved. @throws scene-not-here (422) */
async function holdSceneOf(transaction: Database, householdId: string, sceneId: string): Promise<void> {
  const scene = await transaction
    .selectFrom('scene')
    .select('id')
    .where('id', '=', sceneId)
    .where('household_id', '=', householdId)
    .where('binned_at', 'is', null)
    .forKeyShare()
    .executeTakeFirst();
  if (!scene) throw sceneNotHere();
}

export function wallService(db: Database) {
  async function read(id: string): Promise<Wall> {
    const row = await findWall(db, id);
    if (!row) throw notFound();
    return toWall(row);
  }

  return {
    list: async (householdId: string): Promise<Wall[]> => (await wallsOf(db, householdId)).map(toWall),

    read,

    /** @throws scene-not-here (422) */
    async create(setUp: WallSetUp, { householdId, accountId }: ActingMember): Promise<Wall> {
      const id = await db.transaction().execute(async (transaction) => {
        if (setUp.sceneId) await holdSceneOf(transaction, householdId, setUp.sceneId);
        const made = await transaction
          .insertInto('wall')
          .values({ household_id: householdId, saved_by: accountId, ...columnsOf(setUp) })
          .returning('id')
          .executeTakeFirstOrThrow();
        return made.id;
      });
      return read(id);
    },

    /**
     * Saves over the newest revision and no other. A save whose answer was lost, sent again, is answered as it was the first time. A wall
     * that shows a scene from the bin may go on doing so.
     * @throws revision-moved (409), scene-not-here (422).
     */
    async save(id: string, revision: number, setUp: WallSetUp, { householdId, accountId }: ActingMember): Promise<Wall> {
      await db.transaction().execute(async (transaction) => {
        const held = await holdWall(transaction, id);
        if (!held) throw notFound();
        const isSame = isDeepStrictEqual(setUpOf(held), setUp);
        if (!mustWrite('wall', held, { revision, accountId, isSame })) return;
        if (setUp.sceneId && setUp.sceneId !== held.scene_id)
          await holdSceneOf(transaction, householdId, setUp.sceneId);
        await transaction
          .updateTable('wall')
          .set({ ...columnsOf(setUp), revision: revision + 1, saved_at: new Date(), saved_by: accountId })
          .where('id', '=', id)
          .execute();
        await announceWall(transaction, id);
      });
      return read(id);
    },

    /** With it go its screen's credential and its reports; its runs stay. */
    async remove(id: string): Promise<void> {
      await db.transaction().execute(async (transaction) => {
        await transaction.deleteFrom('wall').where('id', '=', id).execute();
        await announceWall(transaction, id);
      });
    },
  };
}
