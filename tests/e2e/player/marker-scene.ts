import sharp from 'sharp';
import type { Layer, SceneDocument } from '@oriel/shared/contracts/scenes';

/** A layer whose image is transparent but for one disc; its place in the image is known from the image's own pixels. */
export interface Marker {
  readonly layer: Layer;
  readonly colour: readonly [number, number, number];
  /** Centroid of the disc's coverage, as a share of the image from its upper left corner. */
  readonly across: number;
  readonly down: number;
  /** Radius of the disc over the width of the image. */
  readonly radiusShare: number;
}

export const ground = [40, 60, 80] as const;
const widthPx = 640;
const heightPx = 480;
const radiusPx = 72;

const kinds = [
  { depthMm: 1500, colour: [230, 60, 60], at: [-25, 20], opacity: 1 },
  { depthMm: 420, colour: [70, 220, 90], at: [80, 50], opacity: 1 },
  { depthMm: 100, colour: [90, 130, 250], at: [-85, -48], opacity: 1 },
  { depthMm: -60, colour: [250, 220, 60], at: [88, -45], opacity: 0.5 },
  { depthMm: 0, colour: [240, 240, 240], at: [-10, -45], opacity: 1 },
] as const;

const idOf = (number: number) => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;
const discAt = (index: number) => ({ x: 320.3 + 31.7 * index, y: 240.6 - 23.3 * index });

/** A glass of 320 x 200 mm, a plain ground at its plane and five markers, one behind or before another. */
export function markerScene(): { document: SceneDocument; markers: Marker[] } {
  const markers = kinds.map(({ depthMm, colour, at, opacity }, index): Marker => {
    const disc = discAt(index);
    return {
      colour,
      across: disc.x / widthPx,
      down: disc.y / heightPx,
      radiusShare: radiusPx / widthPx,
      layer: {
        id: idOf(100 + index),
        name: `Marker ${index}`,
        image: imageOf(index + 1),
        depthMm,
        placed: { xMm: at[0] + 0.13, yMm: at[1] - 0.29, widthMm: 60.7, heightMm: 45.525 },
        opacity,
        shown: true,
      },
    };
  });
  const back: Layer = {
    id: idOf(99),
    name: 'Ground',
    image: imageOf(0),
    depthMm: 2000,
    placed: { xMm: 0, yMm: 0, widthMm: 1280, heightMm: 960 },
    opacity: 1,
    shown: true,
  };
  const hidden: Layer = { ...back, id: idOf(98), name: 'Hidden', depthMm: -50, shown: false };
  return {
    markers,
    document: {
      name: 'Markers',
      glass: { widthMm: 320, heightMm: 200 },
      homeEye: { x: 10, y: -20, z: 600 },
      zone: { leftMm: -200, rightMm: 200, lowestMm: -100, highestMm: 100, nearestMm: 400, farthestMm: 1000 },
      layers: [hidden, ...markers.map((marker) => marker.layer), back],
    },
  };
}

function imageOf(number: number): Layer['image'] {
  return { id: idOf(number), width: widthPx, height: heightPx, trim: { left: 0, top: 0, ofWidth: widthPx, ofHeight: heightPx } };
}

/** The picture of image `number`: 0 the ground, the others a disc of exact coverage (16 x 16 looks a pixel) in the marker's colour. */
export async function pictureOf(imageId: string, edge: number): Promise<Buffer> {
  const number = Number(imageId.slice(-12));
  const pixels = Buffer.alloc(widthPx * heightPx * 4);
  for (let y = 0; y < heightPx; y++)
    for (let x = 0; x < widthPx; x++) {
      const colour = number === 0 ? ground : kinds[number - 1].colour;
      const covered = number === 0 ? 1 : coverage(x, y, discAt(number - 1));
      pixels.set([...colour, Math.round(255 * covered)], (y * widthPx + x) * 4);
    }
  const whole = sharp(pixels, { raw: { width: widthPx, height: heightPx, channels: 4 } });
  return (edge < widthPx ? whole.resize(edge) : whole).png().toBuffer();
}

function coverage(x: number, y: number, disc: { x: number; y: number }): number {
  const centre = Math.hypot(x + 0.5 - disc.x, y + 0.5 - disc.y);
  if (centre > radiusPx + 1) return 0;
  if (centre < radiusPx - 1) return 1;
  let inside = 0;
  for (let i = 0; i < 16; i++)
    for (let j = 0; j < 16; j++)
      if (Math.hypot(x + (i + 0.5) / 16 - disc.x, y + (j + 0.5) / 16 - disc.y) < radiusPx) inside++;
  return inside / 256;
}
