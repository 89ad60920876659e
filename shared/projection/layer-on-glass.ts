import { requireEye, requireFinite, requireInFront } from './requirements';
import type { Point2, Point3 } from './types';

/*
 * Where a thing is seen on the glass. The ray from the eye E = (ex, ey, ez) to a point P = (X, Y, -d) crosses the glass
 * z = 0 at
 *
 *     S = P_xy * ez/(ez+d) + E_xy * d/(ez+d),
 *
 * so a layer parallel to the glass has, from one eye, a single scale and a single offset. Similar triangles; the general
 * case is R. Kooima, Generalized Perspective Projection (2009). It fails where ez + d <= 0: the eye is then in or behind
 * the layer, and a GeometryError says so. On the glass (d = 0) nothing moves; as d grows the offset tends to E_xy itself.
 */

/** What the render loop writes for each layer: a scale, and an offset on the glass in mm. */
export interface LayerOnGlass {
  scale: number;
  x: number;
  y: number;
}

/** How many mm on the glass one mm of the layer takes up: ez/(ez+d). */
export function layerScale(eye: Point3, depthMm: number): number {
  requireEye(eye);
  requireInFront(eye, depthMm);
  return eye.z / (eye.z + depthMm);
}

/** Where the layer's own origin is seen on the glass, in mm: E_xy * d/(ez+d). */
export function layerShift(eye: Point3, depthMm: number): Point2 {
  requireEye(eye);
  requireInFront(eye, depthMm);
  const share = depthMm / (eye.z + depthMm);
  return { x: eye.x * share, y: eye.y * share };
}

/** Scale and shift at once, written into `out`. Allocates nothing: made for the render loop. */
export function layerOnGlass(eye: Point3, depthMm: number, out: LayerOnGlass): void {
  requireEye(eye);
  requireInFront(eye, depthMm);
  const share = depthMm / (eye.z + depthMm);
  out.scale = 1 - share;
  out.x = eye.x * share;
  out.y = eye.y * share;
}

/** Where a point (z positive toward the viewer) is seen on the glass, in mm. */
export function project(point: Point3, eye: Point3): Point2 {
  requireFinite('point.x', point.x);
  requireFinite('point.y', point.y);
  requireFinite('point.z', point.z);
  const scale = layerScale(eye, -point.z);
  return { x: eye.x + (point.x - eye.x) * scale, y: eye.y + (point.y - eye.y) * scale };
}
