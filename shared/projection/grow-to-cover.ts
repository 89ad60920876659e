import { reaches } from './bleed';
import { layerScale } from './layer-on-glass';
import { requiredExtent } from './required-extent';
import { requireEye, requireRectangle, requireZone } from './requirements';
import type { PlacedLayer, SceneSetting } from './scene-geometry';
import { SIDE_AXIS, sideOf, SIDES, type Side } from './sides';
import type { Rectangle } from './types';

/**
 * The one factor (1 or more) by which all placed rectangles are scaled together about the centre of the glass so that
 * every side that reaches the glass is covered from the whole zone. One factor for all keeps cut layers registered.
 *
 * A side placed at G asks for s * G = g, with g the required edge of the plane carried back to the glass as the home eye
 * sees it; growing may carry a further side to the edge of the glass, which then must be covered too, so the factor is
 * found by repetition, at most once for every side of every layer. A layer that some eye is not in front of is left out: no
 * growth mends it (`clearance` names it).
 */
export function growToCover(layers: readonly PlacedLayer[], { glass, homeEye, zone }: SceneSetting): number {
  requireEye(homeEye, 'homeEye');
  requireZone(zone);
  const nearestMm = Math.min(zone.nearestMm, homeEye.z);
  const seen = layers.filter(({ depthMm }) => nearestMm + depthMm > 0);
  const needs = seen.map((layer) => {
    requireRectangle(layer.placed);
    const required = requiredExtent(layer.depthMm, glass, zone);
    const scale = layerScale(homeEye, layer.depthMm);
    return (side: Side) => {
      const home = homeEye[SIDE_AXIS[side].axis];
      return (home + (required[side].atMm - home) * scale) / sideOf(layer.placed, side);
    };
  });
  let factor = 1;
  for (;;) {
    const reaching = seen.flatMap(({ placed }, index) =>
      SIDES.filter((side) => reaches(scaleRectangle(placed, factor), glass, side)).map((side) => needs[index](side)),
    );
    const next = Math.max(factor, ...reaching);
    if (!(next > factor)) return factor;
    factor = next;
  }
}

/** A rectangle scaled about the centre of the glass. */
export function scaleRectangle(rectangle: Rectangle, factor: number): Rectangle {
  return {
    xMm: rectangle.xMm * factor,
    yMm: rectangle.yMm * factor,
    widthMm: rectangle.widthMm * factor,
    heightMm: rectangle.heightMm * factor,
  };
}
