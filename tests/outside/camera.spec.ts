import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { figure } from '@oriel/shared/projection/testing/arbitraries';
import { eyeFromPixel, focalPx, pixelOfPoint, type Camera } from '@oriel/shared/viewer/camera';
import { createLandmarkEye, eyeFromLandmarks } from '@oriel/shared/viewer/eye-from-landmarks';
import { createFaceModel } from '@oriel/shared/viewer/face-model';
import { perspectivePlace } from '@oriel/shared/viewer/perspective-place';
import { landmarksOf, posedPoints } from '@oriel/shared/viewer/testing/posed-head';
import { startOpenCv, type OpenCv } from './opencv';

const WIDTH = 1280;
const HEIGHT = 720;
const MODEL = createFaceModel();
const anyCamera = fc.record({
  position: fc.record({ x: figure(-400, 400), y: figure(-400, 400), z: figure(-50, 50) }),
  pitchRad: figure(-0.6, 0.6),
  yawRad: figure(-0.6, 0.6),
  rollRad: figure(-1.5, 1.5),
  hfovRad: figure(0.5, 2),
  mirrored: fc.constant(false),
  widthPx: fc.constant(WIDTH),
  heightPx: fc.constant(HEIGHT),
});
const anyPose = fc.record({
  yaw: figure(-0.6, 0.6),
  pitch: figure(-0.35, 0.35),
  roll: figure(-0.45, 0.45),
  x: figure(-300, 300),
  y: figure(-150, 150),
  z: figure(1000, 3000),
});

/** Reference: OpenCV.js, projectPoints, Rodrigues and solvePnP. */
describe('beside OpenCV', () => {
  let cv: OpenCv;
  let distortion: ReturnType<OpenCv['matFromArray']>;
  beforeAll(async () => {
    ({ cv } = await startOpenCv());
    distortion = cv.matFromArray(4, 1, cv.CV_64F, [0, 0, 0, 0]);
  });

  const lens = (f: number) => cv.matFromArray(3, 3, cv.CV_64F, [f, 0, WIDTH / 2, 0, f, HEIGHT / 2, 0, 0, 1]);

  /**
   * The room-to-camera turn of a camera on the frame, built as camera.ts words it, for a room turned half about z: then an
   * untilted camera has no turn. (Near half a turn Rodrigues loses digits.)
   */
  function turnOf(camera: Camera): number[] {
    const about = (axis: [number, number, number], angle: number) => {
      const vector = cv.matFromArray(
        3,
        1,
        cv.CV_64F,
        axis.map((entry) => entry * angle),
      );
      const matrix = new cv.Mat();
      cv.Rodrigues(vector, matrix);
      const rows = [...matrix.data64F];
      vector.delete();
      matrix.delete();
      return rows;
    };
    const multiply = (a: number[], b: number[]) =>
      [0, 1, 2].flatMap((i) =>
        [0, 1, 2].map((j) => a[3 * i] * b[j] + a[3 * i + 1] * b[3 + j] + a[3 * i + 2] * b[6 + j]),
      );
    const half = [-1, 0, 0, 0, -1, 0, 0, 0, 1];
    const upright = multiply(about([0, 1, 0], camera.yawRad), about([1, 0, 0], -camera.pitchRad));
    const tilt = multiply(multiply(half, upright), multiply(about([0, 0, 1], camera.rollRad), half));
    return [0, 1, 2].flatMap((i) => [0, 1, 2].map((j) => tilt[3 * j + i]));
  }

  function project(points: number[][], turn: number[], place: number[], f: number): Float64Array {
    const matrix = cv.matFromArray(3, 3, cv.CV_64F, turn);
    const mats = [
      cv.matFromArray(points.length, 3, cv.CV_64F, points.flat()),
      new cv.Mat(),
      cv.matFromArray(3, 1, cv.CV_64F, place),
      lens(f),
      new cv.Mat(),
    ];
    cv.Rodrigues(matrix, mats[1]);
    cv.projectPoints(mats[0], mats[1], mats[2], mats[3], distortion, mats[4]);
    const pixels = Float64Array.from(mats[4].data64F);
    for (const mat of [matrix, ...mats]) mat.delete();
    return pixels;
  }

  // Rodrigues takes a turn whose sine is below 1e-5 for none: the slack is what that does to a pixel.
  it('pixelOfPoint is projectPoints, and eyeFromPixel undoes it', () => {
    fc.assert(
      fc.property(anyCamera, figure(-500, 500), figure(-400, 400), figure(500, 4000), (camera, x, y, z) => {
        const seen = pixelOfPoint(camera, { x, y, z });
        if (!seen) return;
        const turn = turnOf(camera);
        const { position } = camera;
        const from = [-position.x, -position.y, position.z];
        const place = [0, 1, 2].map(
          (i) => -(turn[3 * i] * from[0] + turn[3 * i + 1] * from[1] + turn[3 * i + 2] * from[2]),
        );
        const [px, py] = project([[-x, -y, z]], turn, place, focalPx(camera));
        const f = focalPx(camera);
        const slackPx = 1.1e-5 * (f + ((px - WIDTH / 2) ** 2 + (py - HEIGHT / 2) ** 2) / f);
        expect(Math.abs(seen.x - px)).toBeLessThan(slackPx);
        expect(Math.abs(seen.y - py)).toBeLessThan(slackPx);
        const depth = -turn[6] * x - turn[7] * y + turn[8] * z + place[2];
        const eye = eyeFromPixel(camera, px, py, depth);
        expect(eye.x).toBeCloseTo(x, 1);
        expect(eye.y).toBeCloseTo(y, 1);
        expect(eye.z).toBeCloseTo(z, 1);
      }),
      { numRuns: 60 },
    );
  });

  it('the posed head of these tests is drawn as projectPoints draws it', () => {
    fc.assert(
      fc.property(anyPose, (pose) => {
        const landmarks = landmarksOf(MODEL, pose, 63, 1000, WIDTH, HEIGHT);
        const pixels = project(posedPoints(MODEL, pose, 63), [1, 0, 0, 0, 1, 0, 0, 0, 1], [0, 0, 0], 1000);
        for (let i = 0; i < 468; i++) {
          expect(Math.abs(landmarks[3 * i] - pixels[2 * i])).toBeLessThan(1e-6);
          expect(Math.abs(landmarks[3 * i + 1] - pixels[2 * i + 1])).toBeLessThan(1e-6);
        }
      }),
      { numRuns: 10 },
    );
  });

  /** solvePnP on all landmarks: the head's turn by rows and its place. */
  function solve(landmarks: Float64Array, eyeDistanceMm: number, f: number): { turn: Float64Array; place: number[] } {
    const pixels = Array.from({ length: 468 }, (_, i) => [landmarks[3 * i], landmarks[3 * i + 1]]).flat();
    const mats = [
      cv.matFromArray(
        468,
        3,
        cv.CV_64F,
        Array.from(MODEL.points, (entry) => entry * eyeDistanceMm),
      ),
      cv.matFromArray(468, 2, cv.CV_64F, pixels),
      lens(f),
      cv.matFromArray(3, 1, cv.CV_64F, [0.01, 0.01, 0.01]),
      cv.matFromArray(3, 1, cv.CV_64F, [0, 0, 1000]),
      new cv.Mat(),
    ];
    const found = cv.solvePnP(mats[0], mats[1], mats[2], distortion, mats[3], mats[4], true, cv.SOLVEPNP_ITERATIVE);
    expect(found).toBe(true);
    cv.Rodrigues(mats[3], mats[5]);
    const solved = { turn: Float64Array.from(mats[5].data64F), place: [...mats[4].data64F] };
    for (const mat of mats) mat.delete();
    return solved;
  }

  it('perspectivePlace, given solvePnP’s turn, finds solvePnP’s place', () => {
    fc.assert(
      fc.property(anyPose, (pose) => {
        const landmarks = landmarksOf(MODEL, pose, 63, 1000, WIDTH, HEIGHT);
        const { turn, place } = solve(landmarks, 63, 1000);
        const out = { x: 0, y: 0, z: 0 };
        perspectivePlace(MODEL, turn, turn, 63, landmarks, WIDTH / 2, HEIGHT / 2, 1000, out);
        expect(Math.hypot(out.x - place[0], out.y - place[1], out.z - place[2])).toBeLessThan(0.05);
      }),
      { numRuns: 15 },
    );
  });

  it('eyeFromLandmarks finds the eye solvePnP finds, within 0.8 % of the distance, and its turn within 3 degrees', () => {
    const camera: Camera = {
      position: { x: 0, y: 0, z: 0 },
      pitchRad: 0,
      yawRad: 0,
      rollRad: 0,
      hfovRad: 2 * Math.atan(WIDTH / 2 / 1000),
      mirrored: false,
      widthPx: WIDTH,
      heightPx: HEIGHT,
    };
    const out = createLandmarkEye(MODEL);
    fc.assert(
      fc.property(anyPose, (pose) => {
        const landmarks = landmarksOf(MODEL, pose, 63, 1000, WIDTH, HEIGHT);
        eyeFromLandmarks(camera, landmarks, out, { eyeDistanceMm: 63, distanceFactor: 1 });
        const { turn, place } = solve(landmarks, 63, 1000);
        const { x, y, z } = out.inCamera;
        expect(Math.hypot(x - place[0], y - place[1], z - place[2]) / place[2]).toBeLessThan(0.008);
        const trace = turn.reduce((sum, entry, i) => sum + entry * out.headPose[i], 0);
        expect(Math.acos(Math.min(1, (trace - 1) / 2))).toBeLessThan((3 * Math.PI) / 180);
      }),
      { numRuns: 15 },
    );
  });
});
