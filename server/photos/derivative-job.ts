import * as z from 'zod';
import { Id } from '@oriel/shared/contracts/fields';
import type { Database } from '../database/database';
import { defineJob } from '../jobs/job';
import type { Jobs } from '../jobs/jobs';
import { lockContent } from '../storage/content';
import { derivativeKey, originalKey } from '../storage/keys';
import type { Storage } from '../storage/storage';
import { makeDerivatives } from './derivatives';

export const derivativeJob = defineJob({
  name: 'photo-derivatives',
  data: z.object({ photoId: Id }),
  retries: 2,
  expiresAfterS: 120,
  atOnce: 2,
});

const problem =
  'The smaller versions could not be made: the file is damaged inside, or needs more memory than this server has. Upload it again, or save it anew as JPEG.';

/** Makes the derivatives of one photo. May run twice for the same photo: the second finds nothing to do, or writes the same again. */
async function deriveFrom(db: Database, storage: Storage, photoId: string): Promise<void> {
  const photo = await db.selectFrom('photo').select(['sha256', 'state']).where('id', '=', photoId).executeTakeFirst();
  if (!photo || photo.state === 'ready') return;
  const made = await storage.withFile(originalKey(photo.sha256), makeDerivatives);

  await db.transaction().execute(async (transaction) => {
    await lockContent(transaction, photo.sha256);
    const { numUpdatedRows } = await transaction
      .updateTable('photo')
      .set({ state: 'ready', problem: null, placeholder: made.placeholder })
      .where('id', '=', photoId)
      .executeTakeFirst();
    // Purged meanwhile: what would be written now, nothing would ever remove.
    if (numUpdatedRows === 0n) return;
    for (const { edge, bytes } of made.files) await storage.put(derivativeKey(photo.sha256, edge), bytes);
  });
}

async function giveUp(db: Database, photoId: string): Promise<void> {
  await db
    .updateTable('photo')
    .set({ state: 'failed', problem })
    .where('id', '=', photoId)
    .where('state', '=', 'waiting')
    .execute();
}

export const workOnDerivatives = (db: Database, storage: Storage, jobs: Jobs): Promise<void> =>
  jobs.work(derivativeJob, {
    run: ({ photoId }) => deriveFrom(db, storage, photoId),
    giveUp: ({ photoId }) => giveUp(db, photoId),
  });
