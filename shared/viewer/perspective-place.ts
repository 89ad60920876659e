import { LANDMARK_COUNT } from './canonical-face';
import type { FaceModel } from './face-model';
import type { MutablePoint3 } from './camera';

/*
 * The place of a head of known turn, in full perspective. With r = R c the model turned and scaled, each landmark at (u, v)
 * from the middle of the picture asks for
 *
 *     f (r_x + X) = u (r_z + Z),     f (r_y + Y) = v (r_z + Z),
 *
 * which is linear in the place (X, Y, Z): weighted normal equations in three unknowns, solved by elimination. (The step
 * of every linear PnP once the rotation is known; R. Hartley, A. Zisserman, ch. 7.)
 *
 * How wide a turned head is seen depends on how deep its face is, which differs from person to person, and on the turn, which
 * landmarks understate by a quarter; how high it is depends on neither. So the equations across count less the more the head is
 * turned, 1 - ACROSS_LOSES sin2 yaw. On films of turning heads at 1 m from two generators (three faces of different depth; npm run
 * bench:tracking, segments yaw and mixed) distance then strays the same way for all of them, which distance-trend.ts takes back:
 * together from 1.7 to 3.6 % rms to 1.4 to 2.2.
 *
 * Landmarks that turn away from the camera are guessed more than seen: each is weighed by cos^1.5 of the angle between its
 * normal and the line of sight, no less than LEAST. On rendered heads at 1 m that took the error of distance through a yaw of
 * 35 degrees from 2.6 to 1.6 % rms, through a mixed turn from 3.0 to 1.8, walking past from 1.4 to 1.0; pitch rose from 0.8 to 1.2.
 */

/** What a landmark counts at least, however it is turned. */
const LEAST = 0.05;
/** What the equations across lose for each unit of sin2 yaw, and what they count at least. */
const ACROSS_LOSES = 3;
const ACROSS_LEAST = 0.01;

/**
 * Writes the place of the midpoint between the eyes in camera coordinates, mm. Allocates nothing.
 * @param rotation nine numbers by rows, from `turnedByRay`.
 * @param apparent the same turn as it looks from the camera, of which the weights are taken.
 * @returns whether there is a place in front of the camera.
 */
export function perspectivePlace(
  model: FaceModel,
  rotation: Float64Array,
  apparent: Float64Array,
  eyeDistanceMm: number,
  landmarks: ArrayLike<number>,
  centreX: number,
  centreY: number,
  focalLengthPx: number,
  out: MutablePoint3,
): boolean {
  const { points, placeWeights, normals } = model;
  const f = focalLengthPx;
  const across = Math.max(ACROSS_LEAST, 1 - ACROSS_LOSES * apparent[6] * apparent[6]);
  // Sums of w, w u, w v, w (u2 + v2), and of the right sides, those across still to be weighed. u and v are over f: the equations stay
  // well scaled.
  let n = 0,
    su = 0,
    sv = 0,
    sq = 0,
    bx = 0,
    by = 0,
    bz = 0;
  for (let i = 0; i < LANDMARK_COUNT; i++) {
    const facing = Math.max(0, -(apparent[6] * normals[2 * i] + apparent[8] * normals[2 * i + 1]));
    const w = placeWeights[i] * Math.max(LEAST, facing * Math.sqrt(facing));
    const x = points[3 * i] * eyeDistanceMm;
    const y = points[3 * i + 1] * eyeDistanceMm;
    const z = points[3 * i + 2] * eyeDistanceMm;
    const rz = rotation[6] * x + rotation[7] * y + rotation[8] * z;
    const u = (landmarks[3 * i] - centreX) / f;
    const v = (landmarks[3 * i + 1] - centreY) / f;
    const a = u * rz - (rotation[0] * x + rotation[1] * y + rotation[2] * z);
    const b = v * rz - (rotation[3] * x + rotation[4] * y + rotation[5] * z);
    n += w;
    su += w * u;
    sv += w * v;
    sq += w * (across * u * u + v * v);
    bx += w * a;
    by += w * b;
    bz += w * (across * u * a + v * b);
  }
  // X - mean(u) Z = mean(a) and Y - mean(v) Z = mean(b), put into  across su X + sv Y - sq Z = bz.
  const Z = (bz - (across * su * bx + sv * by) / n) / ((across * su * su + sv * sv) / n - sq);
  out.x = (bx + su * Z) / n;
  out.y = (by + sv * Z) / n;
  out.z = Z;
  return Z > 0 && Z < Infinity;
}
