import sharp, { type Metadata } from 'sharp';
import { photoMaxPixels } from '@oriel/shared/contracts/photos';
import { boxesAreWhole } from './boxes';
import { notAPicture, tooManyPixels, truncated } from './refusals';
import { formatOfFile, type PictureFormat } from './signature';
import { takenDate } from './taken-date';

export interface PictureFacts {
  readonly format: PictureFormat;
  readonly mime: string;
  /** Upright size, px. */
  readonly width: number;
  readonly height: number;
  readonly hasAlpha: boolean;
  /** By EXIF; null when it does not say. */
  readonly takenAt: Date | null;
}

/** Side of the picture that the reading to the end is reduced to, px: small, so that JPEG and WebP decode at a fraction of the cost. */
const trialEdge = 64;

/**
 * Reads what a file is, and reads it to its end. The size is judged by the header, before anything is decoded, so that a small file
 * that unfolds into a huge picture costs nothing.
 * @throws not-a-picture (415), too-many-pixels (413), truncated (422).
 */
export async function inspectPicture(path: string): Promise<PictureFacts> {
  const format = await formatOfFile(path);
  if (!format) throw notAPicture();
  if ((format === 'heic' || format === 'avif') && !(await boxesAreWhole(path))) throw truncated();
  const metadata = await sharp(path, { limitInputPixels: false })
    .metadata()
    .catch(() => {
      throw truncated();
    });
  const { width, height } = metadata.autoOrient;
  if (width * height > photoMaxPixels) throw tooManyPixels(width, height);
  if (isHevc(metadata) !== (format === 'heic')) throw notAPicture();
  if (format !== 'heic') await decodeToEnd(path);
  return {
    format,
    mime: `image/${format}`,
    width,
    height,
    hasAlpha: metadata.hasAlpha,
    takenAt: takenDate(metadata.exif),
  };
}

const isHevc = (metadata: Metadata) => metadata.format === 'heif' && metadata.compression === 'hevc';

async function decodeToEnd(path: string): Promise<void> {
  await sharp(path, { limitInputPixels: photoMaxPixels, failOn: 'error' })
    .resize(trialEdge, trialEdge, { fit: 'inside', kernel: 'nearest' })
    .raw()
    .toBuffer()
    .catch(() => {
      throw truncated();
    });
}
