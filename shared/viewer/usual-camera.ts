import type { Glass, Point3, ViewingZone } from '../projection/types';

/*
 * The camera that one may expect until somebody measures: in the upper frame, in the middle, seeing 60 degrees across as a common webcam
 * does, and turned toward the middle of where people stand. Practice, all of it.
 */

/** From the upper edge of the glass to the lens, mm. */
export const ABOVE_EDGE_MM = 15;
export const USUAL_FIELD_RAD = Math.PI / 3;

export interface UsualCamera {
  readonly position: Point3;
  /** In whole degrees, so that nobody takes it for measured. */
  readonly pitchRad: number;
  readonly hfovRad: number;
}

/** The usual camera of a glass before which people stand in `zone`. */
export function usualCamera({ heightMm }: Pick<Glass, 'heightMm'>, zone: ViewingZone): UsualCamera {
  const y = heightMm / 2 + ABOVE_EDGE_MM;
  const up = Math.atan2((zone.lowestMm + zone.highestMm) / 2 - y, (zone.nearestMm + zone.farthestMm) / 2);
  return { position: { x: 0, y, z: 0 }, pitchRad: wholeDegrees(up), hfovRad: USUAL_FIELD_RAD };
}

const wholeDegrees = (rad: number) => (Math.round((rad * 180) / Math.PI) * Math.PI) / 180;
