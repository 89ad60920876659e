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
  it('obeys the offset from UTC', async () => {
    const east = await exifWith({ DateTimeOriginal: '2021:12:31 23:30:00', OffsetTimeOriginal: '+05:45' });
    expect(takenDate(east)?.toISOString()).toBe('2021-12-31T17:45:00.000Z');
    const west = await exifWith({ DateTimeOriginal: '2021:12:31 23:30:00', OffsetTimeOriginal: '-03:30' });
    expect(takenDate(west)?.toISOString()).toBe('2022-01-01T03:00:00.000Z');
  });

  it('takes the wall clock as UTC without one', async () => {
    expect(takenDate(await exifWith({ DateTimeOriginal: '2003:06:07 08:09:10' }))?.toISOString()).toBe(
      '2003-06-07T08:09:10.000Z',
    );
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
