import { isDeepStrictEqual } from 'node:util';
import type { Scene, SceneDocument } from '@oriel/shared/contracts/scenes';
import type { Database } from '../database/database';
import { mustWrite } from '../database/revisions';
import type { ActingMember } from '../http/acting-member';
import { notFound } from '../http/failure';
import { findPhotos, type PhotoRow } from '../photos/photo-queries';
import { titleFrom, titleOfCopy } from '../pictures/file-name';
import type { ReceivedFile } from '../pictures/receive-file';
import type { Storage } from '../storage/storage';
import { announceWallsShowing } from '../walls/wall-changes';
import type { LayerFiles } from './layer-files';
import { layerImages, type NamedImage, type PhotoOfLayer } from './layer-images';
import { withOwnImages } from './own-images';
import { inBin, photosNotHere } from './refusals';
import { findScene, holdScene, scenesOf, toScene, type SceneRow } from './scene-queries';
import { startingDocument } from './starting-document';

const asLayer = (photo: PhotoRow): PhotoOfLayer => ({
  sha256: photo.sha256,
  name: photo.name,
  width: photo.width,
  height: photo.height,
  hasAlpha: photo.has_alpha,
});

async function open(db: Database, id: string): Promise<SceneRow> {
  const row = await findScene(db, id);
  if (!row) throw notFound();
  if (row.binned_at) throw inBin();
  return row;
}

async function insert(db: Database, document: SceneDocument, { householdId, accountId }: ActingMember): Promise<Scene> {
  const { id } = await db
    .insertInto('scene')
    .values({ household_id: householdId, document: JSON.stringify(document), saved_by: accountId })
    .returning('id')
    .executeTakeFirstOrThrow();
  return toScene(await open(db, id));
}

/** Writes over the newest revision and no other, and tells the walls that show the scene. */
async function write(db: Database, id: string, revision: number, document: SceneDocument, accountId: string): Promise<void> {
  await db.transaction().execute(async (transaction) => {
    const held = await holdScene(transaction, id);
    if (!held) throw notFound();
    if (held.binned_at) throw inBin();
    const isSame = isDeepStrictEqual(held.document, document);
    if (!mustWrite('scene', held, { revision, accountId, isSame })) return;
    await transaction
      .updateTable('scene')
      .set({ document: JSON.stringify(document), revision: revision + 1, saved_at: new Date(), saved_by: accountId })
      .where('id', '=', id)
      .execute();
    await announceWallsShowing(transaction, id);
  });
}

const setBinned = (db: Database, id: string, binned: boolean): Promise<void> =>
  db.transaction().execute(async (transaction) => {
    await transaction
      .updateTable('scene')
      .set({ binned_at: binned ? new Date() : null })
      .where('id', '=', id)
      .where('binned_at', binned ? 'is' : 'is not', null)
      .execute();
    await announceWallsShowing(transaction, id);
  });

/** In the order asked for; the same photo may be asked for twice. @throws photo-not-here (422). */
async function photosIn(db: Database, householdId: string, ids: readonly string[]): Promise<PhotoRow[]> {
  if (ids.length === 0) return [];
  const found = new Map((await findPhotos(db, householdId, ids)).map((photo) => [photo.id, photo]));
  const missing = ids.filter((id) => !found.has(id) || found.get(id)?.binned_at);
  if (missing.length > 0) throw photosNotHere(missing);
  return ids.map((id) => found.get(id)!);
}

export type SceneService = ReturnType<typeof sceneService>;

export function sceneService(db: Database, storage: Storage, files: LayerFiles) {
  const images = layerImages(db, storage, files);

  return {
    list: async (householdId: string, bin: boolean): Promise<Scene[]> => (await scenesOf(db, householdId, bin)).map(toScene),

    /** @throws in-bin (404). */
    read: async (id: string): Promise<Scene> => toScene(await open(db, id)),

    /** @throws photo-not-here (422), nothing-opaque (422). */
    async create(name: string | undefined, photoIds: readonly string[], asker: ActingMember): Promise<Scene> {
      const photos = await photosIn(db, asker.householdId, photoIds);
      const layers: NamedImage[] = [];
      for (const photo of photos) layers.push(await images.fromPhoto(asker.householdId, asLayer(photo)));
      const own = photos.length === 1 ? titleFrom(photos[0].name) : 'Untitled scene';
      return insert(db, startingDocument(name ?? own, layers), asker);
    },

    /** @throws image-not-here (422). */
    add: async (document: SceneDocument, asker: ActingMember): Promise<Scene> =>
      insert(db, await withOwnImages(db, asker.householdId, document), asker),

    /**
     * Saves over the newest revision and no other. A save whose answer was lost, sent again, is answered as it was the first time.
     * @throws revision-moved (409), image-not-here (422), in-bin (404).
     */
    async save(id: string, revision: number, given: SceneDocument, { householdId, accountId }: ActingMember): Promise<Scene> {
      await write(db, id, revision, await withOwnImages(db, householdId, given), accountId);
      return toScene(await open(db, id));
    },

    /** A copy of the scene, or of the document given in its stead: how an edit that came too late is kept. */
    async duplicate(id: string, given: SceneDocument | undefined, asker: ActingMember): Promise<Scene> {
      const document = given ? await withOwnImages(db, asker.householdId, given) : (await open(db, id)).document;
      return insert(db, { ...document, name: titleOfCopy(document.name) }, asker);
    },

    bin: (id: string): Promise<void> => setBinned(db, id, true),

    async restore(id: string): Promise<Scene> {
      await setBinned(db, id, false);
      return toScene(await open(db, id));
    },

    imageFromFile: (householdId: string, file: ReceivedFile): Promise<NamedImage> => images.fromFile(householdId, file),

    async imageFromPhoto(householdId: string, photoId: string): Promise<NamedImage> {
      const [photo] = await photosIn(db, householdId, [photoId]);
      return images.fromPhoto(householdId, asLayer(photo));
    },
  };
}
