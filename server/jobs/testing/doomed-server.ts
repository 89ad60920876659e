import { pino } from 'pino';
import { derivativeJob } from '../../photos/derivative-job';
import { startJobs } from '../jobs';

/** A server that takes a photo's job and never ends it, so that a test can kill it while it is at work. Told the database by its first argument. */
const jobs = await startJobs(process.argv[2], pino({ level: 'silent' }));
await jobs.work(derivativeJob, {
  run: () => {
    process.stdout.write('at work\n');
    return new Promise(() => undefined);
  },
});
