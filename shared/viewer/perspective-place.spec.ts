import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure } from '../projection/testing/arbitraries';
import { createFaceModel } from './face-model';
import { perspectivePlace } from './perspective-place';
import { landmarksOf, rotationOf } from './testing/posed-head';

const MODEL = createFaceModel();

describe('perspectivePlace', () => {
  it('finds the place of a head of known turn exactly, near and far off the axis', () => {
    const anyPose = fc.record({
      yaw: figure(-0.8, 0.8),
      pitch: figure(-0.5, 0.5),
      roll: figure(-0.5, 0.5),
      x: figure(-400, 400),
      y: figure(-300, 300),
      z: figure(250, 4000),
    });
    fc.assert(
      fc.property(anyPose, (pose) => {
        const out = { x: 0, y: 0, z: 0 };
        const seen = landmarksOf(MODEL, pose, 63, 1100, 1280, 720);
        const turn = Float64Array.from(rotationOf(pose));
        expect(perspectivePlace(MODEL, turn, turn, 63, seen, 640, 360, 1100, out)).toBe(true);
        expect(out.x).toBeCloseTo(pose.x, 5);
        expect(out.y).toBeCloseTo(pose.y, 5);
        expect(out.z).toBeCloseTo(pose.z, 5);
      }),
    );
  });

  it('says where there is no place in front of the camera', () => {
    const turnedOver = Float64Array.from([-1, 0, 0, 0, -1, 0, 0, 0, 1]);
    const seen = landmarksOf(MODEL, { yaw: 0, pitch: 0, roll: 0, x: 0, y: 0, z: 800 }, 63, 1100, 1280, 720);
    expect(perspectivePlace(MODEL, turnedOver, turnedOver, 63, seen, 640, 360, 1100, { x: 0, y: 0, z: 0 })).toBe(false);
  });
});
