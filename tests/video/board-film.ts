import { BOARD_HEIGHT_MM, BOARD_WIDTH_MM, blackOfBoard } from '../../shared/viewer/measuring/board';
import { writeMjpeg } from './numbered-video';
import { normalNoise, repeatableRandom } from './random';

/*
 * What a pinhole camera sees of flat things held before it. A thing lies in the plane through `place` (mm in camera coordinates: right,
 * down, away) turned by the rotation vector `turn` (O. Rodrigues, 1840). A pixel looks along (px - cx, py - cy, f); where that ray meets
 * the plane decides its light, and nine rays make one pixel.
 */

type Vector = readonly [number, number, number];

export interface HeldThing {
  readonly turn: Vector;
  readonly place: Vector;
  /** For how many frames it is held still. */
  readonly frames: number;
  /** The light of the thing at a point of its plane, mm from its middle, right and down; null beside it. */
  readonly light: (x: number, y: number) => number | null;
}

export interface FilmSize {
  readonly width: number;
  readonly height: number;
  readonly fps: number;
  readonly hfovRad: number;
}

const [paper, ink, wall] = [215, 35, 95];
const marginMm = 12;

const blackAt = (() => {
  const perMm = 6;
  const across = BOARD_WIDTH_MM * perMm;
  const black = new Uint8Array(across * BOARD_HEIGHT_MM * perMm);
  for (const { x, y, width, height } of blackOfBoard())
    for (let row = Math.round(y * perMm); row < Math.round((y + height) * perMm); row++)
      black.fill(1, row * across + Math.round(x * perMm), row * across + Math.round((x + width) * perMm));
  return (x: number, y: number) => black[Math.floor(y * perMm) * across + Math.floor(x * perMm)] === 1;
})();

/** The printed board, on paper a little larger. */
export function boardLight(x: number, y: number): number | null {
  const [fromLeft, fromTop] = [x + BOARD_WIDTH_MM / 2, y + BOARD_HEIGHT_MM / 2];
  const beyond = Math.max(-fromLeft, -fromTop, fromLeft - BOARD_WIDTH_MM, fromTop - BOARD_HEIGHT_MM);
  if (beyond > marginMm) return null;
  return beyond < 0 && blackAt(fromLeft, fromTop) ? ink : paper;
}

/** A card of the format ID-1 (ISO/IEC 7810: 85.60 by 53.98 mm, corners of 3.18 mm), its longer side across. */
export function cardLight(x: number, y: number): number | null {
  const [halfWidth, halfHeight, corner] = [85.6 / 2, 53.98 / 2, 3.18];
  const [dx, dy] = [Math.abs(x) - halfWidth + corner, Math.abs(y) - halfHeight + corner];
  const outside = dx > 0 && dy > 0 ? Math.hypot(dx, dy) > corner : Math.max(dx, dy) > corner;
  return outside ? null : paper;
}

/** Poses in which a board is shown all over the picture, tilted this way and that, as one is asked to hold it. */
export const boardPoses: readonly Pick<HeldThing, 'turn' | 'place'>[] = [
  { turn: [0.05, 0, 0], place: [0, 0, 430] },
  { turn: [0.45, 0.1, 0], place: [-60, 40, 500] },
  { turn: [-0.45, 0, 0.1], place: [70, -40, 500] },
  { turn: [0, 0.5, 0], place: [60, 60, 520] },
  { turn: [0.1, -0.5, -0.2], place: [-80, -60, 520] },
  { turn: [0.35, 0.35, 0.5], place: [0, 0, 640] },
  { turn: [-0.3, 0.4, 0], place: [130, 70, 620] },
  { turn: [0.3, -0.35, 0], place: [-130, -80, 620] },
  { turn: [-0.35, -0.3, -0.3], place: [-120, 90, 600] },
];

/** Writes what the camera sees as `FILE.mjpeg`: each thing in turn, held still. Only as many pictures are drawn as there are things. */
export async function makeFilm(file: string, size: FilmSize, things: readonly HeldThing[]): Promise<void> {
  await writeMjpeg(file, size, frames(size, things));
}

function* frames(size: FilmSize, things: readonly HeldThing[]): Generator<Uint8Array> {
  for (const [index, thing] of things.entries()) {
    const picture = pictureOf(size, thing, index + 1);
    for (let frame = 0; frame < thing.frames; frame++) yield picture;
  }
}

function pictureOf({ width, height, hfovRad }: FilmSize, { turn, place, light }: HeldThing, seed: number): Uint8Array {
  const focal = width / 2 / Math.tan(hfovRad / 2);
  const r = turnMatrix(turn);
  const noise = normalNoise(width * height, 2, repeatableRandom(seed));
  const normal = [r[2], r[5], r[8]];
  const reach = normal[0] * place[0] + normal[1] * place[1] + normal[2] * place[2];
  const picture = new Uint8Array(width * height * 3);
  for (let pixel = 0; pixel < width * height; pixel++) {
    let sum = 0;
    for (let ray = 0; ray < 9; ray++) {
      const dx = ((pixel % width) + ((ray % 3) + 0.5) / 3 - width / 2) / focal;
      const dy = (Math.floor(pixel / width) + (Math.floor(ray / 3) + 0.5) / 3 - height / 2) / focal;
      const away = reach / (normal[0] * dx + normal[1] * dy + normal[2]);
      const at = [away * dx - place[0], away * dy - place[1], away - place[2]];
      sum += light(r[0] * at[0] + r[3] * at[1] + r[6] * at[2], r[1] * at[0] + r[4] * at[1] + r[7] * at[2]) ?? wall;
    }
    picture.fill(Math.max(0, Math.min(255, sum / 9 + noise[pixel])), 3 * pixel, 3 * pixel + 3);
  }
  return picture;
}

/** Row by row; R = I + sin a [k] + (1 - cos a) [k]^2 for the vector a k. */
function turnMatrix([x, y, z]: Vector): number[] {
  const angle = Math.hypot(x, y, z);
  if (angle === 0) return [1, 0, 0, 0, 1, 0, 0, 0, 1];
  const [a, b, c] = [x / angle, y / angle, z / angle];
  const [s, v] = [Math.sin(angle), 1 - Math.cos(angle)];
  return [1 - v * (b * b + c * c), v * a * b - s * c, v * a * c + s * b, v * a * b + s * c, 1 - v * (a * a + c * c), v * b * c - s * a, v * a * c - s * b, v * b * c + s * a, 1 - v * (a * a + b * b)];
}
