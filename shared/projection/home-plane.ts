import { layerScale } from './layer-on-glass';
import { requireRectangle } from './requirements';
import type { Point3, Rectangle } from './types';

/*
 * Placement from the home eye. A layer is stored as it is seen on the glass from the home eye H; that is its `placed`
 * rectangle. At depth d a point G on the glass belongs to the point
 *
 *     P_xy = G * (hz+d)/hz - H_xy * d/hz
 *
 * of the layer's plane: the ray from H through G carried on to z = -d. Hence a change of depth never changes the picture
 * from the home eye. Fails, with a GeometryError, where hz + d <= 0.
 */

/** The rectangle of the layer's plane at depth `depthMm` that the home eye sees as `onGlass`. */
export function planeFromHome(onGlass: Rectangle, homeEye: Point3, depthMm: number): Rectangle {
  requireRectangle(onGlass);
  return seenThrough(onGlass, homeEye, 1 / layerScale(homeEye, depthMm));
}

/** Where a rectangle of the layer's plane is seen on the glass from any eye; from the home eye, the inverse of `planeFromHome`. */
export function onGlassFrom(inPlane: Rectangle, eye: Point3, depthMm: number): Rectangle {
  requireRectangle(inPlane, 'inPlane');
  return seenThrough(inPlane, eye, layerScale(eye, depthMm));
}

/** A rectangle scaled about the foot of the eye: the common form of both, since G - E = (P - E) * scale. */
function seenThrough(rectangle: Rectangle, eye: Point3, scale: number): Rectangle {
  return {
    xMm: eye.x + (rectangle.xMm - eye.x) * scale,
    yMm: eye.y + (rectangle.yMm - eye.y) * scale,
    widthMm: rectangle.widthMm * scale,
    heightMm: rectangle.heightMm * scale,
  };
}
