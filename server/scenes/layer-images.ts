import type { LayerImage } from '@oriel/shared/contracts/scenes';
import type { Database } from '../database/database';
import { titleFrom } from '../pictures/file-name';
import { inspectPicture } from '../pictures/inspect-picture';
import { openPicture } from '../pictures/open-picture';
import type { ReceivedFile } from '../pictures/receive-file';
import { truncated } from '../pictures/refusals';
import { lockContent, removeUnreferenced } from '../storage/content';
import { originalKey } from '../storage/keys';
import type { Storage } from '../storage/storage';
import { reuseImage } from './image-queries';
import type { LayerFiles } from './layer-files';
import { opaqueBounds } from './opaque-bounds';
import { nothingOpaque } from './refusals';

export interface NamedImage {
  readonly image: LayerImage;
  readonly name: string;
}

export interface PhotoOfLayer {
  readonly sha256: string;
  readonly name: string;
  readonly width: number;
  readonly height: number;
  readonly hasAlpha: boolean;
}

type Trimmed = Omit<LayerImage, 'id'>;

/** Makes layer images: the same content in one household is one image, however often it is taken. */
export function layerImages(db: Database, storage: Storage, files: LayerFiles) {
  async function trimmed(path: string, of: Omit<PhotoOfLayer, 'sha256'>): Promise<Trimmed> {
    const whole = { left: 0, top: 0, width: of.width, height: of.height };
    const bounds = of.hasAlpha ? await boundsOf(path) : whole;
    if (!bounds) throw nothingOpaque(of.name);
    const { left, top, width, height } = bounds;
    return { width, height, trim: { left, top, ofWidth: of.width, ofHeight: of.height } };
  }

  async function keep(householdId: string, sha256: string, image: Trimmed, path?: string): Promise<LayerImage> {
    const id = await db.transaction().execute(async (transaction) => {
      await lockContent(transaction, sha256);
      const twin = await reuseImage(transaction, householdId, sha256);
      if (twin) return twin.id;
      const row = await transaction
        .insertInto('layer_image')
        .values({
          household_id: householdId,
          sha256,
          width: image.width,
          height: image.height,
          trim: JSON.stringify(image.trim),
        })
        .returning('id')
        .executeTakeFirstOrThrow();
      if (path && !(await storage.exists(originalKey(sha256)))) await storage.putFile(originalKey(sha256), path);
      return row.id;
    });
    files.prepare({ sha256, ...image });
    return { id, ...image };
  }

  return {
    /** @throws nothing-opaque (422), truncated (422). */
    async fromPhoto(householdId: string, photo: PhotoOfLayer): Promise<NamedImage> {
      const name = titleFrom(photo.name);
      const known = await reuseImage(db, householdId, photo.sha256);
      if (known) return { image: known, name };
      const image = await storage.withFile(originalKey(photo.sha256), (path) => trimmed(path, photo));
      return { image: await keep(householdId, photo.sha256, image), name };
    },

    /** @throws the refusals of `inspectPicture`, and nothing-opaque (422); nothing is left behind then. */
    async fromFile(householdId: string, file: ReceivedFile): Promise<NamedImage> {
      const name = titleFrom(file.name);
      const known = await reuseImage(db, householdId, file.sha256);
      if (known) return { image: known, name };
      const facts = await inspectPicture(file.path);
      const image = await trimmed(file.path, { ...facts, name: file.name });
      try {
        return { image: await keep(householdId, file.sha256, image, file.path), name };
      } catch (error) {
        await removeUnreferenced(db, storage, file.sha256);
        throw error;
      }
    },
  };
}

const boundsOf = async (path: string) => {
  const picture = await openPicture(path).catch(() => {
    throw truncated();
  });
  return opaqueBounds(picture).catch(() => {
    throw truncated();
  });
};
