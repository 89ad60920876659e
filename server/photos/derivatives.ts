import { rgbaToThumbHash } from 'thumbhash';
import { openPicture } from '../pictures/open-picture';
import { webpsOf, type Webp } from '../pictures/webps';

export interface Derivatives {
  readonly files: readonly Webp[];
  /** ThumbHash (E. Wallace, 2023), base64. */
  readonly placeholder: string;
}

const quality = 84;
/** ThumbHash takes at most 100 px a side. */
const thumbHashEdge = 100;

/** Makes the upright sRGB WebPs of a picture, and what stands in for them until they come. */
export async function makeDerivatives(path: string): Promise<Derivatives> {
  const { files, fitted } = await webpsOf(await openPicture(path), quality);
  const tiny = await fitted(thumbHashEdge).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  const hash = rgbaToThumbHash(tiny.info.width, tiny.info.height, tiny.data);
  return { files, placeholder: Buffer.from(hash).toString('base64') };
}
