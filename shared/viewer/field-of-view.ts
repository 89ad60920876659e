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

/** The diagonal angle, from the one across. */
export function diagonalFromAcross(hfovRad: number, width: number, height: number): number {
  requirePositive('width', width);
  requirePositive('height', height);
  return 2 * Math.atan((Math.tan(hfovRad / 2) * Math.hypot(width, height)) / width);
}

/** The angle up, from the one across. */
export function upFromAcross(hfovRad: number, width: number, height: number): number {
  requirePositive('width', width);
  requirePositive('height', height);
  return 2 * Math.atan((Math.tan(hfovRad / 2) * height) / width);
}

/** The angle across, from the focal length: 2 atan(w/2 / f), the inverse of `focalPx`. */
export function acrossFromFocal(focalPx: number, widthPx: number): number {
  requirePositive('focalPx', focalPx);
  requirePositive('widthPx', widthPx);
  return 2 * Math.atan(widthPx / 2 / focalPx);
}
