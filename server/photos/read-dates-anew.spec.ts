import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { quadrants } from '../pictures/testing/quadrants';
import { upload } from '../pictures/testing/upload';
import { createTestApp, type TestApp } from '../testing/test-app';

let app: TestApp;
beforeAll(async () => void (app = await createTestApp()));
afterAll(() => app.close());

describe('dates read anew', () => {
  it('are what the camera’s clock showed, at the first start of a server that knows; others stay', async () => {
    const { id } = await app.household();
    const { browser } = await app.signedIn('owner', id);
    const add = async (file: Buffer) => (await upload(browser, `/api/households/${id}/photos`, file, 'a.jpg')).body.photo.id as string;
    const exif = { IFD2: { DateTimeOriginal: '2021:12:31 23:30:00', OffsetTimeOriginal: '+05:45' } };
    const [dated, undated] = [await add(await quadrants().jpeg().withExif(exif).toBuffer()), await add(await quadrants(40, 30).png().toBuffer())];
    // As dates were taken in once: in UTC, by the offset.
    const shifted = new Date('2021-12-31T17:45:00Z');
    await app.db.updateTable('photo').set({ taken_at: shifted }).execute();
    const dateOf = async (photoId: string) =>
      (await app.db.selectFrom('photo').select('taken_at').where('id', '=', photoId).executeTakeFirstOrThrow()).taken_at.toISOString();

    const reached = () => app.db.selectFrom('milestone').selectAll().where('name', 'like', 'photo dates%').execute();
    await expect.poll(reached, { timeout: 8000 }).toHaveLength(1);
    await app.db.deleteFrom('milestone').execute();
    const newer = await createTestApp({ beside: app });
    await expect.poll(reached, { timeout: 8000 }).toHaveLength(1);
    await newer.close();
    expect(await dateOf(dated)).toBe('2021-12-31T23:30:00.000Z');
    expect(await dateOf(undated)).toBe(shifted.toISOString());
  });
});
