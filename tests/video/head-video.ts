import { writeFile } from 'node:fs/promises';
import { swayingBackground } from './background';
import { drawHeads } from './draw-head';
import { HEAD_IPD_MM } from './head-from-photograph';
import type { HeadSegment } from './head-path';
import { drawFrameNumber, writeMjpeg } from './numbered-video';
import { normalNoise, repeatableRandom } from './random';
import { cameraOf, truthOfHead, type HeadCamera, type TurningHead } from './turning-head';

/** A wall's camera, as it is asked for. */
const SIZE = { width: 1280, height: 720, fps: 30 };
const HFOV_DEG = 60;
const NOISE_LEVELS = 3;
const NOISE_LENGTH = 1 << 21;

/** Writes `OUT.mjpeg`, a camera's view of heads on a known path, and `OUT.json`, the truth of it; how many frames. */
export async function makeHeadVideo(
  out: string,
  heads: readonly TurningHead[],
  path: readonly HeadSegment[],
): Promise<number> {
  const camera = cameraOf(SIZE.width, SIZE.height, HFOV_DEG);
  const frames = truthOfPath(heads, path, camera);
  const { width: W, height: H, fps: FPS } = SIZE;
  await writeFile(`${out}.json`, JSON.stringify({ W, H, FPS, hfov: HFOV_DEG, ipdMm: HEAD_IPD_MM, frames }));
  await writeMjpeg(`${out}.mjpeg`, SIZE, renderFrames(heads, path, camera));
  return frames.length;
}

function truthOfPath(heads: readonly TurningHead[], path: readonly HeadSegment[], camera: HeadCamera): object[] {
  const poses = path.flatMap((segment) =>
    Array.from({ length: segment.frames }, (_, k) => ({ seg: segment.name, poses: segment.heads(k / segment.frames) })),
  );
  return poses.map(({ seg, poses: there }, i) => ({
    i,
    seg,
    on: there.length,
    heads: there.map((pose) => truthOfHead(heads[(pose.who ?? 0) % heads.length], pose, camera)),
  }));
}

function* renderFrames(
  heads: readonly TurningHead[],
  path: readonly HeadSegment[],
  camera: HeadCamera,
): Generator<Uint8Array> {
  const { width, height } = camera;
  const random = repeatableRandom(12345);
  const noise = normalNoise(NOISE_LENGTH, 1, random);
  const background = swayingBackground(width, height);
  const exposed = new Float32Array(width * height * 3);
  const moment = new Float32Array(width * height * 3);
  let number = 0;
  for (const segment of path) {
    const { frames, light = 1, noise: deviation = NOISE_LEVELS, shutter = 0, moments = 1 } = segment;
    for (let k = 0; k < frames; k++, number++) {
      exposed.fill(0);
      const share = 1 / moments;
      for (let j = 0; j < moments; j++) {
        // The truth is that of the middle of the exposure.
        const late = shutter * ((j + 0.5) / moments - 0.5);
        background(number + late, moment);
        drawHeads(moment, heads, segment.heads((k + late) / frames), camera);
        for (let at = 0; at < exposed.length; at++) exposed[at] += share * moment[at];
      }
      yield asSensed(exposed, camera, number, light, deviation, noise, Math.floor(random() * NOISE_LENGTH));
    }
  }
}

/** Light and noise of a sensor: most of the noise is of luma, some of each colour. */
function asSensed(
  exposed: Float32Array,
  { width, height }: HeadCamera,
  number: number,
  light: number,
  deviation: number,
  noise: Float32Array,
  from: number,
): Uint8Array {
  const bytes = new Uint8ClampedArray(exposed.length);
  for (let at = 0, n = from; at < exposed.length; at += 3, n += 4) {
    const luma = 0.8 * noise[n & (NOISE_LENGTH - 1)];
    for (let k = 0; k < 3; k++)
      bytes[at + k] = light * exposed[at + k] + deviation * (luma + 0.6 * noise[(n + 1 + k) & (NOISE_LENGTH - 1)]);
  }
  const pixels = new Uint8Array(bytes.buffer);
  drawFrameNumber(pixels, width, height, number);
  return pixels;
}
