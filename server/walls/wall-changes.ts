import type { Database } from '../database/database';
import { announce } from '../events/changes';

/** The topic of whatever a wall's screen has to know of. */
export const wallTopic = (wallId: string) => `wall ${wallId}`;

export const announceWall = (transaction: Database, wallId: string): Promise<void> =>
  announce(transaction, [wallTopic(wallId)]);

/** Tells every wall that shows this scene. */
export async function announceWallsShowing(transaction: Database, sceneId: string): Promise<void> {
  const walls = await transaction.selectFrom('wall').select('id').where('scene_id', '=', sceneId).execute();
  await announce(
    transaction,
    walls.map(({ id }) => wallTopic(id)),
  );
}
