import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import sharp, { type Sharp } from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { LADDER_STEPS } from '@oriel/shared/ladder/steps';
import { USUAL_VIEWER } from '@oriel/shared/viewer/eye-from-landmarks';
import { leftEyeOf, rightEyeOf } from '../../src/app/tracking/face-landmarks';
import { FaceMeasure } from '../../src/app/tracking/face-measure';
import type { FaceModels } from '../../src/app/tracking/face-models';
import type { Picture } from '../../src/app/tracking/picture';
import { RgbaPicture } from '../../src/app/tracking/rgba-picture';
import { loadFaceModels } from '../../src/app/tracking/tfjs-face-models';
import { Tracker } from '../../src/app/tracking/tracker';

/*
 * The tracker with its real models on a real photograph: tests/video/face.png, whose pupils were marked by hand at (203.7, 101.8) and
 * (246.3, 103.6), to about 0.3 px (read in the picture's credits).
 */
const PUPIL_DISTANCE = Math.hypot(246.3 - 203.7, 103.6 - 101.8);
const MIDDLE = { x: (203.7 + 246.3) / 2, y: (101.8 + 103.6) / 2 };

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));
const folder = here('../../assets/tracker/');
const read = async (name: string): Promise<ArrayBuffer> => new Uint8Array(await readFile(folder + name)).buffer;

interface Placed {
  readonly picture: Picture;
  readonly x: number;
  readonly y: number;
  readonly ipd: number;
}

/** A grey frame with the photograph's head in it, its pupils this far apart and their midpoint at (x, y). */
async function frameWith(
  width: number,
  height: number,
  face: { x: number; y: number; ipd: number } | null,
): Promise<Placed> {
  const frame = sharp({ create: { width, height, channels: 4, background: { r: 120, g: 125, b: 130, alpha: 1 } } });
  if (!face) return { picture: await pixelsOf(frame), x: 0, y: 0, ipd: 0 };
  const cut = { left: 145, top: 20, width: 170, height: 220 };
  const scale = face.ipd / PUPIL_DISTANCE;
  const head = sharp(here('../video/face.png')).extract(cut);
  const size = { width: Math.round(cut.width * scale), height: Math.round(cut.height * scale) };
  const input = await head
    .resize({ ...size, fit: 'fill' })
    .png()
    .toBuffer();
  const left = Math.round(face.x - ((MIDDLE.x - cut.left) * size.width) / cut.width);
  const top = Math.round(face.y - ((MIDDLE.y - cut.top) * size.height) / cut.height);
  const x = left + ((MIDDLE.x - cut.left) * size.width) / cut.width;
  const y = top + ((MIDDLE.y - cut.top) * size.height) / cut.height;
  return { picture: await pixelsOf(frame.composite([{ input, left, top }])), x, y, ipd: face.ipd };
}

async function pixelsOf(image: Sharp): Promise<RgbaPicture> {
  const { data, info } = await sharp(await image.png().toBuffer())
    .ensureAlpha()
    .raw()
    .toBuffer({ resolveWithObject: true });
  return new RgbaPicture(info.width, info.height, data);
}

/** How far the tracker's eye lies from the true one, in eye distances; null where it found nobody. */
function errorOf(tracker: Tracker, { picture, x, y, ipd }: Placed, timestampMs: number): number | null {
  if (tracker.look(picture, timestampMs) === null) return null;
  const right = rightEyeOf(tracker.points);
  const left = leftEyeOf(tracker.points);
  return Math.hypot((right.x + left.x) / 2 - x, (right.y + left.y) / 2 - y) / ipd;
}

describe('the tracker on a photograph', () => {
  let models: FaceModels;
  beforeAll(async () => {
    models = await loadFaceModels({ folder, read });
  });

  it.each([24, 40, 60, 84])('finds a face in its first frame, eyes %i px apart, to 0.04 of that', async (ipd) => {
    const frame = await frameWith(640, 480, { x: 330, y: 210, ipd });
    expect(errorOf(new Tracker(models), frame, 0)).toBeLessThan(0.04);
  });

  it('finds a viewer 4 m away, eyes 17.6 px apart at 1280 x 720, within six frames', async () => {
    const frame = await frameWith(1280, 720, { x: 900, y: 300, ipd: 17.6 });
    const tracker = new Tracker(models);
    const errors = Array.from({ length: 6 }, (_, k) => errorOf(tracker, frame, 33 * k));
    expect(errors[5]).not.toBeNull();
    expect(errors[5]).toBeLessThan(0.06);
  });

  it('sees nobody in an empty room, and says so in the frame in which someone leaves', async () => {
    const someone = await frameWith(640, 480, { x: 300, y: 220, ipd: 50 });
    const nobody = await frameWith(640, 480, null);
    const tracker = new Tracker(models);
    expect(errorOf(tracker, someone, 0)).toBeLessThan(0.04);
    expect([33, 66, 99].map((t) => tracker.look(nobody.picture, t))).toEqual([null, null, null]);
  });

  it('does not cling to a wrong size: from far to near and back it is right again within two frames', async () => {
    const far = await frameWith(640, 480, { x: 420, y: 180, ipd: 24 });
    const near = await frameWith(640, 480, { x: 330, y: 230, ipd: 84 });
    const tracker = new Tracker(models);
    const path = [far, far, far, near, near, near, far, far, far];
    const errors = path.map((frame, k) => errorOf(tracker, frame, 33 * k) ?? Infinity);
    for (const settled of [2, 5, 8]) expect(errors[settled]).toBeLessThan(0.05);
  });

  it('frees every tensor it makes, seeking and following', async () => {
    const someone = await frameWith(640, 480, { x: 300, y: 220, ipd: 50 });
    const nobody = await frameWith(640, 480, null);
    const tracker = new Tracker(models);
    const before = models.tensors();
    for (let k = 0; k < 12; k++) tracker.look((k < 8 ? someone : nobody).picture, 33 * k);
    expect(models.tensors()).toBe(before);
  });
});

describe('the steps of the ladder on a photograph', () => {
  let models: FaceModels;
  beforeAll(async () => {
    models = await loadFaceModels({ folder, read });
  });
  const settings = {
    assetsUrl: '',
    camera: { position: { x: 0, y: 0, z: 0 }, pitchRad: 0, yawRad: 0, rollRad: 0, hfovRad: Math.PI / 3, mirrored: false },
    viewer: USUAL_VIEWER,
  };
  /** The eye as the step measures it after eight frames, in the camera's mm. */
  const eyeOn = (step: number, { picture }: Placed) => {
    const tracker = new Tracker(models);
    tracker.looking = LADDER_STEPS[step].looking;
    let belief: number | null = null;
    for (let k = 0; k < 8; k++) belief = tracker.look(picture, 33 * k);
    expect(belief).not.toBeNull();
    const measure = new FaceMeasure();
    const face = tracker.detected
      ? measure.measureEyes(tracker.detected, belief!, picture, settings)
      : measure.measure(tracker.points, belief!, picture, settings, 0);
    return face.eyeInCamera;
  };
  const distances = [24, 40, 60, 84];

  it.each(distances)('guarding seldom or often, or not, changes no landmark of a face at rest, eyes %i px apart', async (ipd) => {
    const frame = await frameWith(640, 480, { x: 330, y: 210, ipd });
    const landmarks = [0, 1, 2].map((step) => eyeOn(step, frame));
    expect(landmarks[0]).toEqual(landmarks[1]);
    expect(landmarks[2]).toEqual(landmarks[1]);
  });

  it.each(distances)('the detector alone measures the same eye, to 0.02 of its distance, eyes %i px apart', async (ipd) => {
    const frame = await frameWith(640, 480, { x: 330, y: 210, ipd });
    const fine = eyeOn(1, frame);
    const coarse = eyeOn(3, frame);
    expect(Math.hypot(coarse.x - fine.x, coarse.y - fine.y, coarse.z - fine.z)).toBeLessThan(0.02 * fine.z);
  });
});
