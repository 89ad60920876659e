import { GeometryError } from '../projection/geometry-error';
import { requireFinite, requirePositive } from '../projection/requirements';
import type { Point2, Point3 } from '../projection/types';

/*
 * The camera on the frame: an ideal pinhole whose principal point is the middle of its picture and whose pixels are square
 * (R. Hartley, A. Zisserman, Multiple View Geometry, 2nd ed. 2004, ch. 6). Untilted, it looks along +z, at the viewer.
 *
 * Camera coordinates, as the picture shows them: x right, y down, z away from the camera, mm. Someone on the viewer's own
 * right (+x of the glass) stands on the *left* of an unmirrored picture, so untilted
 *
 *     glass = C + (-x, -y, z),      tilted    glass = C + Ry(yaw) Rx(-pitch) Rz(roll) (-x, -y, z).
 *
 * A mirrored picture is a true picture of a mirrored room: all that is found in it is right but for the sign of x, which is
 * turned here, in `signOfX`, and nowhere else.
 */
export interface Camera {
  /** From the centre of the glass to the lens, mm. */
  readonly position: Point3;
  /** Upward is positive: the camera looks toward +y. */
  readonly pitchRad: number;
  /** Toward the viewer's right is positive: the camera looks toward +x. */
  readonly yawRad: number;
  /** Turned about its own axis, anticlockwise as the viewer sees it. */
  readonly rollRad: number;
  /** Field of view across the width of the picture. */
  readonly hfovRad: number;
  readonly mirrored: boolean;
  readonly widthPx: number;
  readonly heightPx: number;
}

/** A point that is written to. */
export interface MutablePoint3 {
  x: number;
  y: number;
  z: number;
}

export function requireCamera(camera: Camera): void {
  requireFinite('camera.position.x', camera.position.x);
  requireFinite('camera.position.y', camera.position.y);
  requireFinite('camera.position.z', camera.position.z);
  requireFinite('camera.pitchRad', camera.pitchRad);
  requireFinite('camera.yawRad', camera.yawRad);
  requireFinite('camera.rollRad', camera.rollRad);
  requirePositive('camera.widthPx', camera.widthPx);
  requirePositive('camera.heightPx', camera.heightPx);
  if (!(camera.hfovRad > 0 && camera.hfovRad < Math.PI)) {
    const degrees = (camera.hfovRad * 180) / Math.PI;
    throw new GeometryError(
      'camera.hfovRad',
      `The field of view must lie between 0 and 180 degrees, but is ${degrees}.`,
    );
  }
}

/** Focal length in pixels: (w/2)/tan(hfov/2). */
export function focalPx(camera: Pick<Camera, 'hfovRad' | 'widthPx'>): number {
  return camera.widthPx / 2 / Math.tan(camera.hfovRad / 2);
}

/** Turns a direction of the camera's coordinates into one of the glass. Allocates nothing. */
export function directionToGlass(camera: Camera, direction: Point3, out: MutablePoint3): void {
  const cr = Math.cos(camera.rollRad);
  const sr = Math.sin(camera.rollRad);
  const cp = Math.cos(camera.pitchRad);
  const sp = Math.sin(camera.pitchRad);
  const cy = Math.cos(camera.yawRad);
  const sy = Math.sin(camera.yawRad);
  const x = -signOfX(camera) * direction.x;
  const y = -direction.y;
  const xRolled = cr * x - sr * y;
  const yRolled = sr * x + cr * y;
  const yPitched = cp * yRolled + sp * direction.z;
  const zPitched = cp * direction.z - sp * yRolled;
  out.x = cy * xRolled + sy * zPitched;
  out.y = yPitched;
  out.z = cy * zPitched - sy * xRolled;
}

/** Carries a point from the camera's coordinates to those of the glass. Allocates nothing. */
export function pointToGlass(camera: Camera, point: Point3, out: MutablePoint3): void {
  directionToGlass(camera, point, out);
  out.x += camera.position.x;
  out.y += camera.position.y;
  out.z += camera.position.z;
}

/** The unit direction, in the coordinates of the glass, in which the camera sees a pixel (0,0 the top left corner of the picture). */
export function rayOfPixel(camera: Camera, px: number, py: number): Point3 {
  const out = { x: 0, y: 0, z: 0 };
  directionToGlass(camera, inCamera(camera, px, py, 1), out);
  const length = Math.hypot(out.x, out.y, out.z);
  return { x: out.x / length, y: out.y / length, z: out.z / length };
}

/**
 * The eye seen at a pixel, in the coordinates of the glass.
 * @param distanceMm along the camera's axis, as focal length x size / size in pixels gives it; not along the slanted ray.
 */
export function eyeFromPixel(camera: Camera, px: number, py: number, distanceMm: number): Point3 {
  requireCamera(camera);
  requireFinite('px', px);
  requireFinite('py', py);
  requirePositive('distanceMm', distanceMm);
  const out = { x: 0, y: 0, z: 0 };
  pointToGlass(camera, inCamera(camera, px, py, distanceMm), out);
  return out;
}

/** Where the camera sees a point of the room, in pixels, within the picture or not; null behind the camera. The inverse of `eyeFromPixel`. */
export function pixelOfPoint(camera: Camera, point: Point3): Point2 | null {
  requireCamera(camera);
  const axes = [
    { x: 1, y: 0, z: 0 },
    { x: 0, y: 1, z: 0 },
    { x: 0, y: 0, z: 1 },
  ].map((axis) => {
    const out = { x: 0, y: 0, z: 0 };
    directionToGlass(camera, axis, out);
    return out;
  });
  const { position } = camera;
  const [x, y, z] = axes.map(
    (axis) => axis.x * (point.x - position.x) + axis.y * (point.y - position.y) + axis.z * (point.z - position.z),
  );
  if (z <= 0) return null;
  const f = focalPx(camera);
  return { x: camera.widthPx / 2 + (f * x) / z, y: camera.heightPx / 2 + (f * y) / z };
}

function inCamera(camera: Camera, px: number, py: number, distanceMm: number): Point3 {
  const perPixel = distanceMm / focalPx(camera);
  return { x: (px - camera.widthPx / 2) * perPixel, y: (py - camera.heightPx / 2) * perPixel, z: distanceMm };
}

/** The one place where mirroring is dealt with. */
function signOfX(camera: Camera): 1 | -1 {
  return camera.mirrored ? -1 : 1;
}
