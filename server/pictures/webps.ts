import sharp, { type Sharp } from 'sharp';
import { type DerivativeEdge, derivativeEdges } from '@oriel/shared/contracts/photos';
import { edgesFor } from '../storage/keys';

const largestEdge = Math.max(...derivativeEdges);

export interface Webp {
  readonly edge: DerivativeEdge;
  readonly bytes: Buffer;
}

export interface Webps {
  readonly files: readonly Webp[];
  /** The same picture with this long edge at most, px. */
  readonly fitted: (edge: number) => Sharp;
}

/**
 * The WebPs made of a picture, without any metadata. The picture is decoded once, to the largest size; the others come from that.
 * @param quality of the colours, 0 to 100; alpha loses nothing.
 */
export async function webpsOf(picture: Sharp, quality: number): Promise<Webps> {
  const { data, info } = await picture
    .resize(largestEdge, largestEdge, { fit: 'inside', withoutEnlargement: true })
    .raw()
    .toBuffer({ resolveWithObject: true });
  const raw = { width: info.width, height: info.height, channels: info.channels };
  const fitted = (edge: number) => sharp(data, { raw }).resize(edge, edge, { fit: 'inside', withoutEnlargement: true });
  const files: Webp[] = [];
  for (const edge of edgesFor(info.width, info.height))
    files.push({ edge, bytes: await fitted(edge).webp({ quality, alphaQuality: 100 }).toBuffer() });
  return { files, fitted };
}
