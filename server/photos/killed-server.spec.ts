import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { startJobs } from '../jobs/jobs';
import { quadrants } from '../pictures/testing/quadrants';
import { upload } from '../pictures/testing/upload';
import { createTestApp, type TestApp } from '../testing/test-app';
import { derivativeJob, workOnDerivatives } from './derivative-job';

let app: TestApp;
beforeAll(async () => {
  app = await createTestApp();
});
afterAll(() => app.close());

it('a photo whose server is killed while making its derivatives becomes ready when the next server starts', async () => {
  const { db, parts } = app;
  const householdId = (await app.household()).id;
  const { browser } = await app.signedIn('designer', householdId);
  const file = await quadrants(500, 300).jpeg().toBuffer();
  const { id } = (await upload(browser, `/api/households/${householdId}/photos`, file, 'a.jpg')).body.photo;
  const state = async () =>
    (await db.selectFrom('photo').select('state').where('id', '=', id).executeTakeFirstOrThrow()).state;
  await expect.poll(state, { timeout: 10_000 }).toBe('ready');
  await parts.jobs.stop();

  // As if it had just been uploaded, and a server that will die takes its job.
  await db.updateTable('photo').set({ state: 'waiting' }).execute();
  const doomed = spawn(
    process.execPath,
    ['--import', 'tsx', 'server/jobs/testing/doomed-server.ts', parts.config.databaseUrl],
    { stdio: ['ignore', 'pipe', 'inherit'] },
  );
  const sender = await startJobs(parts.config.databaseUrl, parts.log);
  await sender.send(derivativeJob, { photoId: id });
  await sender.stop();
  await once(doomed.stdout, 'data');
  doomed.kill('SIGKILL');
  await once(doomed, 'exit');
  expect(await state()).toBe('waiting');

  const next = await startJobs(parts.config.databaseUrl, parts.log);
  await workOnDerivatives(db, parts.storage, next);
  await expect.poll(state, { timeout: 20_000 }).toBe('ready');
  await next.stop();
});
