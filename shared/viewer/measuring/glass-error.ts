import { project } from '../../projection/layer-on-glass';
import type { Glass, Point2, Point3, ViewingZone } from '../../projection/types';
import { type Camera, eyeFromPixel, focalPx, pixelOfPoint } from '../camera';
import { GeometryError } from '../../projection/geometry-error';

/*
 * What an uncertainty of the set-up means on the glass. The eye E is found from a pixel and a distance, and a layer at depth d is drawn
 * for E; with one figure of the set-up wrong by its uncertainty the same picture of the camera gives E', and every point P of the layer
 * is drawn at project(P, E') instead of project(P, E). The contributions add in squares (JCGM 100:2008, 5.1.2):
 *
 *     u(S) = max over the middle and the corners of the glass of √ Σ |∂S/∂x_i|² u(x_i)².
 *
 * A distance is proportional to f (as size in px is) and to the viewer's size; the glass's own relative uncertainty scales what is
 * drawn, of which only the parallax S - P counts, for a picture wholly scaled looks the same.
 */

/** Standard uncertainties of a set-up; zero for what is taken as given. */
export interface SetUpUncertainty {
  readonly hfovRad: number;
  /** Of pitch and of yaw, each. */
  readonly tiltRad: number;
  /** Of the lens along each axis, mm. */
  readonly positionMm: number;
  /** Of the viewer's own scale, relative. */
  readonly viewerScale: number;
  /** Of the width of the glass, relative. */
  readonly glassScale: number;
}

export const CERTAIN: SetUpUncertainty = { hfovRad: 0, tiltRad: 0, positionMm: 0, viewerScale: 0, glassScale: 0 };

/** The middle of a viewing zone. */
export const middleOf = (zone: ViewingZone): Point3 => ({
  x: (zone.leftMm + zone.rightMm) / 2,
  y: (zone.lowestMm + zone.highestMm) / 2,
  z: (zone.nearestMm + zone.farthestMm) / 2,
});

/**
 * By how many mm a layer at `depthMm` may stand wrong on the glass, seen from `eye`: a standard uncertainty, at the worst of the
 * middle and the corners of the glass.
 * @throws GeometryError 'eye' where the camera cannot see it.
 */
export function glassErrorMm(glass: Glass, camera: Camera, unsure: SetUpUncertainty, depthMm: number, eye: Point3): number {
  const eyes = misplacedEyes(camera, unsure, eye);
  const [halfWidth, halfHeight] = [glass.widthMm / 2, glass.heightMm / 2];
  const places = [{ x: 0, y: 0 }, ...[-1, 1].flatMap((x) => [-1, 1].map((y) => ({ x: x * halfWidth, y: y * halfHeight })))];
  return Math.max(
    ...places.map((seen) => {
      const point = behind(seen, eye, depthMm);
      const parallax = Math.hypot(seen.x - point.x, seen.y - point.y);
      const moved = eyes.map(([less, more]) => {
        const a = project(point, less);
        const b = project(point, more);
        return Math.hypot(b.x - a.x, b.y - a.y) / 2;
      });
      return Math.hypot(...moved, parallax * unsure.glassScale);
    }),
  );
}

/** For each figure of the set-up, the eye that the same camera picture gives with that figure less, and more, by its uncertainty. */
function misplacedEyes(camera: Camera, unsure: SetUpUncertainty, eye: Point3): [Point3, Point3][] {
  const pixel = pixelOfPoint(camera, eye);
  if (!pixel) throw new GeometryError('eye', 'The camera cannot see the middle of the viewing zone: turn it there, or move the zone.');
  const distanceMm = distanceAlongAxis(camera, eye, pixel);
  const seenBy = (changed: Partial<Camera>, scale = 1) => {
    const other = { ...camera, ...changed };
    return eyeFromPixel(other, pixel.x, pixel.y, distanceMm * scale * (focalPx(other) / focalPx(camera)));
  };
  const both = (by: number, at: (by: number) => Point3): [Point3, Point3] => [at(-by), at(by)];
  const { position } = camera;
  return [
    both(unsure.hfovRad, (by) => seenBy({ hfovRad: camera.hfovRad + by })),
    both(unsure.tiltRad, (by) => seenBy({ pitchRad: camera.pitchRad + by })),
    both(unsure.tiltRad, (by) => seenBy({ yawRad: camera.yawRad + by })),
    both(unsure.positionMm, (by) => seenBy({ position: { ...position, x: position.x + by } })),
    both(unsure.positionMm, (by) => seenBy({ position: { ...position, y: position.y + by } })),
    both(unsure.positionMm, (by) => seenBy({ position: { ...position, z: position.z + by } })),
    both(unsure.viewerScale, (by) => seenBy({}, 1 + by)),
  ];
}

function distanceAlongAxis(camera: Camera, eye: Point3, pixel: Point2): number {
  const { position } = camera;
  const range = Math.hypot(eye.x - position.x, eye.y - position.y, eye.z - position.z);
  const f = focalPx(camera);
  return (range * f) / Math.hypot(f, pixel.x - camera.widthPx / 2, pixel.y - camera.heightPx / 2);
}

/** The point of a layer at this depth that is seen from `eye` at a place of the glass. */
const behind = (seen: Point2, eye: Point3, depthMm: number): Point3 => ({
  x: seen.x + ((seen.x - eye.x) * depthMm) / eye.z,
  y: seen.y + ((seen.y - eye.y) * depthMm) / eye.z,
  z: -depthMm,
});
