import readExif from 'exif-reader';
import sharp from 'sharp';

/** The first photograph known (J. N. Niépce, 1826 or 1827): anything earlier is a clock that was never set. */
const earliest = Date.UTC(1826, 0, 1);
/** What a clock that was never set, "0000:00:00 00:00:00", comes to as a Date. */
const neverSet = Date.UTC(0, -1, 0);
const dayMs = 24 * 3600 * 1000;

/** The moment, unless it lies before photography or after tomorrow. */
export const plausibleMoment = (date: Date | null | undefined): Date | null =>
  date && date.getTime() >= earliest && date.getTime() <= Date.now() + dayMs ? date : null;

/**
 * What the camera's clock showed when the photograph was taken, by EXIF DateTimeOriginal, as if it were UTC. OffsetTimeOriginal is left alone:
 * few cameras write it, and a day at the sea belongs to the day it was there, in the order in which the clock counted.
 * Null when EXIF says nothing, or nothing that can be.
 */
export function takenDate(exif: Buffer | undefined): Date | null {
  if (!exif) return null;
  try {
    const wallClock = readExif(exif).Photo?.DateTimeOriginal;
    if (!(wallClock instanceof Date) || wallClock.getTime() === neverSet) return null;
    return plausibleMoment(wallClock);
  } catch {
    // Damaged EXIF is no reason to refuse a picture.
    return null;
  }
}

/** The same of a file, of which only the header is read. */
export const takenDateOfFile = async (path: string): Promise<Date | null> => takenDate((await sharp(path, { limitInputPixels: false }).metadata()).exif);
