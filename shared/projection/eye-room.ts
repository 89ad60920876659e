import { clearance, EYE_MARGIN_MM } from './clearance';
import { GeometryError } from './geometry-error';
import { requireEye, requireGlass, requireZone } from './requirements';
import type { SceneGeometry } from './scene-geometry';
import type { Glass, Point3, ViewingZone } from './types';

/*
 * What is seen at the edges of the glass is decided by slopes alone. From the eye (e, ez) the sight line through an edge of the
 * glass at s runs with the slope
 *
 *     t = (s - e) / ez,
 *
 * and looks at X = s + t d of the plane at depth d. Whatever the depths, a layer that covers that edge from two eyes covers it from
 * every eye whose slope lies between theirs; the same holds for the fill behind a cut-out (fill-band.ts), which depends on t too. So
 * a scene that is clear over its viewing zone is clear over the *room*: every eye whose slopes through the edges of the glass occur in
 * the zone. Within a plane through x and z the room is bounded by two straight lines a side,
 *
 *     e <= s - t_least(s) ez    for s the edge of that side and for the opposite one,
 *
 * so it is convex, holds the zone, and mostly widens with distance where the zone's box does not; nearer than the zone it narrows to a
 * point, for there the far edge of the glass is seen too steeply.
 */

/** One side of the room, all in the outward direction of that side, mm: an eye stands within it where u <= +-edge - slope * ez. */
export interface RoomSide {
  /** From the centre of the glass to its edge. */
  readonly edgeMm: number;
  /** The least slope through the edge of this side that occurs in the zone, and through the opposite one. */
  readonly ownSlope: number;
  readonly otherSlope: number;
  /** Over so much before the limit an eye is eased to a stop. */
  readonly easeMm: number;
  /** By so much the corner where the two lines meet is rounded. */
  readonly bluntMm: number;
}

/** The eyes from which a scene may be drawn: where it is clear, no edge of it shows from any of them. */
export interface EyeRoom {
  readonly left: RoomSide;
  readonly right: RoomSide;
  readonly bottom: RoomSide;
  readonly top: RoomSide;
  readonly nearestMm: number;
  readonly farthestMm: number;
  readonly nearEaseMm: number;
  readonly farEaseMm: number;
}

/** An eye is eased to a stop over this share of the zone: a step past its end takes some tenth of a second. Practice. */
const EASE_SHARE = 0.1;
const BLUNT_SHARE = 0.01;
/** Sight lines that draw together leave at least this share of the zone's width: farther than the zone, and nearer. */
const NARROWEST_FAR_SHARE = 0.5;
const NARROWEST_NEAR_SHARE = 0.25;
/** No camera sees an eye from farther, mm. */
const FARTHEST_MM = 100_000;

/**
 * The room of a scene: of its own zone, and besides of the home eye and of another zone (a wall's), so far as it is clear from them.
 * A layer that hides everything from nearer than its zone is no fault of it. Throws a GeometryError where a figure is impossible.
 */
export function clearRoom(scene: SceneGeometry, otherZone?: ViewingZone): EyeRoom {
  const { x, y, z } = scene.homeEye;
  const home = { leftMm: x, rightMm: x, lowestMm: y, highestMm: y, nearestMm: z, farthestMm: z };
  const others = [home, ...(otherZone ? [otherZone] : [])].filter((zone) => isClearFrom(scene, zone));
  const foremostMm = Math.max(0, ...scene.layers.map(({ depthMm }) => -depthMm));
  return eyeRoom(scene.glass, scene.homeEye, scene.zone, others, foremostMm > 0 ? foremostMm + EYE_MARGIN_MM : 0);
}

/** Whether no edge of a scene shows from anywhere in a zone, its own or another; sides that no layer covers are not asked for. */
export function isClearFrom(scene: SceneGeometry, zone: ViewingZone): boolean {
  try {
    return clearance({ ...scene, zone }).every(({ kind }) => kind === 'sideOpen');
  } catch (error) {
    if (error instanceof GeometryError) return false;
    throw error;
  }
}

/**
 * The room of a zone and of others beside it; nearer than the zone it goes on to `leastMm` at the most. The home eye stays as it is
 * wherever it stands in the room. Throws a GeometryError where a figure is impossible.
 */
export function eyeRoom(glass: Glass, homeEye: Point3, zone: ViewingZone, others: readonly ViewingZone[] = [], leastMm = 0): EyeRoom {
  requireGlass(glass);
  requireEye(homeEye, 'homeEye');
  const zones = [zone, ...others];
  zones.forEach(requireZone);
  const across = axis(glass.widthMm / 2, homeEye.x, homeEye.z, zones.map(({ leftMm, rightMm, ...z }) => ({ low: leftMm, high: rightMm, ...z })));
  const up = axis(glass.heightMm / 2, homeEye.y, homeEye.z, zones.map(({ lowestMm, highestMm, ...z }) => ({ low: lowestMm, high: highestMm, ...z })));
  const zoneNearestMm = Math.min(...zones.map((one) => one.nearestMm));
  const nearestMm = Math.min(zoneNearestMm, Math.max(leastMm, across.nearestMm, up.nearestMm));
  const farthestMm = Math.max(zoneNearestMm, Math.min(FARTHEST_MM, across.farthestMm, up.farthestMm));
  const easeMm = EASE_SHARE * Math.min(farthestMm - nearestMm, Math.max(...zones.map((one) => one.farthestMm)) - nearestMm);
  return {
    left: across.low,
    right: across.high,
    bottom: up.low,
    top: up.high,
    nearestMm,
    farthestMm,
    nearEaseMm: within(0, homeEye.z - nearestMm, easeMm),
    farEaseMm: within(0, farthestMm - homeEye.z, easeMm),
  };
}

/** How far out, in the outward direction of a side, an eye may stand at a distance, mm. Allocates nothing. */
export function limitAt({ edgeMm, ownSlope, otherSlope, bluntMm }: RoomSide, distanceMm: number): number {
  const own = edgeMm - ownSlope * distanceMm;
  const other = -edgeMm - otherSlope * distanceMm;
  // The lesser of the two, a little less where they meet: smooth, and never beyond either.
  return (own + other - Math.hypot(own - other, 2 * bluntMm)) / 2;
}

interface Range {
  readonly low: number;
  readonly high: number;
  readonly nearestMm: number;
  readonly farthestMm: number;
}

function axis(edgeMm: number, home: number, homeMm: number, ranges: readonly Range[]) {
  const widthMm = ranges[0].high - ranges[0].low;
  const high = side(edgeMm, home, homeMm, widthMm, ranges);
  const low = side(edgeMm, -home, homeMm, widthMm, ranges.map((range) => ({ ...range, low: -range.high, high: -range.low })));
  return { low, high, nearestMm: fromNarrow(low, high, NARROWEST_NEAR_SHARE * widthMm), farthestMm: untilNarrow(low, high, NARROWEST_FAR_SHARE * widthMm) };
}

function side(edgeMm: number, home: number, homeMm: number, widthMm: number, ranges: readonly Range[]): RoomSide {
  const leastSlope = (s: number) => Math.min(...ranges.flatMap(({ high, nearestMm, farthestMm }) => [(s - high) / nearestMm, (s - high) / farthestMm]));
  const sharp = { edgeMm, ownSlope: leastSlope(edgeMm), otherSlope: leastSlope(-edgeMm), easeMm: 0, bluntMm: BLUNT_SHARE * widthMm };
  return { ...sharp, easeMm: within(0, limitAt(sharp, homeMm) - home, EASE_SHARE * widthMm) };
}

/** The distance up to which the lines of two opposite sides leave a width between them. */
const untilNarrow = (low: RoomSide, high: RoomSide, widthMm: number) =>
  Math.min(...opposites(low, high).map(({ atMm, slope }) => (slope > 0 ? (atMm - widthMm) / slope : Infinity)));

/** The distance from which they leave it. */
const fromNarrow = (low: RoomSide, high: RoomSide, widthMm: number) =>
  Math.max(...opposites(low, high).map(({ atMm, slope }) => (slope < 0 ? (atMm - widthMm) / slope : 0)));

/** Each line of one side with each of the opposite one: between them lie atMm - slope * ez. */
function opposites(low: RoomSide, high: RoomSide): { atMm: number; slope: number }[] {
  const lines = ({ edgeMm, ownSlope, otherSlope }: RoomSide) => [
    { at: edgeMm, slope: ownSlope },
    { at: -edgeMm, slope: otherSlope },
  ];
  return lines(low).flatMap((a) => lines(high).map((b) => ({ atMm: a.at + b.at, slope: a.slope + b.slope })));
}

const within = (least: number, value: number, most: number) => Math.max(least, Math.min(value, most));
