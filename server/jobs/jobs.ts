import { CompiledQuery } from 'kysely';
import PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import type { Database } from '../database/database';
import type { DataOf, Job } from './job';
import { announceServer } from './sole-server';

interface Work<J extends Job> {
  /** Throwing means: try again, as often as the job allows. */
  readonly run: (data: DataOf<J>) => Promise<void>;
  /** After the last try, whether it threw or its server died. */
  readonly giveUp?: (data: DataOf<J>) => Promise<void>;
}

/** A queue in PostgreSQL: what is sent is done at least once, even if the server is killed while doing it. */
export interface Jobs {
  /** With `within`, the job exists only if that transaction is committed; `nudge` afterwards saves it the wait for the next look. */
  send<J extends Job>(job: J, data: DataOf<J>, within?: Database): Promise<void>;
  nudge(job: Job): void;
  work<J extends Job>(job: J, work: Work<J>): Promise<void>;
  /** Sends it every day at that hour, UTC, once however many servers run. */
  daily(job: Job, hour: number): Promise<void>;
  /** Takes no new job and waits for those under way. */
  stop(): Promise<void>;
}

/** How long a stopping server waits for the jobs under way; those cut off are tried again, ms. */
const patienceMs = 6_000;
const lookEveryS = 2;
const retryDelayS = 5;
const expiryCheckEveryS = 20;

/** Starts the queue in its own schema of the database. */
export async function startJobs(databaseUrl: string, log: Logger): Promise<Jobs> {
  const boss = new PgBoss({
    connectionString: databaseUrl,
    application_name: 'oriel jobs',
    schema: 'jobs',
    max: 3,
    maintenanceIntervalSeconds: expiryCheckEveryS,
  });
  boss.on('error', (error) => log.warn({ err: error }, 'the job queue met an error'));
  await boss.start();
  const presence = await announceServer(
    databaseUrl,
    () => tryOrphansAgain(boss),
    (error) => log.warn({ err: error }, 'the job queue lost a connection'),
  );

  const workers = new Map<string, string[]>();
  async function startWorkers<J extends Job>(
    name: string,
    job: J,
    run: (data: DataOf<J>) => Promise<void>,
  ): Promise<void> {
    const ids: string[] = [];
    for (let i = 0; i < job.atOnce; i++) {
      const handle = async ([given]: PgBoss.Job<unknown>[]) => {
        try {
          await run(job.data.parse(given.data) as DataOf<J>);
        } catch (error) {
          log.warn({ err: error, job: name, id: given.id }, 'a job failed');
          throw error;
        } finally {
          // Else a worker rests until its next look, however many jobs wait.
          boss.notifyWorker(ids[i]);
        }
      };
      ids.push(await boss.work(name, { batchSize: 1, pollingIntervalSeconds: lookEveryS }, handle));
    }
    workers.set(name, ids);
  }

  return {
    async send(job, data, within) {
      const db = within && {
        executeSql: async (text: string, values: unknown[]) => ({
          rows: (await within.executeQuery(CompiledQuery.raw(text, values))).rows,
        }),
      };
      await boss.send(job.name, data as object, db ? { db } : {});
    },

    nudge(job) {
      for (const id of workers.get(job.name) ?? []) boss.notifyWorker(id);
    },

    async work(job, { run, giveUp }) {
      await makeQueue(boss, givenUp(job), job);
      await makeQueue(boss, job.name, job, givenUp(job));
      await startWorkers(job.name, job, run);
      if (giveUp) await startWorkers(givenUp(job), { ...job, atOnce: 1 }, giveUp);
    },

    daily: (job, hour) => boss.schedule(job.name, `0 ${hour} * * *`, {}, { tz: 'UTC' }),

    async stop() {
      await boss.stop({ graceful: true, wait: true, timeout: patienceMs });
      await presence.leave();
    },
  };
}

const givenUp = (job: Job) => `${job.name}-given-up`;

/** Makes a queue, or brings the settings of an older one up to date. */
async function makeQueue(boss: PgBoss, name: string, job: Job, deadLetter?: string): Promise<void> {
  const options = {
    name,
    retryLimit: job.retries,
    retryDelay: retryDelayS,
    expireInSeconds: job.expiresAfterS,
    ...(deadLetter ? { deadLetter } : {}),
  };
  await boss.createQueue(name, options);
  await boss.updateQueue(name, options);
}

/** Hands jobs that a killed server left under way to another try; where other servers are at work, only their expiry tells. */
async function tryOrphansAgain(boss: PgBoss): Promise<void> {
  const orphans = `select name, id from jobs.job where state = 'active' and not starts_with(name, '__pgboss')`;
  const { rows } = await boss.getDb().executeSql(orphans, []);
  for (const { name, id } of rows as { name: string; id: string }[])
    await boss.fail(name, id, { reason: 'its server was killed' });
}
