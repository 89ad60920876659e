import { request as httpRequest, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { readdir, readFile } from 'node:fs/promises';
import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { Photo } from '@oriel/shared/contracts/photos';
import { pngBomb } from '../pictures/testing/hostile-files';
import { quadrants, quartersOf, uprightQuarters } from '../pictures/testing/quadrants';
import { upload } from '../pictures/testing/upload';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';

let app: TestApp;
let householdId: string;
let designer: SignedIn;
let server: Server;

beforeAll(async () => {
  app = await createTestApp();
  householdId = (await app.household()).id;
  designer = await app.signedIn('designer', householdId);
  server = app.express.listen(0, '127.0.0.1');
});
afterAll(async () => {
  server.close();
  await app.close();
});
/** Whatever a test did, nothing stays on its way in. */
afterEach(async () => {
  await expect.poll(() => readdir(app.parts.storage.incomingDir)).toEqual([]);
});

const photosPath = () => `/api/households/${householdId}/photos`;
const send = (file: Buffer, name = 'photo.jpg', lastModified?: string) =>
  upload(designer.browser, photosPath(), file, name, lastModified);
const sent = async (file: Buffer, name?: string, lastModified?: string): Promise<Photo> => {
  const answer = await send(file, name, lastModified);
  expect(answer.status, answer.text).toBe(200);
  return Photo.parse(answer.body.photo);
};
const get = (path: string) => designer.browser.ask('get', path);
const ready = async (id: string): Promise<Photo> => {
  await expect.poll(async () => (await get(`/api/photos/${id}`)).body.photo.state, { timeout: 20_000 }).toBe('ready');
  return (await get(`/api/photos/${id}`)).body.photo;
};
const derivative = async (id: string, edge: number) =>
  (await get(`/api/photos/${id}/derivatives/${edge}`)).body as Buffer;
const rows = async () => (await app.db.selectFrom('photo').select('id').execute()).length;
const originals = () => readdir(`${app.parts.config.storageDir}/originals`).catch(() => []);
const fixture = (name: string) => readFile(new URL(`../pictures/fixtures/${name}`, import.meta.url));

describe('an uploaded photo', () => {
  it.each(['jpeg', 'png', 'webp', 'avif', 'tiff', 'gif'] as const)(
    'becomes upright derivatives from %s',
    async (format) => {
      const photo = await sent(await quadrants(1000, 640).toFormat(format).toBuffer(), `picture.${format}`);
      expect(photo).toMatchObject({
        width: 1000,
        height: 640,
        mime: `image/${format}`,
        state: 'waiting',
        placeholder: null,
      });
      await ready(photo.id);
      expect(await quartersOf(await derivative(photo.id, 320))).toEqual(uprightQuarters);
    },
  );

  it('becomes upright derivatives from HEIC, turned once', async () => {
    const photo = await sent(await fixture('turned.heic'), 'IMG_0001.HEIC');
    expect(photo).toMatchObject({ width: 120, height: 80, mime: 'image/heic' });
    await ready(photo.id);
    const file = await derivative(photo.id, 320);
    expect(await sharp(file).metadata()).toMatchObject({ format: 'webp', width: 120, height: 80 });
    expect(await quartersOf(file)).toEqual(uprightQuarters);
  });

  it('has derivatives of each size, never enlarged, and a placeholder', async () => {
    const { id } = await sent(await quadrants(2000, 1200).jpeg().toBuffer(), 'sizes.jpg');
    const { placeholder } = await ready(id);
    expect(Buffer.from(placeholder!, 'base64').length).toBeGreaterThan(4);
    const sizes = [];
    for (const edge of [320, 800, 1600, 3200]) {
      const { width, height } = await sharp(await derivative(id, edge)).metadata();
      sizes.push([width, height]);
    }
    expect(sizes).toEqual([
      [320, 192],
      [800, 480],
      [1600, 960],
      [2000, 1200],
    ]);
    expect((await get(`/api/photos/${id}/derivatives/500`)).status).toBe(400);
  });

  it('security: leaves place and camera behind in its derivatives, and keeps them in the original alone', async () => {
    const file = await quadrants(400, 300)
      .jpeg()
      .withExif({
        IFD0: { Make: 'Alder Optics' },
        IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1', GPSLongitudeRef: 'W', GPSLongitude: '0/1 7/1 0/1' },
      })
      .toBuffer();
    expect(file.includes('Alder Optics')).toBe(true);
    const { id } = await sent(file, 'place.jpg');
    await ready(id);
    for (const edge of [320, 800]) {
      const small = await derivative(id, edge);
      const { exif, xmp, icc, iptc } = await sharp(small).metadata();
      expect([exif, xmp, icc, iptc]).toEqual([undefined, undefined, undefined, undefined]);
      expect(small.includes('Alder Optics')).toBe(false);
    }
    const original = await get(`/api/photos/${id}/original`);
    expect(
      createHash('sha256')
        .update(original.body as Buffer)
        .digest('hex'),
    ).toBe(createHash('sha256').update(file).digest('hex'));
    expect(original.headers['content-disposition']).toBe('attachment; filename=place.jpg');
    const viewer = await app.signedIn('viewer', householdId);
    expect((await viewer.browser.ask('get', `/api/photos/${id}/original`)).status).toBe(403);
    expect((await viewer.browser.ask('get', `/api/photos/${id}/derivatives/320`)).status).toBe(200);
  });

  it('is kept by the browser, for that household alone', async () => {
    const { id } = await sent(await quadrants(90, 60).jpeg().toBuffer());
    await ready(id);
    const first = await get(`/api/photos/${id}/derivatives/320`);
    expect(first.headers).toMatchObject({
      'content-type': 'image/webp',
      'cache-control': 'private, max-age=31536000, immutable',
      'x-content-type-options': 'nosniff',
    });
    const again = await designer.browser
      .prepare('get', `/api/photos/${id}/derivatives/320`)
      .set('If-None-Match', first.headers['etag']);
    expect(again.status).toBe(304);
    const stranger = await app.signedIn('owner');
    expect((await stranger.browser.ask('get', `/api/photos/${id}/derivatives/320`)).status).toBe(404);
  });

  it('says "not yet" until its derivatives are made', async () => {
    const { id } = await sent(await quadrants(91, 60).jpeg().toBuffer());
    await ready(id);
    const { sha256 } = await app.db.selectFrom('photo').select('sha256').where('id', '=', id).executeTakeFirstOrThrow();
    await app.parts.storage.remove(`derivatives/${sha256}/320.webp`);
    const answer = await get(`/api/photos/${id}/derivatives/320`);
    expect([answer.status, answer.body.code]).toEqual([404, 'not-yet']);
    expect(answer.headers['cache-control']).not.toMatch(/immutable/);
  });

  it('says in plain words when its derivatives cannot be made, and gets another try when it is sent again', async () => {
    // Whole as a container, so that it is let in; damaged inside.
    const damaged = await fixture('wide-colour.heic');
    damaged.fill(0, damaged.indexOf('mdat') + 4);
    const { id } = await sent(damaged, 'damaged.heic');
    await expect
      .poll(async () => (await get(`/api/photos/${id}`)).body.photo.state, { timeout: 28_000 })
      .toBe('failed');
    expect((await get(`/api/photos/${id}`)).body.photo.problem).toMatch(/Upload it again/);
    const again = await send(damaged, 'damaged.heic');
    expect(again.body).toMatchObject({ duplicate: true, photo: { id, state: 'waiting', problem: null } });
  });

  it('was taken when EXIF says, else when its file was last changed, else now', async () => {
    const exif = await quadrants(92, 60)
      .jpeg()
      .withExif({ IFD2: { DateTimeOriginal: '2011:07:09 10:00:00', OffsetTimeOriginal: '+02:00' } })
      .toBuffer();
    expect((await sent(exif, 'a.jpg', '1500000000000')).takenAt).toBe('2011-07-09T10:00:00.000Z');
    expect((await sent(await quadrants(93, 60).jpeg().toBuffer(), 'b.jpg', '1500000000000')).takenAt).toBe(
      '2017-07-14T02:40:00.000Z',
    );
    expect((await sent(await quadrants(94, 60).jpeg().toBuffer(), 'c.jpg', '2018-01-02T03:04:05Z')).takenAt).toBe(
      '2018-01-02T03:04:05.000Z',
    );
    const now = await sent(await quadrants(95, 60).jpeg().toBuffer(), 'd.jpg', 'some day');
    expect(Math.abs(Date.parse(now.takenAt) - Date.now())).toBeLessThan(60_000);
  });

  it.each([
    ['Ümläute 家族.jpg', 'Ümläute 家族.jpg'],
    ['C:\\Users\\me\\holiday.jpg', 'holiday.jpg'],
    ['../../../etc/passwd', 'passwd'],
    [`${'long'.repeat(100)}.jpg`, 'long'.repeat(50)],
  ])('security: is called %s, without any folder', async (given, kept) => {
    const size = 100 + (Buffer.from(given).reduce((sum, byte) => sum + byte, 0) % 400);
    expect((await sent(await quadrants(size, 50).png().toBuffer(), given)).name).toBe(kept);
  });
});

describe('the same content', () => {
  it('is the same photo, whatever the file is called; from the bin it comes back', async () => {
    const file = await quadrants(201, 100).jpeg().toBuffer();
    const first = await send(file, 'first.jpg');
    expect(first.body.duplicate).toBe(false);
    const { id } = first.body.photo;
    await designer.browser.ask('post', `${photosPath()}/bin`, { photoIds: [id] });
    const second = await send(file, 'second.jpg');
    expect(second.body).toMatchObject({ duplicate: true, photo: { id, name: 'first.jpg', binnedAt: null } });
  });

  it('sent many times at once becomes one photo', async () => {
    const file = await quadrants(202, 100).jpeg().toBuffer();
    const before = await rows();
    const answers = await Promise.all(Array.from({ length: 6 }, () => send(file, 'double-click.jpg')));
    expect(answers.map(({ status }) => status)).toEqual(Array(6).fill(200));
    expect(answers.filter(({ body }) => !body.duplicate)).toHaveLength(1);
    expect(new Set(answers.map(({ body }) => body.photo.id)).size).toBe(1);
    expect(await rows()).toBe(before + 1);
  });

  it('in another household is a photo of its own', async () => {
    const file = await quadrants(203, 100).jpeg().toBuffer();
    const { id } = await sent(file);
    const neighbour = (await app.household()).id;
    const { browser } = await app.signedIn('designer', neighbour);
    const theirs = (await upload(browser, `/api/households/${neighbour}/photos`, file, 'ours too.jpg')).body;
    expect(theirs.duplicate).toBe(false);
    expect(theirs.photo.id).not.toBe(id);
  });
});

describe('refused uploads leave nothing behind', () => {
  const noise = () =>
    sharp({
      create: {
        width: 300,
        height: 200,
        channels: 3,
        background: '#888',
        noise: { type: 'gaussian', mean: 128, sigma: 40 },
      },
    });
  it.each<[string, () => Promise<Buffer>, number, string]>([
    [
      'text called .jpg',
      () => Promise.resolve(Buffer.from('I am no picture, whatever my name says.')),
      415,
      'not-a-picture',
    ],
    ['an empty file', () => Promise.resolve(Buffer.alloc(0)), 415, 'not-a-picture'],
    ['a cut JPEG', async () => (await noise().jpeg().toBuffer()).subarray(0, 5000), 422, 'truncated'],
    ['a cut HEIC', async () => (await fixture('turned.heic')).subarray(0, 1500), 422, 'truncated'],
    ['a bomb', () => Promise.resolve(pngBomb(16_000, 16_000)), 413, 'too-many-pixels'],
    [
      'SVG with a script',
      () => Promise.resolve(Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>')),
      415,
      'not-a-picture',
    ],
  ])('security: %s', async (_what, make, status, code) => {
    const [photos, files] = [await rows(), await originals()];
    const answer = await send(await make());
    expect([answer.status, answer.body.code]).toEqual([status, code]);
    expect(answer.body.remedy).not.toBe('');
    expect(await rows()).toBe(photos);
    expect(await originals()).toEqual(files);
  });

  it('more than 100 MB', async () => {
    const answer = await send(Buffer.alloc(100 * 1024 * 1024 + 1, 7), 'huge.jpg');
    expect([answer.status, answer.body.code]).toEqual([413, 'file-too-large']);
  });

  it('a request without a file, and one with two', async () => {
    const none = await designer.browser.prepare('post', photosPath()).field('lastModified', '1');
    expect([none.status, none.body.code]).toEqual([400, 'no-file']);
    const file = await quadrants(60, 40).jpeg().toBuffer();
    const two = await designer.browser
      .prepare('post', photosPath())
      .attach('file', file, 'a.jpg')
      .attach('file', file, 'b.jpg');
    expect([two.status, two.body.code]).toEqual([400, 'upload-not-understood']);
  });

  it('security: from a viewer, or without the proof of the page', async () => {
    const file = await quadrants(61, 40).jpeg().toBuffer();
    const viewer = await app.signedIn('viewer', householdId);
    expect((await upload(viewer.browser, photosPath(), file, 'a.jpg')).status).toBe(403);
    expect((await designer.browser.agent.post(photosPath()).attach('file', file, 'a.jpg')).status).toBe(403);
  });

  it('an upload cut off in the middle', async () => {
    const file = await noise().png().toBuffer();
    const before = await rows();
    const { port } = server.address() as AddressInfo;
    const cookies = ['oriel', 'XSRF-TOKEN'].map((name) => `${name}=${designer.browser.cookie(name)}`).join('; ');
    const head =
      '--cut\r\nContent-Disposition: form-data; name="file"; filename="cut.png"\r\nContent-Type: image/png\r\n\r\n';
    const request = httpRequest({
      port,
      host: '127.0.0.1',
      method: 'POST',
      path: photosPath(),
      headers: {
        Cookie: cookies,
        'X-XSRF-TOKEN': designer.browser.cookie('XSRF-TOKEN'),
        'Content-Type': 'multipart/form-data; boundary=cut',
        'Content-Length': head.length + file.length + 20,
      },
    });
    request.on('error', () => undefined);
    request.write(head);
    request.write(file.subarray(0, file.length / 2));
    await expect.poll(() => readdir(app.parts.storage.incomingDir)).toHaveLength(1);
    request.destroy();
    await expect.poll(() => readdir(app.parts.storage.incomingDir)).toEqual([]);
    expect(await rows()).toBe(before);
    expect(app.log().includes('unexpected failure')).toBe(false);
  });
});
