import { sql } from 'kysely';
import type { Database } from '../database/database';
import type { Jobs } from '../jobs/jobs';
import { binnedBefore, purgeHour, purgeJob } from '../jobs/purging';
import { forgetContent } from '../storage/content';
import type { Storage } from '../storage/storage';

const job = purgeJob('purge-photos');

/** Whether some scene, in the bin or not, shows an image made from the photo's content. */
const shownInScene = sql<boolean>`exists (
  select from scene
  cross join lateral jsonb_array_elements(scene.document -> 'layers') as layer
  join layer_image on layer_image.id = (layer -> 'image' ->> 'id')::uuid
  where layer_image.household_id = photo.household_id and layer_image.sha256 = photo.sha256
)`;

/** Deletes for good what has lain in the bin for its time, except photos that a scene shows. */
export async function purgePhotos(db: Database, storage: Storage, now = new Date()): Promise<void> {
  const due = await db
    .selectFrom('photo')
    .select(['id', 'sha256'])
    .where('binned_at', '<', binnedBefore(now))
    .where((where) => where.not(shownInScene))
    .execute();
  for (const { id, sha256 } of due)
    await forgetContent(db, storage, sha256, async (transaction) => {
      // Asked again of the row itself, for it may be taken out of the bin at this very moment.
      await transaction
        .deleteFrom('photo')
        .where('id', '=', id)
        .where('binned_at', '<', binnedBefore(now))
        .where((where) => where.not(shownInScene))
        .execute();
    });
}

export async function purgePhotosDaily(db: Database, storage: Storage, jobs: Jobs): Promise<void> {
  await jobs.work(job, { run: () => purgePhotos(db, storage) });
  await jobs.daily(job, purgeHour);
}
