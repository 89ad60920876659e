import sharp from 'sharp';
import { rgbaToThumbHash } from 'thumbhash';
import { type DerivativeEdge, derivativeEdges } from '@oriel/shared/contracts/photos';
import { openPicture } from '../pictures/open-picture';
import { edgesFor } from '../storage/keys';

export interface Derivatives {
  readonly files: readonly { readonly edge: DerivativeEdge; readonly bytes: Buffer }[];
  /** ThumbHash (E. Wallace, 2023), base64. */
  readonly placeholder: string;
}

const quality = 84;
const largestEdge = Math.max(...derivativeEdges);
/** ThumbHash takes at most 100 px a side. */
const thumbHashEdge = 100;

/** Makes the upright sRGB WebPs of a picture, without any metadata. The picture is decoded once, to the largest size; the others come from that. */
export async function makeDerivatives(path: string): Promise<Derivatives> {
  const picture = await openPicture(path);
  const { data, info } = await picture
    .resize(largestEdge, largestEdge, { fit: 'inside', withoutEnlargement: true })
    .raw()
    .toBuffer({ resolveWithObject: true });
  const raw = { width: info.width, height: info.height, channels: info.channels };
  const fitted = (edge: number) => sharp(data, { raw }).resize(edge, edge, { fit: 'inside', withoutEnlargement: true });

  const files = [];
  for (const edge of edgesFor(info.width, info.height))
    files.push({ edge, bytes: await fitted(edge).webp({ quality, alphaQuality: 100 }).toBuffer() });

  const tiny = await fitted(thumbHashEdge).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  const hash = rgbaToThumbHash(tiny.info.width, tiny.info.height, tiny.data);
  return { files, placeholder: Buffer.from(hash).toString('base64') };
}
