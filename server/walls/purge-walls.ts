import type { Database } from '../database/database';
import type { Jobs } from '../jobs/jobs';
import { purgeHour, purgeJob } from '../jobs/purging';
import { forgetExpiredPairings } from './pairing';
import { forgetOldReports } from './reports';

const job = purgeJob('purge-walls');

/** Forgets old reports and codes that nobody entered. */
export async function purgeWallsDaily(db: Database, jobs: Jobs): Promise<void> {
  await jobs.work(job, {
    run: async () => {
      await forgetOldReports(db);
      await forgetExpiredPairings(db);
    },
  });
  await jobs.daily(job, purgeHour);
}
