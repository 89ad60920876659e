import { copyFile, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inspectPicture } from './inspect-picture';
import { pngBomb } from './testing/hostile-files';
import { quadrants } from './testing/quadrants';

const fixture = (name: string) => new URL(`./fixtures/${name}`, import.meta.url);
let folder: string;
const write = async (bytes: Uint8Array) => {
  const path = join(folder, `${Math.random()}.bin`);
  await writeFile(path, bytes);
  return path;
};
/** Noise, so that no encoder can make it small: then cutting anywhere cuts pixels. */
const noise = () =>
  sharp({
    create: {
      width: 200,
      height: 150,
      channels: 3,
      background: '#888',
      noise: { type: 'gaussian', mean: 128, sigma: 40 },
    },
  });

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'oriel-pictures-'));
});
afterAll(() => rm(folder, { recursive: true }));

describe('inspectPicture', () => {
  it.each(['jpeg', 'png', 'webp', 'avif', 'tiff', 'gif'] as const)('reads %s', async (format) => {
    const path = await write(await quadrants().toFormat(format).toBuffer());
    expect(await inspectPicture(path)).toMatchObject({ format, mime: `image/${format}`, width: 120, height: 80 });
  });

  it('reads HEIC, with the date of its camera’s clock, whatever its offset', async () => {
    expect(await inspectPicture(fixture('wide-colour.heic').pathname)).toEqual({
      format: 'heic',
      mime: 'image/heic',
      width: 120,
      height: 80,
      hasAlpha: false,
      takenAt: new Date('2019-05-04T18:30:00Z'),
    });
  });

  it('gives the upright size of a HEIC on its side', async () => {
    expect(await inspectPicture(fixture('turned.heic').pathname)).toMatchObject({ width: 120, height: 80 });
  });

  it('gives the upright size of a JPEG on its side', async () => {
    const path = await write(await quadrants().jpeg().withMetadata({ orientation: 6 }).toBuffer());
    expect(await inspectPicture(path)).toMatchObject({ width: 80, height: 120 });
  });

  it('tells alpha', async () => {
    expect(await inspectPicture(await write(await quadrants().png().toBuffer()))).toMatchObject({ hasAlpha: false });
    expect(await inspectPicture(await write(await quadrants().ensureAlpha(0.5).png().toBuffer()))).toMatchObject({
      hasAlpha: true,
    });
  });

  it.each(['jpeg', 'png', 'webp', 'avif', 'tiff', 'gif'] as const)('refuses %s cut anywhere', async (format) => {
    const whole = await noise().toFormat(format).toBuffer();
    for (const part of [0.02, 0.4, 0.9, 0.995]) {
      const path = await write(whole.subarray(0, Math.floor(whole.length * part)));
      await expect(inspectPicture(path), `${part} of ${format}`).rejects.toMatchObject({
        status: 422,
        code: 'truncated',
      });
    }
    await expect(inspectPicture(await write(whole))).resolves.toBeDefined();
  });

  it('refuses HEIC cut anywhere', async () => {
    const whole = await readFile(fixture('turned.heic'));
    for (const part of [0.05, 0.5, 0.99]) {
      const path = await write(whole.subarray(0, Math.floor(whole.length * part)));
      await expect(inspectPicture(path)).rejects.toMatchObject({ status: 422, code: 'truncated' });
    }
  });

  it.each([
    ['an empty file', ''],
    ['text', 'not a picture at all, whatever it is called'],
    [
      'SVG, which can carry scripts',
      '<svg xmlns="http://www.w3.org/2000/svg" width="10" height="10"><rect width="10" height="10"/></svg>',
    ],
  ])('security: refuses %s', async (_what, text) => {
    await expect(inspectPicture(await write(Buffer.from(text)))).rejects.toMatchObject({
      status: 415,
      code: 'not-a-picture',
    });
  });

  it('security: refuses a bomb by its header, without unfolding it', async () => {
    const bomb = pngBomb(20_000, 20_000);
    expect(bomb.length).toBeLessThan(100_000);
    const before = process.memoryUsage().rss;
    const started = performance.now();
    await expect(inspectPicture(await write(bomb))).rejects.toMatchObject({ status: 413, code: 'too-many-pixels' });
    expect(performance.now() - started).toBeLessThan(1000);
    expect(process.memoryUsage().rss - before).toBeLessThan(40e6);
  });

  it('takes 120 megapixels and refuses a row more', async () => {
    await expect(inspectPicture(await write(pngBomb(12_000, 10_000)))).resolves.toMatchObject({
      width: 12_000,
      height: 10_000,
    });
    await expect(inspectPicture(await write(pngBomb(12_000, 10_001)))).rejects.toMatchObject({
      code: 'too-many-pixels',
    });
  });

  it('goes by what is inside, not by the name', async () => {
    const path = join(folder, 'really-a-png.jpg');
    await writeFile(path, await quadrants().png().toBuffer());
    expect(await inspectPicture(path)).toMatchObject({ format: 'png' });
    const heic = join(folder, 'really-a-heic.png');
    await copyFile(fixture('turned.heic'), heic);
    expect(await inspectPicture(heic)).toMatchObject({ format: 'heic' });
  });
});
