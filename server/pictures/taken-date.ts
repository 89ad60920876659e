import readExif from 'exif-reader';

/** The first photograph known (J. N. Niépce, 1826 or 1827): anything earlier is a clock that was never set. */
const earliest = Date.UTC(1826, 0, 1);
/** What a clock that was never set, "0000:00:00 00:00:00", comes to as a Date. */
const neverSet = Date.UTC(0, -1, 0);
const dayMs = 24 * 3600 * 1000;

/** The moment, unless it lies before photography or after tomorrow. */
export const plausibleMoment = (date: Date | null | undefined): Date | null =>
  date && date.getTime() >= earliest && date.getTime() <= Date.now() + dayMs ? date : null;

/** EXIF 2.32, tag OffsetTimeOriginal: "+02:00" or "-05:30". Minutes east of UTC. */
function offsetMinutes(text: unknown): number {
  const match = typeof text === 'string' ? /^([+-])(\d\d):(\d\d)/.exec(text) : null;
  return match ? (match[1] === '-' ? -1 : 1) * (Number(match[2]) * 60 + Number(match[3])) : 0;
}

/**
 * When the photograph was taken, by EXIF DateTimeOriginal and OffsetTimeOriginal; without an offset the camera's wall clock is taken as UTC.
 * Null when EXIF says nothing, or nothing that can be.
 */
export function takenDate(exif: Buffer | undefined): Date | null {
  if (!exif) return null;
  try {
    const tags = readExif(exif).Photo;
    const wallClock = tags?.DateTimeOriginal;
    if (!(wallClock instanceof Date) || wallClock.getTime() === neverSet) return null;
    return plausibleMoment(new Date(wallClock.getTime() - offsetMinutes(tags?.['OffsetTimeOriginal']) * 60_000));
  } catch {
    // Damaged EXIF is no reason to refuse a picture.
    return null;
  }
}
