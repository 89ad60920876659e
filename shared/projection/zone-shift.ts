import { layerShift } from './layer-on-glass';
import { requireEye, requireZone } from './requirements';
import type { Point3, ViewingZone } from './types';

/** How far a layer moves on the glass between the home eye and each end of the zone, signed; `across` and `up` are end to end. */
export interface ShiftOverZone {
  readonly left: number;
  readonly right: number;
  readonly across: number;
  readonly lowest: number;
  readonly highest: number;
  readonly up: number;
}

/**
 * The layer's shift on the glass, in mm, when the eye goes from home to the ends of the viewing zone at the home eye's own
 * distance: dx * d/(hz+d). Behind the glass a layer follows the eye (same sign); in front of it, it goes the other way.
 */
export function shiftOverZone(depthMm: number, homeEye: Point3, zone: ViewingZone): ShiftOverZone {
  requireEye(homeEye, 'homeEye');
  requireZone(zone);
  const low = layerShift({ x: zone.leftMm - homeEye.x, y: zone.lowestMm - homeEye.y, z: homeEye.z }, depthMm);
  const high = layerShift({ x: zone.rightMm - homeEye.x, y: zone.highestMm - homeEye.y, z: homeEye.z }, depthMm);
  return { left: low.x, right: high.x, across: high.x - low.x, lowest: low.y, highest: high.y, up: high.y - low.y };
}

/** The same in pixels of a screen with `pxPerMm` pixels to the millimetre. */
export function shiftInPixels(shift: ShiftOverZone, pxPerMm: number): ShiftOverZone {
  return {
    left: shift.left * pxPerMm,
    right: shift.right * pxPerMm,
    across: shift.across * pxPerMm,
    lowest: shift.lowest * pxPerMm,
    highest: shift.highest * pxPerMm,
    up: shift.up * pxPerMm,
  };
}
