import { type EyeRoom, limitAt, type RoomSide } from './eye-room';
import type { Point3 } from './types';

/**
 * Writes into `out` the eye to draw for a viewer anywhere: itself well inside the room, eased to a stop at its ends, so that place
 * and speed never jump. Sideways and up an eye is held at the limit of its own distance; one beyond the farthest is brought
 * along its line to the centre of the glass, so that it keeps its direction. `eye` and `out` may be the same. Allocates nothing: made
 * for the render loop.
 */
export function holdEye(room: EyeRoom, eye: Point3, out: { x: number; y: number; z: number }): void {
  const near = -eased(-eye.z, -room.nearestMm, room.nearEaseMm);
  const z = eased(near, room.farthestMm, room.farEaseMm);
  const share = Math.min(1, z / near);
  out.x = between(room.left, room.right, eye.x * share, z);
  out.y = between(room.bottom, room.top, eye.y * share, z);
  out.z = z;
}

function between(low: RoomSide, high: RoomSide, place: number, z: number): number {
  const least = -limitAt(low, z);
  const most = limitAt(high, z);
  const half = (most - least) / 2;
  if (!(half > 0)) return (least + most) / 2;
  const held = eased(place, most, Math.min(high.easeMm, half));
  return -eased(-held, -least, Math.min(low.easeMm, half));
}

/** A place, eased so that it never passes a limit: from `easeMm` before it, limit - ease * e^-(over/ease), which has there the slope 1. */
function eased(place: number, limit: number, easeMm: number): number {
  const over = place - (limit - easeMm);
  if (over <= 0) return place;
  return easeMm > 0 ? limit - easeMm * Math.exp(-over / easeMm) : limit;
}
