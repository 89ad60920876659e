import { GeometryError } from './geometry-error';
import { requireEye, requireGlass, requirePositive } from './requirements';
import type { Glass, Point3 } from './types';

/** An off-axis frustum with its apex at the eye: the edges of the glass carried to the near plane, and both distances from the eye, mm. */
export interface Frustum {
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  readonly top: number;
  readonly near: number;
  readonly far: number;
}

/**
 * The frustum through the edges of the glass: left = (-W/2 - ex) * n/ez and so on (R. Kooima, Generalized Perspective
 * Projection, 2009, for a screen in z = 0). The camera stands at the eye and looks along -z, whatever the viewer faces.
 * The picture agrees with `project`: a point's normalised device x is its place on the glass over W/2.
 */
export function offAxisFrustum(glass: Glass, eye: Point3, nearMm: number, farMm: number): Frustum {
  requireGlass(glass);
  requireEye(eye);
  requirePositive('nearMm', nearMm);
  requirePositive('farMm', farMm);
  if (farMm <= nearMm) throw new GeometryError('farMm', `farMm (${farMm}) must lie beyond nearMm (${nearMm}).`);
  const share = nearMm / eye.z;
  return {
    left: (-glass.widthMm / 2 - eye.x) * share,
    right: (glass.widthMm / 2 - eye.x) * share,
    bottom: (-glass.heightMm / 2 - eye.y) * share,
    top: (glass.heightMm / 2 - eye.y) * share,
    near: nearMm,
    far: farMm,
  };
}

/** The projection matrix of a frustum for clip space -1..1 in depth: 16 numbers, column by column (OpenGL 1.0 glFrustum). */
export function frustumMatrix({ left, right, bottom, top, near, far }: Frustum): number[] {
  const width = right - left;
  const height = top - bottom;
  const depth = far - near;
  return [
    ...[(2 * near) / width, 0, 0, 0],
    ...[0, (2 * near) / height, 0, 0],
    ...[(right + left) / width, (top + bottom) / height, -(far + near) / depth, -1],
    ...[0, 0, (-2 * far * near) / depth, 0],
  ];
}

/**
 * The matrix of the frustum through the edges of the glass, written into `out` column by column. Allocates nothing: made
 * for the render loop. On the near plane every edge shrinks by near/ez, which cancels: 2 ez/W, -2 ex/W and so on.
 */
export function writeOffAxisMatrix(glass: Glass, eye: Point3, nearMm: number, farMm: number, out: number[]): void {
  requireGlass(glass);
  requireEye(eye);
  requirePositive('nearMm', nearMm);
  if (farMm <= nearMm) throw new GeometryError('farMm', `farMm (${farMm}) must lie beyond nearMm (${nearMm}).`);
  out.fill(0);
  out[0] = (2 * eye.z) / glass.widthMm;
  out[5] = (2 * eye.z) / glass.heightMm;
  out[8] = (-2 * eye.x) / glass.widthMm;
  out[9] = (-2 * eye.y) / glass.heightMm;
  out[10] = -(farMm + nearMm) / (farMm - nearMm);
  out[11] = -1;
  out[14] = (-2 * farMm * nearMm) / (farMm - nearMm);
}
