import type { Glass, Point2, Point3, ViewingZone } from '@oriel/shared/projection/types';
import type { DrawnLayer } from '../layers/drawn-layer';
import { drawnAt } from '../../drawing/placing';
import type { DepthFrame } from '../../drawing/frames';
import { outside, zoneSideAt } from '../../drawing/zone-side';
import { acrossOf, glassAcross, spanAcross } from '../../drawing/across';

/** What a pointer takes hold of in plan or section. */
export type Held =
  | { readonly kind: 'eye' }
  | { readonly kind: 'home' }
  | { readonly kind: 'glass' }
  | { readonly kind: 'layer'; readonly id: string }
  | { readonly kind: 'zone'; readonly side: keyof ViewingZone };

export interface Holdable {
  readonly eye: Point3;
  readonly homeEye: Point3;
  readonly glass: Glass;
  readonly zone: ViewingZone;
  readonly layers: readonly DrawnLayer[];
  readonly selectedId: string | null;
}

/** The thing under the pointer: the eyes first, then the selected layer, an end of the glass, the nearest layer, a side of the zone. */
export function pick(frame: DepthFrame, point: Point2, things: Holdable, reachPx: number): Held | null {
  const distanceTo = (eye: Point3) => {
    const at = drawnAt(frame, { across: acrossOf(frame.view, eye), z: eye.z });
    return Math.hypot(at.x - point.x, at.y - point.y);
  };
  if (distanceTo(things.eye) <= reachPx + 4) return { kind: 'eye' };
  if (distanceTo(things.homeEye) <= reachPx) return { kind: 'home' };
  const layers = things.layers
    .map((drawn) => ({ id: drawn.layer.id, px: distanceToLayer(frame, point, drawn) - (drawn.layer.id === things.selectedId ? 3 : 0) }))
    .filter(({ px }) => px <= reachPx)
    .sort((a, b) => a.px - b.px);
  const onSelected = layers.some(({ id }) => id === things.selectedId);
  if (!onSelected && distanceToGlassEnd(frame, point, things.glass) <= reachPx * 0.6) return { kind: 'glass' };
  if (layers.length > 0) return { kind: 'layer', id: layers[0].id };
  const side = zoneSideAt(frame, point, things.zone, reachPx * 0.6);
  return side && { kind: 'zone', side };
}

function distanceToGlassEnd(frame: DepthFrame, point: Point2, glass: Glass): number {
  const ends = glassAcross(frame.view, glass).map((across) => drawnAt(frame, { across, z: 0 }));
  return Math.min(...ends.map(({ x, y }) => Math.hypot(x - point.x, y - point.y)));
}

function distanceToLayer(frame: DepthFrame, point: Point2, { plane, layer }: DrawnLayer): number {
  if (!plane) return Infinity;
  const [from, to] = spanAcross(frame.view, plane);
  const a = drawnAt(frame, { across: from, z: -layer.depthMm });
  const b = drawnAt(frame, { across: to, z: -layer.depthMm });
  const beyond = frame.view === 'plan' ? outside(point.x, a.x, b.x) : outside(point.y, b.y, a.y);
  return Math.hypot(frame.view === 'plan' ? point.y - a.y : point.x - a.x, beyond);
}
