import sharp, { type Sharp } from 'sharp';
import { photoMaxPixels } from '@oriel/shared/contracts/photos';
import { decodeHeic } from './decode-heic';
import { formatOfFile } from './signature';
import { tiffWithProfile } from './tiff-with-profile';

const limits = { limitInputPixels: photoMaxPixels, failOn: 'error' } as const;

/** Opens any picture that `inspectPicture` lets through, upright and in sRGB, 8 bits a channel, whatever its file says of turning and colour. */
export async function openPicture(path: string): Promise<Sharp> {
  const upright = (await formatOfFile(path)) === 'heic' ? await openHeic(path) : sharp(path, limits).autoOrient();
  return upright.toColourspace('srgb');
}

async function openHeic(path: string): Promise<Sharp> {
  const { icc } = await sharp(path, limits).metadata();
  const pixels = await decodeHeic(path);
  if (icc) return sharp(tiffWithProfile(pixels, icc), limits);
  return sharp(pixels.data, { ...limits, raw: { width: pixels.width, height: pixels.height, channels: 4 } });
}
