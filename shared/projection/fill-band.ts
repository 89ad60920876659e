import { GeometryError } from './geometry-error';
import { layerScale } from './layer-on-glass';
import { requireEye, requireGlass, requireZone } from './requirements';
import type { SceneSetting } from './scene-geometry';
import { perSide, rangeOf, SIDE_AXIS, sideOfGlass, type PerSide, type Side } from './sides';

/**
 * How far in from each edge of a cut-out the fill behind it can be seen from anywhere in the zone, in mm as drawn on the
 * glass from the home eye (the measure of `placed`): times the back layer's pixels per placed mm it is in that layer's pixels.
 *
 * Let the cut-out stand at depth a, the fill at b > a. From the eye E a point of its edge seen on the glass at S hides the
 * point of the back plane at distance
 *
 *     delta = (b-a)/(hz+a) * ((S - E) hz/ez - (S - H))
 *
 * from the one it hid from the home eye H. delta is linear in S, in E_xy and in 1/ez, so over the glass and the zone its
 * extremes lie at their corners, all of which are tried. At the home distance it is the relative shift of the two layers,
 * dx * hz (b-a) / ((hz+a)(hz+b)) on the glass. Behind a right edge the fill is seen where delta < 0, behind a left one
 * where delta > 0, and likewise up and down.
 *
 * @throws GeometryError where the two depths are not in order, or an eye is not in front of the nearer layer.
 */
export function fillBand(frontDepthMm: number, backDepthMm: number, setting: SceneSetting): PerSide<number> {
  const { glass, homeEye, zone } = setting;
  requireGlass(glass);
  requireEye(homeEye, 'homeEye');
  requireZone(zone);
  const scale = layerScale(homeEye, backDepthMm);
  layerScale({ x: 0, y: 0, z: Math.min(zone.nearestMm, homeEye.z) }, frontDepthMm);
  if (backDepthMm < frontDepthMm) {
    throw new GeometryError(
      'backDepthMm',
      `The back layer (${backDepthMm} mm) stands in front of the cut-out (${frontDepthMm} mm).`,
    );
  }
  const span = ((backDepthMm - frontDepthMm) / (homeEye.z + frontDepthMm)) * scale;
  return perSide((side) => Math.max(0, span * greatestInward(side, setting)));
}

/** The greatest value, toward the inside of an edge facing `side`, of (S - E) hz/ez - (S - H). */
function greatestInward(side: Side, { glass, homeEye, zone }: SceneSetting): number {
  const { axis, outward } = SIDE_AXIS[side];
  const edge = sideOfGlass(glass, side);
  const { low, high } = rangeOf(zone, axis);
  let greatest = -Infinity;
  for (const s of [-edge, edge]) {
    for (const e of [low, high]) {
      for (const ez of [zone.nearestMm, zone.farthestMm]) {
        greatest = Math.max(greatest, -outward * (((s - e) * homeEye.z) / ez - (s - homeEye[axis])));
      }
    }
  }
  return greatest;
}
