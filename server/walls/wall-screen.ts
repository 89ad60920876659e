import type { Scene } from '@oriel/shared/contracts/scenes';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import type { Database } from '../database/database';
import { notPaired } from '../http/failure';
import { findImage, type ImageRow } from '../scenes/image-queries';
import { findScene, toScene } from '../scenes/scene-queries';
import { findWall, setUpOf } from './wall-queries';

export interface Showing {
  readonly wallId: string;
  readonly setUp: WallSetUp;
  readonly revision: number;
  readonly scene: Scene | null;
}

/** What a wall's own screen may see. */
export function wallScreen(db: Database) {
  async function sceneShown(sceneId: string | null): Promise<Scene | null> {
    const row = sceneId ? await findScene(db, sceneId) : undefined;
    return row && !row.binned_at ? toScene(row) : null;
  }

  async function shows(wallId: string): Promise<Showing> {
    const wall = await findWall(db, wallId);
    if (!wall) throw notPaired();
    return { wallId, setUp: setUpOf(wall), revision: wall.revision, scene: await sceneShown(wall.scene_id) };
  }

  return {
    shows,

    async heard(wallId: string): Promise<void> {
      await db.updateTable('wall').set({ heard_at: new Date() }).where('id', '=', wallId).execute();
    },

    /** An image of the scene the wall shows; undefined for any other. */
    async image(wallId: string, imageId: string): Promise<ImageRow | undefined> {
      const { scene } = await shows(wallId);
      return scene?.document.layers.some(({ image }) => image.id === imageId) ? findImage(db, imageId) : undefined;
    },
  };
}
