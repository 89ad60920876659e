import { requirePositive } from '../projection/requirements';

/** Interpupillary distance until measured for that person, mm: adult mean (N. Dodgson, Proc. SPIE 5291, 2004). */
export const USUAL_EYE_DISTANCE_MM = 63;

/**
 * The distance along the camera's axis of a thing of known size, mm: f * size * cos(yaw) / pixels. A head turned by `yawRad`
 * shows its breadth shortened; left out of account, that overstates the distance by 1/cos.
 */
export function distanceFromSize(focalLengthPx: number, sizeMm: number, sizePx: number, yawRad = 0): number {
  requirePositive('focalLengthPx', focalLengthPx);
  requirePositive('sizeMm', sizeMm);
  requirePositive('sizePx', sizePx);
  return (focalLengthPx * sizeMm * Math.cos(yawRad)) / sizePx;
}
