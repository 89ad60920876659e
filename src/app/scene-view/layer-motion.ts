import { type LayerOnGlass, layerOnGlass } from '@oriel/shared/projection/layer-on-glass';
import type { Point3 } from '@oriel/shared/projection/types';

/**
 * How a layer composed from the home eye moves for another eye, as a change of the picture drawn from home: scale about the centre of the
 * glass, then shift (mm, y up). With one scale s and one offset o a layer from an eye (S = P s + o, layer-on-glass.ts), a point G seen from home
 * goes to (G - oH) s/sH + o.
 */
export function layerMotion(homeEye: Point3, eye: Point3, depthMm: number): LayerOnGlass {
  const home: LayerOnGlass = { scale: 1, x: 0, y: 0 };
  const now: LayerOnGlass = { scale: 1, x: 0, y: 0 };
  layerOnGlass(homeEye, depthMm, home);
  layerOnGlass(eye, depthMm, now);
  const scale = now.scale / home.scale;
  return { scale, x: now.x - home.x * scale, y: now.y - home.y * scale };
}
