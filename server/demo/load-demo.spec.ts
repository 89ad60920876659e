import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readFile } from 'node:fs/promises';
import sharp from 'sharp';
import type { Scene } from '@oriel/shared/contracts/scenes';
import type { Wall } from '@oriel/shared/contracts/walls';
import { Browser } from '../testing/browser';
import { createTestApp, type TestApp } from '../testing/test-app';
import { loadDemo } from './load-demo';
import { readDemoFiles, type DemoAccount, type DemoScene } from './demo-files';

let app: TestApp;
let accounts: readonly DemoAccount[];
let written: readonly DemoScene[];

beforeAll(async () => {
  app = await createTestApp();
  ({ accounts, scenes: written } = await readDemoFiles('assets/demo'));
  await loadDemo(app.parts);
});
afterAll(() => app.close());

const signIn = async ({ email, password }: DemoAccount) => {
  const browser = new Browser(app.express);
  const answer = await browser.ask('post', '/api/session', { email, password });
  expect(answer.status, answer.text).toBe(200);
  return { browser, account: answer.body.account };
};
const scenesOf = async ({ browser, account }: Awaited<ReturnType<typeof signIn>>): Promise<Scene[]> =>
  (await browser.ask('get', `/api/households/${account.memberships[0].householdId}/scenes`)).body.scenes;

describe('the demo', () => {
  it('lets each of its people in, in their role, with the password that is shown', async () => {
    expect(accounts.map(({ role }) => role).sort()).toEqual(['designer', 'owner', 'tuner', 'viewer']);
    for (const person of accounts) {
      const { account } = await signIn(person);
      expect(account.memberships).toEqual([
        { householdId: expect.any(String), householdName: 'The Aldermoor house', role: person.role },
      ]);
    }
  });

  it('has its scenes in the order written, every layer drawn and where it belongs', async () => {
    const designer = await signIn(accounts.find(({ role }) => role === 'designer')!);
    const scenes = await scenesOf(designer);
    expect(scenes.map(({ document }) => document.name)).toEqual(written.map(({ name }) => name));
    for (const [index, scene] of scenes.entries())
      for (const [i, layer] of scene.document.layers.entries()) {
        const { name, depthMm, file, placed } = written[index].layers[i];
        expect(layer).toMatchObject({ name, depthMm });
        // One pixel of the file is as large after trimming as before.
        const { width } = await sharp(await readFile(`assets/demo/${file}`)).metadata();
        expect(layer.placed.widthMm / layer.image.width).toBeCloseTo(placed.widthMm / width, 9);
        const answer = await designer.browser.ask('get', `/api/images/${layer.image.id}/320`);
        expect(answer.status).toBe(200);
      }
  });

  it('has its photos, which become ready', async () => {
    const { browser, account } = await signIn(accounts[0]);
    const photos = async () =>
      (await browser.ask('get', `/api/households/${account.memberships[0].householdId}/photos`)).body.photos;
    expect((await photos()).length).toBeGreaterThan(0);
    await expect
      .poll(async () => (await photos()).every(({ state }: { state: string }) => state === 'ready'), {
        timeout: 20_000,
      })
      .toBe(true);
  });

  it('has a wall that shows the ridge, and which its tuner may set up', async () => {
    const { browser, account } = await signIn(accounts.find(({ role }) => role === 'tuner')!);
    const { walls } = (await browser.ask('get', `/api/households/${account.memberships[0].householdId}/walls`)).body;
    const scenes = await scenesOf({ browser, account });
    const ridge = scenes.find(({ document }) => document.name === 'October on the ridge')!;
    expect(walls).toMatchObject([
      { setUp: { name: 'Landing wall', sceneId: ridge.id }, revision: 1, savedBy: 'Maud Aldermoor', pairedAt: null },
    ]);
    const [wall] = walls as Wall[];
    const saved = await browser.ask('put', `/api/walls/${wall.id}`, { revision: 1, setUp: wall.setUp });
    expect(saved.status, saved.text).toBe(200);
  });

  it('is loaded once: what its people throw away stays away', async () => {
    const designer = await signIn(accounts.find(({ role }) => role === 'designer')!);
    const [scene, ...others] = await scenesOf(designer);
    await designer.browser.ask('delete', `/api/scenes/${scene.id}`);
    await loadDemo(app.parts);
    expect((await scenesOf(designer)).map(({ id }) => id)).toEqual(others.map(({ id }) => id));
  });

  it('begun by two servers at once, or cut off, is there once', async () => {
    await app.db.deleteFrom('milestone').execute();
    const count = async () => (await app.db.selectFrom('scene').select('id').execute()).length;
    const before = await count();
    await Promise.all([loadDemo(app.parts), loadDemo(app.parts)]);
    expect(await count()).toBe(before);
    for (const table of ['household', 'wall'] as const)
      expect((await app.db.selectFrom(table).select('id').execute()).length).toBe(1);
  });
});
