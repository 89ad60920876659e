import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { plausibleMoment, takenDate } from './taken-date';
import { quadrants } from './testing/quadrants';

const exifWith = async (tags: Record<string, string>) => {
  const file = await quadrants().jpeg().withExif({ IFD2: tags }).toBuffer();
  return (await sharp(file).metadata()).exif;
};

/** The EXIF is written by libexif (through sharp) and read by another library. */
describe('takenDate', () => {
  it.each<Record<string, string>>([{}, { OffsetTimeOriginal: '+05:45' }, { OffsetTimeOriginal: '-03:30' }])('is what the camera\u2019s clock showed, whatever its offset: %o', async (offset) => {
    const exif = await exifWith({ DateTimeOriginal: '2021:12:31 23:30:00', ...offset });
    expect(takenDate(exif)?.toISOString()).toBe('2021-12-31T23:30:00.000Z');
  });

  it.each(['0000:00:00 00:00:00', '    :  :     :  :  ', '1601:01:01 00:00:00', '2999:01:01 00:00:00'])(
    'gives up on a clock never set: %s',
    async (text) => {
      expect(takenDate(await exifWith({ DateTimeOriginal: text }))).toBeNull();
    },
  );

  it('bears damaged EXIF', () => {
    expect(takenDate(Buffer.from('Exif\0\0MM\0*\0\0\xff\xff nothing of use', 'latin1'))).toBeNull();
    expect(takenDate(undefined)).toBeNull();
  });
});

describe('plausibleMoment', () => {
  it('refuses what is no date', () => expect(plausibleMoment(new Date('yesterday'))).toBeNull());
});
