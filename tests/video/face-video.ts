import { writeFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { swayingBackground } from './background';
import type { FacePose } from './face-path';
import { drawFlatFace, placePoint, type FlatFace } from './flat-face';
import { drawFrameNumber, writeMjpeg } from './numbered-video';
import { normalNoise, repeatableRandom } from './random';
import { readPicture } from './still-picture';

export interface VideoSize {
  readonly width: number;
  readonly height: number;
  readonly fps: number;
}

export const VGA: VideoSize = { width: 640, height: 480, fps: 30 };

/** Noise of a webcam's sensor in a lit room, in levels of 255. */
const NOISE_LEVELS = 3;
const NOISE_LENGTH = 1 << 20;

/** The face that comes with the tests; see CREDITS.md for the pupils. */
export async function testFace(): Promise<FlatFace> {
  return {
    picture: await readPicture(fileURLToPath(new URL('./face.png', import.meta.url))),
    rightEye: [203.7, 101.8],
    leftEye: [246.3, 103.6],
    oval: { centre: [225, 135], radii: [62, 85] },
  };
}

/** What is true of every frame, in the form `npm run bench:tracking` reads. */
function truthOf(face: FlatFace, poses: readonly FacePose[], size: VideoSize): object {
  const frames = poses.map((pose, i) => ({
    i,
    seg: pose.segment,
    on: pose.on ? 1 : 0,
    ipd: pose.ipd,
    re: placePoint(face, pose, face.rightEye),
    le: placePoint(face, pose, face.leftEye),
    roll: pose.rollDeg,
  }));
  return { W: size.width, H: size.height, FPS: size.fps, frames };
}

/** Writes `OUT.mjpeg`, a camera's view of a face on a known path, and `OUT.json`, the truth of it. */
export async function makeFaceVideo(
  out: string,
  face: FlatFace,
  poses: readonly FacePose[],
  size: VideoSize = VGA,
): Promise<void> {
  await writeFile(`${out}.json`, JSON.stringify(truthOf(face, poses, size)));
  await writeMjpeg(`${out}.mjpeg`, size, renderFrames(face, poses, size));
}

function* renderFrames(
  face: FlatFace,
  poses: readonly FacePose[],
  { width, height }: VideoSize,
): Generator<Uint8Array> {
  const random = repeatableRandom(12345);
  const noise = normalNoise(NOISE_LENGTH, NOISE_LEVELS, random);
  const background = swayingBackground(width, height);
  const frame = new Float32Array(width * height * 3);
  for (const [number, pose] of poses.entries()) {
    background(number, frame);
    if (pose.on) drawFlatFace(face, pose, frame, width, height);
    const bytes = new Uint8ClampedArray(frame.length);
    const from = Math.floor(random() * NOISE_LENGTH);
    for (let pixel = 0, at = 0; at < frame.length; pixel++) {
      const level = noise[(from + pixel) & (NOISE_LENGTH - 1)];
      for (let k = 0; k < 3; k++, at++) bytes[at] = frame[at] + level;
    }
    const pixels = new Uint8Array(bytes.buffer);
    drawFrameNumber(pixels, width, height, number);
    yield pixels;
  }
}
