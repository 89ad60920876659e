import * as z from 'zod';
import type { Database } from '../database/database';
import { once } from '../database/once';
import { defineJob } from '../jobs/job';
import type { Jobs } from '../jobs/jobs';
import { takenDateOfFile } from '../pictures/taken-date';
import { originalKey } from '../storage/keys';
import type { Storage } from '../storage/storage';

const job = defineJob({ name: 'photo-dates', data: z.object({}), retries: 3, expiresAfterS: 3600, atOnce: 1 });
const milestone = 'photo dates by the clock of the camera';

/** Reads from every original again when it was taken. Photos whose file does not say, or cannot be read, keep the date they have. */
async function readDatesAnew(db: Database, storage: Storage): Promise<void> {
  const photos = await db.selectFrom('photo').select(['id', 'sha256', 'taken_at']).execute();
  for (const { id, sha256, taken_at } of photos) {
    const key = originalKey(sha256);
    // Purged meanwhile: nothing to mend. Where the storage fails, so does the job, and is tried again.
    if (!(await storage.exists(key))) continue;
    const takenAt = await storage.withFile(key, (path) => takenDateOfFile(path).catch(() => null));
    if (takenAt && takenAt.getTime() !== taken_at.getTime())
      await db.updateTable('photo').set({ taken_at: takenAt }).where('id', '=', id).execute();
  }
}

/** Mends, once in the life of a database, the dates that were once shifted by EXIF's offset from UTC. */
export async function readDatesAnewOnce(db: Database, storage: Storage, jobs: Jobs): Promise<void> {
  await jobs.work(job, { run: () => once(db, milestone, () => readDatesAnew(db, storage)) });
  await jobs.send(job, {});
}
