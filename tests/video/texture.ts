import type { Point } from './flat-face';
import type { StillPicture } from './still-picture';

/** A picture with a mask, at one of its sizes: red, green, blue of 0 to 255 and opacity of 0 to 1, row by row. */
export interface Texture {
  readonly width: number;
  readonly height: number;
  readonly data: Float32Array;
}

/** What a person's picture is changed by to make another person of it. */
export interface Disguise {
  readonly mirrored?: boolean;
  /** Factors for red, green and blue. */
  readonly tint?: readonly [number, number, number];
  /** Dark frames of glasses about the eyes. */
  readonly glasses?: boolean;
}

const SMALLEST = 16;

/** The texture and its halves, quarters and so on, each averaged over four of the one before (L. Williams, Pyramidal Parametrics, 1983). */
export function mipLevels(texture: Texture): Texture[] {
  const levels = [texture];
  for (let last = texture; last.width > SMALLEST && last.height > SMALLEST; levels.push(last)) last = halved(last);
  return levels;
}

function halved({ width, height, data }: Texture): Texture {
  const [w, h] = [width >> 1, height >> 1];
  const half = new Float32Array(w * h * 4);
  for (let y = 0; y < h; y++) {
    for (let x = 0; x < w; x++) {
      for (let k = 0; k < 4; k++) {
        const at = (2 * y * width + 2 * x) * 4 + k;
        half[(y * w + x) * 4 + k] = (data[at] + data[at + 4] + data[at + 4 * width] + data[at + 4 * width + 4]) / 4;
      }
    }
  }
  return { width: w, height: h, data: half };
}

/** Samples along each side of a pixel that decide how much of it lies within an outline. */
const EDGE_TAPS = 4;

/** A picture as a texture, opaque within any of the outlines. */
export function cutOut({ width, height, data }: StillPicture, outlines: readonly (readonly Point[])[]): Texture {
  const rgba = new Float32Array(width * height * 4);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const at = y * width + x;
      let within = 0;
      for (let tap = 0; tap < EDGE_TAPS ** 2; tap++) {
        const u = x + ((tap % EDGE_TAPS) + 0.5) / EDGE_TAPS;
        const v = y + (Math.floor(tap / EDGE_TAPS) + 0.5) / EDGE_TAPS;
        if (outlines.some((outline) => isWithin(outline, u, v))) within++;
      }
      for (let k = 0; k < 3; k++) rgba[4 * at + k] = data[3 * at + k];
      rgba[4 * at + 3] = within / EDGE_TAPS ** 2;
    }
  }
  return { width, height, data: rgba };
}

/** Whether a ray from the point to the right crosses the outline an odd number of times. */
function isWithin(outline: readonly Point[], x: number, y: number): boolean {
  let within = false;
  for (let i = 0, j = outline.length - 1; i < outline.length; j = i++) {
    const [[ax, ay], [bx, by]] = [outline[i], outline[j]];
    if (ay > y !== by > y && x < ax + ((y - ay) / (by - ay)) * (bx - ax)) within = !within;
  }
  return within;
}

export function mirrored({ width, height, data }: StillPicture): StillPicture {
  const mirror = new Uint8Array(data.length);
  for (let at = 0; at < width * height; at++) {
    const to = at - (at % width) + (width - 1 - (at % width));
    mirror.set(data.subarray(3 * at, 3 * at + 3), 3 * to);
  }
  return { width, height, data: mirror };
}

export function tinted({ width, height, data }: StillPicture, tint: readonly [number, number, number]): StillPicture {
  return { width, height, data: Uint8Array.from(data, (level, at) => Math.min(255, level * tint[at % 3])) };
}

/** Rim of a pair of glasses as shares of the distance between the eyes: half width and half height of a glass, thickness. */
const RIM = { across: 0.42, down: 0.32, thickness: 0.07 };
const RIM_LEVEL = 30;

/** The picture with the rims of glasses, and their bridge, drawn about the two eyes. */
export function withGlasses(picture: StillPicture, rightEye: Point, leftEye: Point): StillPicture {
  const { width, height } = picture;
  const data = Uint8Array.from(picture.data);
  const unit = Math.hypot(leftEye[0] - rightEye[0], leftEye[1] - rightEye[1]);
  const [ex, ey] = [(leftEye[0] - rightEye[0]) / unit, (leftEye[1] - rightEye[1]) / unit];
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const rim = Math.max(
        ...[rightEye, leftEye].map(([cx, cy]) => {
          const along = ((x + 0.5 - cx) * ex + (y + 0.5 - cy) * ey) / unit;
          const down = ((y + 0.5 - cy) * ex - (x + 0.5 - cx) * ey) / unit - 0.05;
          // A rounded oblong: the fourth powers of a superellipse (P. Hein).
          const out = ((along / RIM.across) ** 4 + (down / RIM.down) ** 4) ** 0.25;
          return 1 - Math.abs(out - 1) / (RIM.thickness / (2 * RIM.down));
        }),
      );
      if (rim > 0) data.fill(RIM_LEVEL, 3 * (y * width + x), 3 * (y * width + x) + 3);
    }
  }
  return { width, height, data };
}
