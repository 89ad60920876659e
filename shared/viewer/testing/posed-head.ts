import { LANDMARK_COUNT } from '../canonical-face';
import type { FaceModel } from '../face-model';

/** A head's turn and place in the camera's coordinates: radians, mm, as in head-angles.ts. */
export interface Pose {
  readonly yaw: number;
  readonly pitch: number;
  readonly roll: number;
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

/** R = Rz(roll) Ry(-yaw) Rx(pitch), by rows, written out independently of the code under test. */
export function rotationOf({ yaw, pitch, roll }: Pick<Pose, 'yaw' | 'pitch' | 'roll'>): number[] {
  const multiply = (a: number[], b: number[]) =>
    [0, 1, 2].flatMap((i) => [0, 1, 2].map((j) => a[3 * i] * b[j] + a[3 * i + 1] * b[3 + j] + a[3 * i + 2] * b[6 + j]));
  const [cr, sr, cy, sy, cp, sp] = [roll, -yaw, pitch].flatMap((angle) => [Math.cos(angle), Math.sin(angle)]);
  return multiply(multiply([cr, -sr, 0, sr, cr, 0, 0, 0, 1], [cy, 0, sy, 0, 1, 0, -sy, 0, cy]), [
    1,
    0,
    0,
    0,
    cp,
    -sp,
    0,
    sp,
    cp,
  ]);
}

/** Each vertex of the model in the camera's coordinates, mm. */
export function posedPoints(model: FaceModel, pose: Pose, eyeDistanceMm: number): number[][] {
  const r = rotationOf(pose);
  return Array.from({ length: LANDMARK_COUNT }, (_, i) => {
    const [x, y, z] = [0, 1, 2].map((axis) => model.points[3 * i + axis] * eyeDistanceMm);
    return [
      r[0] * x + r[1] * y + r[2] * z + pose.x,
      r[3] * x + r[4] * y + r[5] * z + pose.y,
      r[6] * x + r[7] * y + r[8] * z + pose.z,
    ];
  });
}

/**
 * The landmarks a perfect tracker would give: u and v in true perspective, z as trackers give it, in the pixels of the face's
 * own middle and against the ray that leads there.
 */
export function landmarksOf(
  model: FaceModel,
  pose: Pose,
  eyeDistanceMm: number,
  f: number,
  width: number,
  height: number,
): Float64Array {
  const points = posedPoints(model, pose, eyeDistanceMm);
  const middle = [0, 1, 2].map((axis) => points.reduce((sum, p) => sum + p[axis], 0) / points.length);
  const length = Math.hypot(...middle);
  const ray = middle.map((entry) => entry / length);
  return Float64Array.from(
    points.flatMap(([x, y, z]) => {
      const along = (x - middle[0]) * ray[0] + (y - middle[1]) * ray[1] + (z - middle[2]) * ray[2];
      return [width / 2 + (f * x) / z, height / 2 + (f * y) / z, (f * along) / middle[2]];
    }),
  );
}
