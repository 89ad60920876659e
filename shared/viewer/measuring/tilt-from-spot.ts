import { GeometryError } from '../../projection/geometry-error';
import type { Point3 } from '../../projection/types';
import { type Measured, propagate } from './uncertainty';

/*
 * The camera's pitch and yaw from someone standing at a known spot. With both taken as zero the tracker sees the eye in the direction
 * v (its own roll included); truly it stands in the direction t = (P - C)/|P - C|. camera.ts carries v to Ry(yaw) Rx(-pitch) v, so
 *
 *     v_y cos p + v_z sin p = t_y        ->  p = asin(t_y / |(v_y, v_z)|) - atan2(v_y, v_z),
 *     yaw = atan2(t_x, t_z) - atan2(v_x, v_z cos p - v_y sin p).
 *
 * It fails where t is steeper than the camera can be pitched to meet (|t_y| > |(v_y, v_z)|): the spot is then not where the person is.
 */

export interface Tilt {
  readonly pitchRad: Measured;
  readonly yawRad: Measured;
}

type MeasuredPoint = Readonly<Record<keyof Point3, Measured>>;

const directionOf = (x: number, y: number, z: number) => {
  const length = Math.hypot(x, y, z);
  return { x: x / length, y: y / length, z: z / length };
};

/**
 * @param lens from the centre of the glass, mm.
 * @param spot the eye of the person standing there, from the centre of the glass, mm.
 * @param seen that eye as a camera of this roll and field of view, pitch and yaw zero, sees it from itself, mm; only its direction counts.
 * @throws GeometryError 'spot' where no tilt makes the two meet.
 */
export function tiltFromSpot(lens: MeasuredPoint, spot: MeasuredPoint, seen: MeasuredPoint): Tilt {
  const inputs = [lens, spot, seen].flatMap(({ x, y, z }) => [x, y, z]);
  return {
    pitchRad: propagate((at) => tiltOf(at).pitch, inputs),
    yawRad: propagate((at) => tiltOf(at).yaw, inputs),
  };
}

function tiltOf([cx, cy, cz, px, py, pz, sx, sy, sz]: number[]): { pitch: number; yaw: number } {
  const t = directionOf(px - cx, py - cy, pz - cz);
  const v = directionOf(sx, sy, sz);
  const upright = Math.hypot(v.y, v.z);
  if (t.z <= 0 || v.z <= 0 || Math.abs(t.y) > upright) {
    throw new GeometryError('spot', 'The camera cannot see anyone at that spot: measure the spot again, and stand on it.');
  }
  const pitch = Math.asin(t.y / upright) - Math.atan2(v.y, v.z);
  const forward = v.z * Math.cos(pitch) - v.y * Math.sin(pitch);
  return { pitch, yaw: Math.atan2(t.x, t.z) - Math.atan2(v.x, forward) };
}
