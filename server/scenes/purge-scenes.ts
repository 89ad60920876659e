import { sql } from 'kysely';
import type { Database } from '../database/database';
import type { Jobs } from '../jobs/jobs';
import { binnedBefore, purgeHour, purgeJob } from '../jobs/purging';
import { forgetContent } from '../storage/content';
import type { Storage } from '../storage/storage';

const job = purgeJob('purge-scenes');

const shown = sql<boolean>`layer_image.id in (
  select (layer -> 'image' ->> 'id')::uuid
  from scene cross join lateral jsonb_array_elements(scene.document -> 'layers') as layer
)`;

/** Deletes for good the scenes that have lain in the bin for their time, then the images that no scene has shown for as long. */
export async function purgeScenes(db: Database, storage: Storage, now = new Date()): Promise<void> {
  await db.deleteFrom('scene').where('binned_at', '<', binnedBefore(now)).execute();

  await db
    .updateTable('layer_image')
    .set({ unused_since: null })
    .where('unused_since', 'is not', null)
    .where(shown)
    .execute();
  await db
    .updateTable('layer_image')
    .set({ unused_since: now })
    .where('unused_since', 'is', null)
    .where((where) => where.not(shown))
    .execute();

  const due = await db
    .selectFrom('layer_image')
    .select(['id', 'sha256'])
    .where('unused_since', '<', binnedBefore(now))
    .execute();
  for (const { id, sha256 } of due)
    await forgetContent(db, storage, sha256, async (transaction) => {
      await transaction
        .deleteFrom('layer_image')
        .where('id', '=', id)
        .where('unused_since', 'is not', null)
        .where((where) => where.not(shown))
        .execute();
    });
}

export async function purgeScenesDaily(db: Database, storage: Storage, jobs: Jobs): Promise<void> {
  await jobs.work(job, { run: () => purgeScenes(db, storage) });
  await jobs.daily(job, purgeHour);
}
