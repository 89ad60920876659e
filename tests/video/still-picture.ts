import sharp from 'sharp';

/** A picture's red, green and blue, 8 bits each, row by row. */
export interface StillPicture {
  readonly width: number;
  readonly height: number;
  readonly data: Uint8Array;
}

export async function readPicture(file: string): Promise<StillPicture> {
  const { data, info } = await sharp(file)
    .removeAlpha()
    .toColourspace('srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
  return { width: info.width, height: info.height, data };
}

/** One channel at a point of the picture, bilinear between pixel centres, which lie at integer + 0.5. */
export function tap({ width, height, data }: StillPicture, x: number, y: number, channel: number): number {
  const x0 = Math.min(Math.max(Math.floor(x - 0.5), 0), width - 2);
  const y0 = Math.min(Math.max(Math.floor(y - 0.5), 0), height - 2);
  const fx = Math.min(Math.max(x - 0.5 - x0, 0), 1);
  const fy = Math.min(Math.max(y - 0.5 - y0, 0), 1);
  const at = (y0 * width + x0) * 3 + channel;
  const upper = data[at] * (1 - fx) + data[at + 3] * fx;
  const lower = data[at + 3 * width] * (1 - fx) + data[at + 3 * width + 3] * fx;
  return upper * (1 - fy) + lower * fy;
}
