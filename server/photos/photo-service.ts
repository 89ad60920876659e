import type { Photo } from '@oriel/shared/contracts/photos';
import type { Database } from '../database/database';
import type { ActingMember } from '../http/acting-member';
import type { Jobs } from '../jobs/jobs';
import type { ReceivedFile } from '../pictures/receive-file';
import type { Storage } from '../storage/storage';
import { readCursor, writeCursor } from './cursor';
import { countPhotos, findPhotos, pageOfPhotos, readPhoto, toPhoto, type PhotoFilter } from './photo-queries';
import { receivePhoto, type Received } from './receive-photo';

export interface PhotoPage {
  readonly photos: Photo[];
  readonly next: string | null;
  readonly total: number;
}

export function photoService(db: Database, storage: Storage, jobs: Jobs) {
  return {
    receive: (file: ReceivedFile, member: ActingMember): Promise<Received> => receivePhoto({ db, storage, jobs }, file, member),

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

    read: (householdId: string, photoId: string) => readPhoto(db, householdId, photoId),

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
