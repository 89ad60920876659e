import { GeometryError } from './geometry-error';
import { requireEye, requireGlass, requirePositive } from './requirements';
import type { Glass, Point3 } from './types';

/**
 * The projection matrix of the off-axis frustum from the eye through the edges of the glass, column by column, for clip space -1..1 in
 * depth (OpenGL 1.0, glFrustum). Its edges on the near plane are left = (-W/2 - ex) * near/ez and so on (R. Kooima, Generalized Perspective
 * Projection, 2009, for a screen in z = 0); near/ez cancels, which leaves 2 ez/W, -2 ex/W and so on. The camera stands at the eye and looks
 * along -z, whatever the viewer faces. The picture agrees with `project`: a point's normalised device x is its place on the glass over W/2.
 * Allocates nothing: made for the render loop.
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
