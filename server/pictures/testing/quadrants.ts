import sharp, { type Sharp } from 'sharp';

export type Colour = 'red' | 'green' | 'blue' | 'white' | 'other';

const rgb = { red: [255, 0, 0], green: [0, 192, 0], blue: [0, 0, 255], white: [255, 255, 255] } as const;

/** A picture whose four quarters tell which way up it is: red, green above blue, white. */
export function quadrants(width = 120, height = 80): Sharp {
  const channels = 3;
  const data = Buffer.alloc(width * height * channels);
  for (let y = 0; y < height; y++)
    for (let x = 0; x < width; x++) {
      const [above, below] = x < width / 2 ? (['red', 'blue'] as const) : (['green', 'white'] as const);
      data.set(rgb[y < height / 2 ? above : below], (y * width + x) * channels);
    }
  return sharp(data, { raw: { width, height, channels } });
}

const tolerance = 40;
const name = (pixel: readonly number[]): Colour =>
  (Object.keys(rgb) as (keyof typeof rgb)[]).find((colour) =>
    rgb[colour].every((value, i) => Math.abs(value - pixel[i]) <= tolerance),
  ) ?? 'other';

/** The colours of the four quarters: top left, top right, bottom left, bottom right. */
export async function quartersOf(picture: Sharp | Buffer): Promise<Colour[]> {
  const { data, info } = await (Buffer.isBuffer(picture) ? sharp(picture) : picture)
    .raw()
    .toBuffer({ resolveWithObject: true });
  const at = (x: number, y: number) => {
    const start = (Math.floor(y * info.height) * info.width + Math.floor(x * info.width)) * info.channels;
    return name([...data.subarray(start, start + 3)]);
  };
  return [at(0.25, 0.25), at(0.75, 0.25), at(0.25, 0.75), at(0.75, 0.75)];
}
export const uprightQuarters: Colour[] = ['red', 'green', 'blue', 'white'];
