import { requireGlass, requireInFront, requireZone } from './requirements';
import { perSide, rangeOf, SIDE_AXIS, sideOfGlass, type PerSide, type Side } from './sides';
import type { Glass, Point3, ViewingZone } from './types';

/** How far out a layer must reach on one side, and the eye that asks for it. */
export interface Requirement {
  /** Position in the layer's plane, mm from the centre. */
  readonly atMm: number;
  readonly eye: Point3;
}

/**
 * What a layer at depth d must cover so that its edge shows from nowhere in the zone.
 *
 * From the eye (e, ez) the edge g of the glass looks at X = g + (g - e) * d/ez of the layer's plane. Take an edge whose
 * outward direction is positive (the others are mirrored). X is linear in e with slope -d/ez, whose sign is that of -d
 * alone, so the extreme e is the same for every ez:
 *
 *   d > 0: the end of the zone *opposite* the edge (through the right edge one looks farthest out from the left);
 *   d < 0: the end on the edge's *own* side.
 *
 * With e settled, X - g = (g - e) d / ez is monotone in 1/ez: the *nearest* eye where (g - e) d > 0, else (an eye beyond
 * the edge for d > 0, one within it for d < 0) the *farthest*. Both extremes are corners of the box. The eye's other
 * coordinate plays no part; the middle of the zone is given for it.
 *
 * @throws GeometryError where an eye of the zone is not in front of the layer.
 */
export function requiredExtent(depthMm: number, glass: Glass, zone: ViewingZone): PerSide<Requirement> {
  requireGlass(glass);
  requireZone(zone);
  requireInFront({ x: 0, y: 0, z: zone.nearestMm }, depthMm);
  return perSide((side) => requirement(side, depthMm, glass, zone));
}

function requirement(side: Side, depthMm: number, glass: Glass, zone: ViewingZone): Requirement {
  const { axis, outward } = SIDE_AXIS[side];
  const edge = sideOfGlass(glass, side);
  const { low, high } = rangeOf(zone, axis);
  const e = outward * depthMm > 0 ? low : high;
  const ez = outward * (edge - e) * depthMm > 0 ? zone.nearestMm : zone.farthestMm;
  const x = axis === 'x' ? e : (zone.leftMm + zone.rightMm) / 2;
  const y = axis === 'y' ? e : (zone.lowestMm + zone.highestMm) / 2;
  return { atMm: edge + ((edge - e) * depthMm) / ez, eye: { x, y, z: ez } };
}
