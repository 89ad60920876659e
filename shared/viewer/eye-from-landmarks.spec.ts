import { describe, expect, it } from 'vitest';
import { pixelOfPoint, type Camera } from './camera';
import { createLandmarkEye, eyeFromLandmarks } from './eye-from-landmarks';
import { landmarksOf, type Pose } from './testing/posed-head';

const CAMERA: Camera = {
  position: { x: 0, y: 180, z: 0 },
  pitchRad: -0.1,
  yawRad: 0.05,
  rollRad: 0.02,
  hfovRad: Math.PI / 3,
  mirrored: false,
  widthPx: 1280,
  heightPx: 720,
};
const F = 1108.5125;
const VIEWER = { eyeDistanceMm: 63, distanceFactor: 1 };
const FACING: Pose = { yaw: 0, pitch: 0, roll: 0, x: 0, y: 0, z: 1000 };

function find(pose: Pose, camera = CAMERA, viewer = VIEWER, eyeDistance = 63) {
  const out = createLandmarkEye();
  eyeFromLandmarks(camera, landmarksOf(out.model, pose, eyeDistance, F, 1280, 720), out, viewer);
  return out;
}

describe('eyeFromLandmarks, on a perfect tracker’s landmarks of the canonical face', () => {
  it.each<[string, Pose]>([
    ['facing at 0.5 m', { ...FACING, z: 500 }],
    ['facing at 1 m', FACING],
    ['facing at 3 m', { ...FACING, z: 3000 }],
    ['yaw 30 degrees at 0.6 m', { ...FACING, z: 600, yaw: 0.52 }],
    ['yaw 30 degrees at 1 m', { ...FACING, yaw: 0.52 }],
    ['pitch 20 degrees at 1 m', { ...FACING, pitch: 0.35 }],
    ['roll 25 degrees at 1 m', { ...FACING, roll: 0.44 }],
    ['aside at 0.6 m', { ...FACING, x: 250, y: -80, z: 600 }],
    ['far aside at 1.5 m', { ...FACING, x: 780, y: 200, z: 1500, yaw: -0.4 }],
  ])('%s is found within 0.7 %% of its distance', (_, pose) => {
    const { inCamera } = find(pose);
    const error = Math.hypot(inCamera.x - pose.x, inCamera.y - pose.y, inCamera.z - pose.z);
    expect((100 * error) / pose.z).toBeLessThan(0.7);
  });

  it('gives the head’s own turn, off the axis too', () => {
    const { headAngles } = find({ ...FACING, yaw: 0.3, pitch: 0.1, roll: -0.2, x: 300, y: 60 });
    expect(headAngles.yawRad).toBeCloseTo(0.3, 1);
    expect(headAngles.pitchRad).toBeCloseTo(0.1, 1);
    expect(headAngles.rollRad).toBeCloseTo(-0.2, 1);
  });

  it('names landmarks that no face in front of the camera could have', () => {
    const out = createLandmarkEye();
    expect(() => eyeFromLandmarks(CAMERA, new Float64Array(1404).fill(7), out)).toThrowError(
      expect.objectContaining({ name: 'GeometryError', value: 'landmarks' }),
    );
  });

  it('carries the eye to the glass: it is seen at the pixel midway between the eyes', () => {
    const { eye, inCamera } = find({ ...FACING, x: 120, y: -60 });
    const pixel = pixelOfPoint(CAMERA, eye)!;
    expect(pixel.x).toBeCloseTo(640 + (F * inCamera.x) / inCamera.z, 2);
    expect(pixel.y).toBeCloseTo(360 + (F * inCamera.y) / inCamera.z, 2);
  });

  it('finds the same eye from a mirrored picture', () => {
    const pose = { ...FACING, yaw: 0.3, roll: 0.1, x: 150, y: -60 };
    // In the mirror the tracker sees another, mirrored head: the symmetrical face turned and standing the other way.
    const mirrored = { ...pose, yaw: -pose.yaw, roll: -pose.roll, x: -pose.x };
    const straight = find(pose).eye;
    const through = find(mirrored, { ...CAMERA, mirrored: true }).eye;
    expect(through.x).toBeCloseTo(straight.x, 1);
    expect(through.y).toBeCloseTo(straight.y, 1);
    expect(through.z).toBeCloseTo(straight.z, 1);
  });

  it('scales X, Y and Z by one factor for a wrong eye distance, and by 1/k for k', () => {
    const pose = { ...FACING, x: 200, y: 50, z: 2000 };
    const right = find(pose).inCamera;
    const wrong = find(pose, CAMERA, { ...VIEWER, eyeDistanceMm: 70 }).inCamera;
    const divided = find(pose, CAMERA, { ...VIEWER, distanceFactor: 1.065 }).inCamera;
    for (const axis of ['x', 'y', 'z'] as const) {
      expect(wrong[axis] / right[axis]).toBeCloseTo(70 / 63, 9);
      expect(divided[axis] / right[axis]).toBeCloseTo(1 / 1.065, 9);
    }
  });

  it.each([
    ['eyeDistanceMm', { eyeDistanceMm: 0, distanceFactor: 1 }],
    ['distanceFactor', { eyeDistanceMm: 63, distanceFactor: NaN }],
  ])('names %s when it is impossible', (value, viewer) => {
    expect(() => find(FACING, CAMERA, viewer)).toThrowError(expect.objectContaining({ name: 'GeometryError', value }));
  });
});
