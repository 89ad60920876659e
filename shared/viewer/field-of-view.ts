import { requirePositive } from '../projection/requirements';

/*
 * Fields of view of one picture: the half angles' tangents are to one another as the picture's own half width, half height
 * and half diagonal. Makers tend to state the diagonal.
 */

/** The angle across, from the diagonal one. */
export function acrossFromDiagonal(diagonalRad: number, width: number, height: number): number {
  requirePositive('width', width);
  requirePositive('height', height);
  return 2 * Math.atan((Math.tan(diagonalRad / 2) * width) / Math.hypot(width, height));
}

/** The angle up, from the one across. */
export function upFromAcross(hfovRad: number, width: number, height: number): number {
  requirePositive('width', width);
  requirePositive('height', height);
  return 2 * Math.atan((Math.tan(hfovRad / 2) * height) / width);
}

/** The angle across, measured: a thing of `sizeMm` held square to the camera at `distanceMm` fills `share` of the width. */
export function acrossFromThing(sizeMm: number, distanceMm: number, share: number): number {
  requirePositive('sizeMm', sizeMm);
  requirePositive('distanceMm', distanceMm);
  requirePositive('share', share);
  return 2 * Math.atan(sizeMm / share / 2 / distanceMm);
}
