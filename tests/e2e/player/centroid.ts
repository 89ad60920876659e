import sharp from 'sharp';

export interface Pixels {
  readonly data: Buffer;
  readonly width: number;
  readonly height: number;
}

/** The pixels of a screenshot, RGB. */
export async function pixelsOf(png: Buffer): Promise<Pixels> {
  const { data, info } = await sharp(png).removeAlpha().raw().toBuffer({ resolveWithObject: true });
  return { data, width: info.width, height: info.height };
}

export function pixelAt({ data, width }: Pixels, x: number, y: number): [number, number, number] {
  const at = (Math.floor(y) * width + Math.floor(x)) * 3;
  return [data[at], data[at + 1], data[at + 2]];
}

/** Centroid, in pixels from the upper left corner, of what differs from `ground` within `radius` of a place by at least `floor` levels. */
export function centroid(pixels: Pixels, ground: readonly number[], around: { x: number; y: number }, radius: number, floor = 3): { x: number; y: number; weight: number } {
  let [sum, sumX, sumY] = [0, 0, 0];
  const from = (middle: number) => Math.max(0, Math.floor(middle - radius));
  for (let y = from(around.y); y < Math.min(pixels.height, around.y + radius); y++)
    for (let x = from(around.x); x < Math.min(pixels.width, around.x + radius); x++) {
      const at = (y * pixels.width + x) * 3;
      let weight = 0;
      for (let channel = 0; channel < 3; channel++) weight += Math.abs(pixels.data[at + channel] - ground[channel]);
      if (weight < floor) continue;
      sum += weight;
      sumX += weight * (x + 0.5);
      sumY += weight * (y + 0.5);
    }
  return { x: sumX / sum, y: sumY / sum, weight: sum };
}
