import { readdir } from 'node:fs/promises';
import { sql } from 'kysely';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { quadrants } from '../pictures/testing/quadrants';
import { upload } from '../pictures/testing/upload';
import { purgeScenes } from '../scenes/purge-scenes';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';
import { purgePhotos } from './purge-photos';

let app: TestApp;
interface Home {
  id: string;
  owner: SignedIn;
}
let here: Home;
let there: Home;
const home = async (): Promise<Home> => {
  const { id } = await app.household();
  return { id, owner: await app.signedIn('owner', id) };
};
beforeAll(async () => {
  app = await createTestApp();
  here = await home();
  there = await home();
});
afterAll(() => app.close());

const dayMs = 24 * 3600 * 1000;
const inDays = (days: number) => new Date(Date.now() + days * dayMs);
const purge = async (days: number) => {
  await purgePhotos(app.db, app.parts.storage, inDays(days));
  await purgeScenes(app.db, app.parts.storage, inDays(days));
};
/** Uploads, and waits for the derivatives. */
const add = async (file: Buffer, { id, owner }: Home): Promise<{ photoId: string; sha256: string }> => {
  const { photo } = (await upload(owner.browser, `/api/households/${id}/photos`, file, 'a.jpg')).body;
  const row = () =>
    app.db.selectFrom('photo').select(['state', 'sha256']).where('id', '=', photo.id).executeTakeFirstOrThrow();
  await expect.poll(async () => (await row()).state, { timeout: 15_000 }).toBe('ready');
  return { photoId: photo.id, sha256: (await row()).sha256 };
};
const bin = (photoId: string, { id, owner }: Home) =>
  owner.browser.ask('post', `/api/households/${id}/photos/bin`, { photoIds: [photoId] });
const status = async (photoId: string, { owner }: Home) =>
  (await owner.browser.ask('get', `/api/photos/${photoId}`)).status;
const objects = async (sha256: string) => {
  const all = await readdir(app.parts.config.storageDir, { recursive: true });
  return all.filter((path) => path.includes(sha256) && (path.startsWith('originals') || path.endsWith('.webp')));
};

describe('purging', () => {
  it('deletes a photo and all its objects after 30 days in the bin, and not before', async () => {
    const { photoId, sha256 } = await add(await quadrants(400, 300).jpeg().toBuffer(), here);
    expect(await objects(sha256)).toHaveLength(3);
    await purge(400);
    expect(await status(photoId, here)).toBe(200);
    await bin(photoId, here);
    await purge(29.9);
    expect(await status(photoId, here)).toBe(200);
    await purge(30.1);
    expect(await status(photoId, here)).toBe(404);
    expect(await objects(sha256)).toEqual([]);
  });

  it('spares a photo that is taken out of the bin while the purge is under way', async () => {
    const { photoId, sha256 } = await add(await quadrants(404, 300).jpeg().toBuffer(), here);
    await bin(photoId, here);
    const waiting = async () =>
      (await sql`select from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'`.execute(app.db)).rows.length;
    const purging = await app.db.transaction().execute(async (restoring) => {
      await restoring.updateTable('photo').set({ binned_at: null }).where('id', '=', photoId).execute();
      const begun = purge(31);
      await expect.poll(waiting, { timeout: 10_000 }).toBe(1);
      return { begun };
    });
    await purging.begun;
    expect(await status(photoId, here)).toBe(200);
    expect(await objects(sha256)).toHaveLength(3);
  });

  it('keeps objects that another household still has a photo of', async () => {
    const file = await quadrants(401, 300).jpeg().toBuffer();
    const ours = await add(file, here);
    const theirs = await add(file, there);
    expect(theirs.sha256).toBe(ours.sha256);
    await bin(ours.photoId, here);
    await purge(31);
    expect(await status(ours.photoId, here)).toBe(404);
    expect((await there.owner.browser.ask('get', `/api/photos/${theirs.photoId}/derivatives/320`)).status).toBe(200);
    expect((await there.owner.browser.ask('get', `/api/photos/${theirs.photoId}/original`)).status).toBe(200);
  });

  it('keeps a photo for as long as a scene shows it, and its image a while longer', async () => {
    const { photoId, sha256 } = await add(await quadrants(402, 300).jpeg().toBuffer(), here);
    const { scene } = (
      await here.owner.browser.ask('post', `/api/households/${here.id}/scenes`, { photoIds: [photoId] })
    ).body;
    const imageId = scene.document.layers[0].image.id as string;
    const image = async () => (await here.owner.browser.ask('get', `/api/images/${imageId}/320`)).status;
    expect(await image()).toBe(200);
    await bin(photoId, here);
    await purge(31);
    expect(await status(photoId, here)).toBe(200);

    await here.owner.browser.ask('delete', `/api/scenes/${scene.id}`);
    await purge(29);
    expect((await here.owner.browser.ask('post', `/api/scenes/${scene.id}/restoration`)).status).toBe(200);
    await here.owner.browser.ask('delete', `/api/scenes/${scene.id}`);
    // The scene goes with this purge, the photo with the next, the image 30 days after it was last shown.
    await purge(31);
    expect((await here.owner.browser.ask('get', `/api/scenes/${scene.id}`)).status).toBe(404);
    await purge(32);
    expect(await status(photoId, here)).toBe(404);
    expect(await image()).toBe(200);
    await purge(62);
    expect(await image()).toBe(404);
    expect(await objects(sha256)).toEqual([]);
  });

  it('spares an image that is taken again', async () => {
    const { scene } = (await here.owner.browser.ask('post', `/api/households/${here.id}/scenes`, {})).body;
    const file = await quadrants(403, 300).png().toBuffer();
    const { image } = (await upload(here.owner.browser, `/api/scenes/${scene.id}/images`, file, 'a.png')).body;
    await purge(0);
    const again = (await upload(here.owner.browser, `/api/scenes/${scene.id}/images`, file, 'a.png')).body;
    expect(again.image.id).toBe(image.id);
    await purge(31);
    expect((await here.owner.browser.ask('get', `/api/images/${image.id}/320`)).status).toBe(200);
  });
});
