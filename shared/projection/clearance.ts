import { bleedOver, reaches } from './bleed';
import { requireEye, requireFinite, requireGlass, requireZone } from './requirements';
import type { PlacedLayer, SceneGeometry } from './scene-geometry';
import { SIDES, type Side } from './sides';
import type { Point3 } from './types';

/** How far in front of every layer the nearest eye must stay: a hand's breadth, so that nothing comes too near to look at. Practice. */
export const EYE_MARGIN_MM = 100;

/** Shortness below this is rounding, not a fault; mm. */
const ROUNDING_MM = 1e-6;

/** A layer's edge shows from `eye`: the side is short by `shortMm` in the layer's plane. */
export interface EdgeShows {
  readonly kind: 'edgeShows';
  readonly layer: number;
  readonly side: Side;
  readonly shortMm: number;
  readonly eye: Point3;
}

/** No layer runs off this side of the glass, so what lies behind the scene shows there. */
export interface SideOpen {
  readonly kind: 'sideOpen';
  readonly side: Side;
}

/** A layer in front of the glass stands nearer than the margin to the nearest eye: push it back by `shortMm`. */
export interface TooNear {
  readonly kind: 'tooNear';
  readonly layer: number;
  readonly shortMm: number;
  readonly eye: Point3;
}

export type Fault = EdgeShows | SideOpen | TooNear;

/**
 * Every fault of a scene's rectangles over its viewing zone; an empty list means that it is clear. `layer` is an index
 * into `scene.layers`. It judges the rectangles: what shows through the gaps *within* a layer is for `fillBand`.
 */
export function clearance(scene: SceneGeometry): Fault[] {
  requireGlass(scene.glass);
  requireEye(scene.homeEye, 'homeEye');
  requireZone(scene.zone);
  const open = SIDES.filter((side) => !scene.layers.some(({ placed }) => reaches(placed, scene.glass, side)));
  return [
    ...scene.layers.flatMap((layer, index) => layerFaults(scene, layer, index)),
    ...open.map((side) => ({ kind: 'sideOpen' as const, side })),
  ];
}

function layerFaults(scene: SceneGeometry, layer: PlacedLayer, index: number): Fault[] {
  const { glass, homeEye, zone } = scene;
  requireFinite('depthMm', layer.depthMm);
  const nearestMm = Math.min(zone.nearestMm, homeEye.z);
  const shortMm = EYE_MARGIN_MM - (nearestMm + layer.depthMm);
  if (layer.depthMm < 0 && shortMm > ROUNDING_MM) {
    const eye = { x: (zone.leftMm + zone.rightMm) / 2, y: (zone.lowestMm + zone.highestMm) / 2, z: nearestMm };
    return [{ kind: 'tooNear', layer: index, shortMm, eye }];
  }
  const bleed = bleedOver(zone, glass, homeEye, layer);
  return SIDES.filter((side) => bleed[side].reaches && bleed[side].spareMm < -ROUNDING_MM).map((side) => ({
    kind: 'edgeShows',
    layer: index,
    side,
    shortMm: -bleed[side].spareMm,
    eye: bleed[side].worstEye,
  }));
}
