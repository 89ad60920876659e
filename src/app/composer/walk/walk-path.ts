import type { Point3, ViewingZone } from '@oriel/shared/projection/types';

const within = (value: number, least: number, most: number) => Math.min(Math.max(value, least), most);

/**
 * Where a viewer who walks past stands: an ellipse through the viewing zone, from its left end to its right on the nearer
 * side and back on the farther, with the eyes at the height of the home eye (or as near to it as the zone allows).
 *
 * x = mid + half * -cos(2 pi t), z = mid + 0.8 half * -sin(2 pi t), t in turns.
 */
export function walkPath(zone: ViewingZone, homeEye: Point3, turn: number): Point3 {
  const angle = 2 * Math.PI * turn;
  return {
    x: (zone.leftMm + zone.rightMm) / 2 - ((zone.rightMm - zone.leftMm) / 2) * Math.cos(angle),
    y: within(homeEye.y, zone.lowestMm, zone.highestMm),
    z: (zone.nearestMm + zone.farthestMm) / 2 - 0.8 * ((zone.farthestMm - zone.nearestMm) / 2) * Math.sin(angle),
  };
}

/** Time for one turn there and back, ms: about 0.4 m/s through a zone of 1.2 m. Practice. */
export const TURN_MS = 8000;
