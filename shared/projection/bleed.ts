import { planeFromHome } from './home-plane';
import { requiredExtent } from './required-extent';
import { requireEye } from './requirements';
import type { PlacedLayer } from './scene-geometry';
import { perSide, SIDE_AXIS, sideOf, sideOfGlass, SIDES, type PerSide, type Side } from './sides';
import type { Glass, Point3, Rectangle, ViewingZone } from './types';

/** A side this close to the edge of the glass, or past it, is meant to run off the picture; mm on the glass. */
const REACH_MM = 0.5;

/** The bleed of one side of a layer. */
export interface SideBleed {
  /** Whether the side runs off the glass as seen from home; a side that stays inside is a true silhouette. */
  readonly reaches: boolean;
  /** Bleed to spare in the layer's plane, mm; negative is short. Counts only where the side reaches. */
  readonly spareMm: number;
  /** The eye of the zone from which the least is to spare. */
  readonly worstEye: Point3;
}

/** The bleed of a layer. */
export interface Bleed extends PerSide<SideBleed> {
  /** The least to spare over the sides that reach; null where none does: the layer stands inside the glass. */
  readonly spareMm: number | null;
}

/** Whether a side of a placed rectangle touches or passes that side of the glass, as the home eye sees it. */
export function reaches(placed: Rectangle, glass: Glass, side: Side): boolean {
  return SIDE_AXIS[side].outward * (sideOf(placed, side) - sideOfGlass(glass, side)) >= -REACH_MM;
}

/** What each side of a layer has to spare over the viewing zone. Throws a GeometryError where an eye is not in front of the layer. */
export function bleedOver(zone: ViewingZone, glass: Glass, homeEye: Point3, layer: PlacedLayer): Bleed {
  requireEye(homeEye, 'homeEye');
  const required = requiredExtent(layer.depthMm, glass, zone);
  const covered = planeFromHome(layer.placed, homeEye, layer.depthMm);
  const sides = perSide((side) => ({
    reaches: reaches(layer.placed, glass, side),
    spareMm: SIDE_AXIS[side].outward * (sideOf(covered, side) - required[side].atMm),
    worstEye: required[side].eye,
  }));
  const spares = SIDES.filter((side) => sides[side].reaches).map((side) => sides[side].spareMm);
  return { ...sides, spareMm: spares.length > 0 ? Math.min(...spares) : null };
}
