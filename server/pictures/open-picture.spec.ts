import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp, { type Sharp } from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openPicture } from './open-picture';
import { quadrants, quartersOf, uprightQuarters } from './testing/quadrants';

const fixture = (name: string) => new URL(`./fixtures/${name}`, import.meta.url).pathname;
let folder: string;
const write = async (bytes: Uint8Array) => {
  const path = join(folder, `${Math.random()}.bin`);
  await writeFile(path, bytes);
  return path;
};
const averageOfQuarter = async (picture: Sharp) => {
  const { data, info } = await picture.removeAlpha().raw().toBuffer({ resolveWithObject: true });
  return [...data.subarray((20 * info.width + 20) * 3, (20 * info.width + 20) * 3 + 3)];
};

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'oriel-open-'));
});
afterAll(() => rm(folder, { recursive: true }));

describe('openPicture', () => {
  // EXIF 2.32, tag 0x0112 (CIPA DC-008; secondary source read), beside sharp's own auto-orient on the same file.
  it.each([1, 2, 3, 4, 5, 6, 7, 8])('turns EXIF orientation %i upright', async (orientation) => {
    const file = await asKeptWith(orientation);
    const opened = await openPicture(await write(file));
    const { data, info } = await opened.raw().toBuffer({ resolveWithObject: true });
    const reference = await sharp(file).autoOrient().raw().toBuffer({ resolveWithObject: true });
    expect([info.width, info.height]).toEqual([120, 80]);
    expect([info.width, info.height]).toEqual([reference.info.width, reference.info.height]);
    expect(data.equals(reference.data)).toBe(true);
    expect(
      await quartersOf(sharp(data, { raw: { width: info.width, height: info.height, channels: info.channels } })),
    ).toEqual(uprightQuarters);
  });

  it('turns a HEIC once, though its box and its EXIF both say so', async () => {
    const picture = await openPicture(fixture('turned.heic'));
    expect(await quartersOf(picture)).toEqual(uprightQuarters);
  });

  it('brings the wide colours of a HEIC into sRGB', async () => {
    const [r, g, b] = await averageOfQuarter(await openPicture(fixture('wide-colour.heic')));
    // The file was drawn in sRGB red and converted to Display P3 (there 234, 51, 35) by lcms: it comes back as sRGB red.
    expect(r).toBeGreaterThan(248);
    expect(g).toBeLessThan(12);
    expect(b).toBeLessThan(12);
  });

  it.each(['jpeg', 'png', 'tiff', 'webp', 'avif'] as const)(
    'brings the wide colours of a %s into sRGB',
    async (format) => {
      const file = await quadrants().withIccProfile('p3').toFormat(format, { quality: 100 }).toBuffer();
      const [r, g, b] = await averageOfQuarter(await openPicture(await write(file)));
      expect(r).toBeGreaterThan(248);
      expect(g).toBeLessThan(12);
      expect(b).toBeLessThan(12);
    },
  );

  it('brings CMYK, 16 bits and grey to 8-bit sRGB', async () => {
    const cmyk = await quadrants().toColourspace('cmyk').jpeg({ quality: 100 }).toBuffer();
    const deep = await quadrants().toColourspace('rgb16').png().toBuffer();
    const grey = await quadrants().greyscale().png().toBuffer();
    expect((await sharp(cmyk).metadata()).channels).toBe(4);
    expect((await sharp(deep).metadata()).depth).toBe('ushort');
    for (const file of [cmyk, deep, grey]) {
      const { info, data } = await (await openPicture(await write(file))).raw().toBuffer({ resolveWithObject: true });
      expect([info.channels, data.length]).toEqual([3, 120 * 80 * 3]);
    }
    expect(await quartersOf(await openPicture(await write(deep)))).toEqual(uprightQuarters);
  });
});

/** Degrees clockwise that undo what the orientation asks for, and whether the picture is mirrored left-right after that. */
const undoing: Record<number, [degrees: number, mirrored: boolean]> = {
  1: [0, false],
  2: [0, true],
  3: [180, false],
  4: [180, true],
  5: [90, true],
  6: [270, false],
  7: [270, true],
  8: [90, false],
};

/** The upright picture as a camera held that way would keep it, marked with the orientation. */
async function asKeptWith(orientation: number): Promise<Buffer> {
  const [degrees, mirrored] = undoing[orientation];
  const turned = await sharp(await quadrants().png().toBuffer())
    .rotate(degrees)
    .png()
    .toBuffer();
  const kept = mirrored ? sharp(turned).flop() : sharp(turned);
  return kept.jpeg({ quality: 100, chromaSubsampling: '4:4:4' }).withMetadata({ orientation }).toBuffer();
}
