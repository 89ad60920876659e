import { purgeTriesDaily } from './http/tries';
import type { Parts } from './parts';
import { workOnDerivatives } from './photos/derivative-job';
import { purgePhotosDaily } from './photos/purge-photos';
import { readDatesAnewOnce } from './photos/read-dates-anew';
import { purgeScenesDaily } from './scenes/purge-scenes';
import { purgeWallsDaily } from './walls/purge-walls';

/** Takes up the work that is done apart from requests. */
export async function startWork({ connection: { db }, storage, jobs }: Parts): Promise<void> {
  await workOnDerivatives(db, storage, jobs);
  await purgePhotosDaily(db, storage, jobs);
  await readDatesAnewOnce(db, storage, jobs);
  await purgeScenesDaily(db, storage, jobs);
  await purgeWallsDaily(db, jobs);
  await purgeTriesDaily(db, jobs);
}
