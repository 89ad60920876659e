import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { rotationOf } from '@oriel/shared/viewer/testing/posed-head';
import { drawHeads } from './draw-head';
import { cameraOf, posed, seenAt, type HeadPose, type Place, type TurningHead } from './turning-head';

const SIZE = 200;
/** Small, for a large one's centroid is drawn to its nearer side by perspective. */
const DOT = { u: 92.3, v: 81.7, deviation: 3 };
const CAMERA = cameraOf(320, 240, 60);

/** A square of 200 mm, 30 mm before the eyes, black but for one soft bright dot. */
function dottedHead(): TurningHead {
  const data = new Float32Array(SIZE * SIZE * 4);
  for (let at = 0; at < SIZE * SIZE; at++) {
    const squared = ((at % SIZE) + 0.5 - DOT.u) ** 2 + (Math.floor(at / SIZE) + 0.5 - DOT.v) ** 2;
    data.fill(255 * Math.exp(-squared / (2 * DOT.deviation ** 2)), 4 * at, 4 * at + 3);
    data[4 * at + 3] = 1;
  }
  const corners = [0, SIZE].flatMap((v) =>
    [0, SIZE].map((u) => ({
      place: [u - 100, v - 100, -30] as Place,
      texture: [u, v] as const,
      opacity: 1,
      ofFace: true,
    })),
  );
  const triangles = [[0, 1, 2], [1, 3, 2]] as const; // prettier-ignore
  const levels = [{ width: SIZE, height: SIZE, data }];
  return {
    corners,
    triangles,
    levels,
    body: { corners: [], triangles: [] },
    rightEye: [-32, 0, 0],
    leftEye: [32, 0, 0],
    mouthMm: 60,
  };
}

function centroid(frame: Float32Array): [number, number] {
  const sums = [0, 0, 0];
  for (let at = 0; at < frame.length / 3; at++) {
    sums[0] += frame[3 * at];
    sums[1] += frame[3 * at] * ((at % CAMERA.width) + 0.5);
    sums[2] += frame[3 * at] * (Math.floor(at / CAMERA.width) + 0.5);
  }
  return [sums[1] / sums[0], sums[2] / sums[0]];
}

const pose = fc.record({
  x: fc.double({ min: -40, max: 40, noNaN: true }),
  y: fc.double({ min: -40, max: 40, noNaN: true }),
  z: fc.double({ min: 400, max: 700, noNaN: true }),
  yaw: fc.double({ min: -40, max: 40, noNaN: true }),
  pitch: fc.double({ min: -25, max: 25, noNaN: true }),
  roll: fc.double({ min: -30, max: 30, noNaN: true }),
});

describe('a turning head', () => {
  it('is placed by the turn of shared/viewer/testing, written independently', () => {
    fc.assert(
      fc.property(
        pose,
        fc.tuple(
          fc.double({ min: -99, max: 99, noNaN: true }),
          fc.integer({ min: -99, max: 99 }),
          fc.integer({ min: -99, max: 99 }),
        ),
        (at, place) => {
          const [yaw, pitch, roll] = [at.yaw, at.pitch, at.roll].map((degrees) => (degrees * Math.PI) / 180);
          const r = rotationOf({ yaw, pitch, roll });
          const put = posed(at)(place);
          [at.x, at.y, at.z].forEach((from, i) =>
            expect(put[i]).toBeCloseTo(
              from + r[3 * i] * place[0] + r[3 * i + 1] * place[1] + r[3 * i + 2] * place[2],
              9,
            ),
          );
        },
      ),
    );
  });

  it('is drawn where its truth says, to a tenth of a pixel', () => {
    const head = dottedHead();
    fc.assert(
      fc.property(pose, (at: HeadPose) => {
        const frame = new Float32Array(CAMERA.width * CAMERA.height * 3);
        drawHeads(frame, [head], [at], CAMERA);
        const [x, y] = seenAt(CAMERA, posed(at)([DOT.u - 100, DOT.v - 100, -30]));
        const [drawnX, drawnY] = centroid(frame);
        expect(Math.hypot(drawnX - x, drawnY - y)).toBeLessThan(0.1);
      }),
      { numRuns: 15 },
    );
  });
});
