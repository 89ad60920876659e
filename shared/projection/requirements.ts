import { GeometryError } from './geometry-error';
import type { Glass, Point3, Rectangle, ViewingZone } from './types';

/*
 * What the pinhole model asks of its inputs. Each function throws a GeometryError that names the value and says what to do;
 * none allocates when the input is sound, so they may stand in the render loop.
 */

export function requireFinite(value: string, figure: number): void {
  if (!Number.isFinite(figure)) throw new GeometryError(value, `${value} must be a finite number, but is ${figure}.`);
}

export function requirePositive(value: string, figure: number): void {
  requireFinite(value, figure);
  if (figure <= 0) throw new GeometryError(value, `${value} must be greater than zero, but is ${figure}.`);
}

/** An eye stands in front of the glass: z > 0. */
export function requireEye(eye: Point3, name = 'eye'): void {
  if (Number.isFinite(eye.x) && Number.isFinite(eye.y) && eye.z > 0 && eye.z < Infinity) return;
  requireFinite(`${name}.x`, eye.x);
  requireFinite(`${name}.y`, eye.y);
  requireFinite(`${name}.z`, eye.z);
  throw new GeometryError(
    `${name}.z`,
    `${name}.z is ${eye.z} mm: move the eye in front of the glass (greater than zero).`,
  );
}

/** A layer is seen only while the eye is in front of it: ez + d > 0. */
export function requireInFront(eye: Point3, depthMm: number): void {
  requireFinite('depthMm', depthMm);
  if (eye.z + depthMm <= 0) {
    throw new GeometryError(
      'depthMm',
      `A layer ${-depthMm} mm in front of the glass is not in front of an eye at ${eye.z} mm: bring it nearer the glass.`,
    );
  }
}

export function requireGlass(glass: Glass): void {
  requirePositive('glass.widthMm', glass.widthMm);
  requirePositive('glass.heightMm', glass.heightMm);
}

/** A zone may be flat (one height, one distance) but not inverted, and lies in front of the glass. */
export function requireZone(zone: ViewingZone): void {
  requireOrder('zone.leftMm', zone.leftMm, 'zone.rightMm', zone.rightMm);
  requireOrder('zone.lowestMm', zone.lowestMm, 'zone.highestMm', zone.highestMm);
  requirePositive('zone.nearestMm', zone.nearestMm);
  requireOrder('zone.nearestMm', zone.nearestMm, 'zone.farthestMm', zone.farthestMm);
}

export function requireRectangle(rectangle: Rectangle, name = 'placed'): void {
  requireFinite(`${name}.xMm`, rectangle.xMm);
  requireFinite(`${name}.yMm`, rectangle.yMm);
  requirePositive(`${name}.widthMm`, rectangle.widthMm);
  requirePositive(`${name}.heightMm`, rectangle.heightMm);
}

function requireOrder(lowName: string, low: number, highName: string, high: number): void {
  requireFinite(lowName, low);
  requireFinite(highName, high);
  if (low > high) {
    throw new GeometryError(lowName, `${lowName} (${low}) is beyond ${highName} (${high}): exchange the two.`);
  }
}
