import type { WallCamera } from '@oriel/shared/contracts/wall-set-up';
import type { Glass, Point3, ViewingZone } from '@oriel/shared/projection/types';
import { type Camera, rayOfPixel } from '@oriel/shared/viewer/camera';
import { acrossOf } from '../../drawing/across';
import type { DepthFrame } from '../../drawing/frames';
import type { Across } from '../../drawing/placing';

/** Cameras are taken to deliver 16:9: only their height of view depends on it. */
export const picture = { widthPx: 1280, heightPx: 720 } as const;

/** A wall's camera as the mathematics have it. */
export const cameraOf = (camera: WallCamera): Camera => ({ ...camera, ...picture });

/** A ray that leaves the lens this flat is drawn no farther aside than this many times the depth of the drawing. */
const flattest = 3;

/** The two edges of what the camera sees, in plan or section, each from the lens to `beforeMm` before the glass. */
export function coneOf(view: DepthFrame['view'], camera: WallCamera, beforeMm: number): readonly [Across, Across][] {
  const { widthPx, heightPx } = picture;
  const edges = view === 'plan' ? [[0, heightPx / 2], [widthPx, heightPx / 2]] : [[widthPx / 2, 0], [widthPx / 2, heightPx]];
  const lens = { across: acrossOf(view, camera.position), z: camera.position.z };
  return edges.map(([px, py]): [Across, Across] => {
    const ray = rayOfPixel(cameraOf(camera), px, py);
    const along = ray.z > 0 ? (beforeMm - lens.z) / ray.z : Infinity;
    const length = Math.min(along, flattest * beforeMm);
    return [lens, { across: lens.across + acrossOf(view, ray) * length, z: lens.z + ray.z * length }];
  });
}

/** What must fit on the drawing, mm about the centre of the glass. */
export interface RoomExtents {
  readonly left: number;
  readonly right: number;
  readonly below: number;
  readonly above: number;
  readonly before: number;
}

const besideMm = 60;

/** Glass, camera, zone and whoever stands there, with a little air; the depth in whole steps, so that the scale is calm while one types. */
export function roomExtents(glass: Glass, camera: Point3, zone: ViewingZone, spot: Point3 | null): RoomExtents {
  const beside = (way: 1 | -1, ...values: number[]) => way * (Math.max(...values.map((value) => way * value)) + besideMm);
  const [halfWidth, halfHeight] = [glass.widthMm / 2, glass.heightMm / 2];
  return {
    left: beside(-1, -halfWidth, camera.x, zone.leftMm, spot?.x ?? 0),
    right: beside(1, halfWidth, camera.x, zone.rightMm, spot?.x ?? 0),
    below: beside(-1, -halfHeight, camera.y, zone.lowestMm, spot?.y ?? 0),
    above: beside(1, halfHeight, camera.y, zone.highestMm, spot?.y ?? 0),
    before: Math.ceil((Math.max(zone.farthestMm, spot?.z ?? 0) * 1.04) / 200) * 200,
  };
}
