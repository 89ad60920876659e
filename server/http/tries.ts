import { createHash } from 'node:crypto';
import type { Store } from 'express-rate-limit';
import { sql } from 'kysely';
import type { Logger } from 'pino';
import type { Database } from '../database/database';
import type { Jobs } from '../jobs/jobs';
import { purgeHour, purgeJob } from '../jobs/purging';

const isPast = sql<boolean>`tries.ends_at <= now()`;

/**
 * Counts tries by key for one limit, in the database: several servers count together, by the database's clock. Keys are network addresses and
 * e-mail addresses, and kept only as SHA-256.
 */
export function triesFor(limit: string, windowMs: number, db: Database, log: Logger): Store {
  const hashed = (key: string) => createHash('sha256').update(`${limit} ${key}`).digest();
  return {
    prefix: limit,
    localKeys: false,

    async increment(key) {
      const { count, ends_at } = await db
        .insertInto('tries')
        .values({ key: hashed(key), count: 1, ends_at: sql<Date>`now() + ${windowMs}::float8 * interval '1 millisecond'` })
        .onConflict((conflict) =>
          conflict.column('key').doUpdateSet({
            count: sql`case when ${isPast} then 1 else tries.count + 1 end`,
            ends_at: sql`case when ${isPast} then excluded.ends_at else tries.ends_at end`,
          }),
        )
        .returning(['count', 'ends_at'])
        .executeTakeFirstOrThrow();
      return { totalHits: count, resetTime: ends_at };
    },

    // Asked once the answer is out, when nobody is left to be told of a failure.
    async decrement(key) {
      const row = db.updateTable('tries').set({ count: sql`count - 1` }).where('key', '=', hashed(key)).where('count', '>', 0);
      await row.execute().catch((error: unknown) => log.warn({ err: error, limit }, 'a try that succeeded stays counted'));
    },

    async resetKey(key) {
      await db.deleteFrom('tries').where('key', '=', hashed(key)).execute();
    },
  };
}

const job = purgeJob('purge-tries');

export async function purgeTriesDaily(db: Database, jobs: Jobs): Promise<void> {
  await jobs.work(job, { run: async () => void (await db.deleteFrom('tries').where(isPast).execute()) });
  await jobs.daily(job, purgeHour);
}
