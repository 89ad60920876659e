import type { Photo } from '@oriel/shared/contracts/photos';
import type { Database } from '../database/database';
import { notFound } from '../http/failure';
import type { Jobs } from '../jobs/jobs';
import { inspectPicture } from '../pictures/inspect-picture';
import type { ReceivedFile } from '../pictures/receive-file';
import { lockContent, removeUnreferenced } from '../storage/content';
import { originalKey } from '../storage/keys';
import type { Storage } from '../storage/storage';
import { readCursor, writeCursor } from './cursor';
import { derivativeJob } from './derivative-job';
import {
  countPhotos,
  findPhotoByContent,
  findPhotos,
  pageOfPhotos,
  toPhoto,
  type PhotoFilter,
  type PhotoRow,
} from './photo-queries';

interface Owner {
  readonly householdId: string;
  readonly accountId: string;
}

export interface PhotoPage {
  readonly photos: Photo[];
  readonly next: string | null;
  readonly total: number;
}

export function photoService(db: Database, storage: Storage, jobs: Jobs) {
  /** Brings a photo back whose content is uploaded again: out of the bin, and to another try if its derivatives failed. */
  async function welcomeBack(existing: PhotoRow): Promise<PhotoRow> {
    const again = existing.state === 'failed';
    await db.transaction().execute(async (transaction) => {
      await transaction
        .updateTable('photo')
        .set({ binned_at: null, ...(again ? { state: 'waiting', problem: null } : {}) })
        .where('id', '=', existing.id)
        .execute();
      if (again) await jobs.send(derivativeJob, { photoId: existing.id }, transaction);
    });
    return read(existing.household_id, existing.id);
  }

  async function read(householdId: string, photoId: string): Promise<PhotoRow> {
    const [row] = await findPhotos(db, householdId, [photoId]);
    if (!row) throw notFound();
    return row;
  }

  /** Keeps the original and its row together, or neither. Null when the same content came in by another upload meanwhile. */
  async function keep(file: ReceivedFile, { householdId, accountId }: Owner): Promise<string | null> {
    const facts = await inspectPicture(file.path);
    return db.transaction().execute(async (transaction) => {
      await lockContent(transaction, file.sha256);
      const row = await transaction
        .insertInto('photo')
        .values({
          household_id: householdId,
          sha256: file.sha256,
          name: file.name,
          mime: facts.mime,
          bytes: file.bytes,
          width: facts.width,
          height: facts.height,
          has_alpha: facts.hasAlpha,
          taken_at: facts.takenAt ?? file.modifiedAt ?? new Date(),
          uploaded_by: accountId,
        })
        .onConflict((conflict) => conflict.constraint('photo_once').doNothing())
        .returning('id')
        .executeTakeFirst();
      if (!row) return null;
      await jobs.send(derivativeJob, { photoId: row.id }, transaction);
      if (!(await storage.exists(originalKey(file.sha256)))) await storage.putFile(originalKey(file.sha256), file.path);
      return row.id;
    });
  }

  return {
    /**
     * Takes an uploaded file in. The same content, already in this household, is the same photo, whatever the file is called.
     * @throws the refusals of `inspectPicture`; nothing is left behind then.
     */
    async receive(file: ReceivedFile, owner: Owner): Promise<{ photo: Photo; duplicate: boolean }> {
      const known = await findPhotoByContent(db, owner.householdId, file.sha256);
      if (known) return { photo: toPhoto(await welcomeBack(known)), duplicate: true };
      try {
        const id = await keep(file, owner);
        jobs.nudge(derivativeJob);
        if (id) return { photo: toPhoto(await read(owner.householdId, id)), duplicate: false };
      } catch (error) {
        await removeUnreferenced(db, storage, file.sha256);
        throw error;
      }
      const twin = await findPhotoByContent(db, owner.householdId, file.sha256);
      if (!twin) throw notFound();
      return { photo: toPhoto(await welcomeBack(twin)), duplicate: true };
    },

    async list(filter: PhotoFilter, after: string | undefined, limit: number): Promise<PhotoPage> {
      const rows = await pageOfPhotos(db, filter, after ? readCursor(after) : null, limit + 1);
      const page = rows.slice(0, limit);
      const last = rows.length > limit ? page[page.length - 1] : null;
      return {
        photos: page.map(toPhoto),
        next: last && writeCursor({ takenAt: last.taken_at, id: last.id }),
        total: await countPhotos(db, filter),
      };
    },

    read,

    /** Those of the photos that there are. */
    readSome: async (householdId: string, ids: readonly string[]): Promise<Photo[]> =>
      (await findPhotos(db, householdId, ids)).map(toPhoto),

    /** Puts photos into the bin, or takes them out; a photo already there keeps its day. */
    async setBinned(householdId: string, ids: readonly string[], binned: boolean): Promise<Photo[]> {
      await db
        .updateTable('photo')
        .set({ binned_at: binned ? new Date() : null })
        .where('household_id', '=', householdId)
        .where('id', 'in', ids)
        .where('binned_at', binned ? 'is' : 'is not', null)
        .execute();
      return (await findPhotos(db, householdId, ids)).map(toPhoto);
    },
  };
}
