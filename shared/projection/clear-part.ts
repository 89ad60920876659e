import { isClearFrom } from './eye-room';
import type { SceneGeometry } from './scene-geometry';
import type { ViewingZone } from './types';

/** Zones are told in whole steps of this, mm. */
const STEP_MM = 10;

type End = 'leftMm' | 'rightMm' | 'lowestMm' | 'highestMm';
const ENDS: readonly End[] = ['leftMm', 'rightMm', 'lowestMm', 'highestMm'];

/**
 * The largest part of a viewing zone from which a scene is clear; null where it is clear from none of it. What a zone asks for depends, side
 * by side, on one end of it and on its nearest or farthest eye (required-extent.ts), and a smaller zone never asks for more. So for each nearest
 * distance the four ends are moved out from before the home eye one by one, and of all distances that one is taken which leaves the most floor;
 * of two alike the nearer. Ends are whole centimetres, within the zone. Sides that no layer covers are not asked for.
 */
export function clearPart(scene: SceneGeometry, zone: ViewingZone): ViewingZone | null {
  let best: ViewingZone | null = null;
  for (let nearestMm = zone.nearestMm; nearestMm <= zone.farthestMm; nearestMm = (Math.floor(nearestMm / STEP_MM) + 1) * STEP_MM) {
    const part = widest(scene, { ...zone, nearestMm });
    if (part && (!best || floorOf(part) > floorOf(best))) best = part;
    // From farther away there is less floor than was found already.
    if (best && (zone.rightMm - zone.leftMm) * (zone.farthestMm - nearestMm) <= floorOf(best)) break;
  }
  return best;
}

function widest(scene: SceneGeometry, zone: ViewingZone): ViewingZone | null {
  const { x, y } = scene.homeEye;
  const [across, up] = [within(zone.leftMm, x, zone.rightMm), within(zone.lowestMm, y, zone.highestMm)];
  const line = { ...zone, leftMm: across, rightMm: across, lowestMm: up, highestMm: up };
  if (!isClearFrom(scene, line)) return null;
  return ENDS.reduce((part, end) => ({ ...part, [end]: farthestEnd(line[end], zone[end], (at) => isClearFrom(scene, { ...part, [end]: at })) }), line);
}

/** How far from where it is clear toward `wanted` it stays so. */
function farthestEnd(clear: number, wanted: number, isClear: (at: number) => boolean): number {
  if (isClear(wanted)) return wanted;
  const way = Math.sign(wanted - clear);
  let [least, most] = [0, Math.ceil(Math.abs(wanted - clear) / STEP_MM)];
  const at = (steps: number) => (steps === 0 ? clear : (way > 0 ? Math.floor(clear / STEP_MM) : Math.ceil(clear / STEP_MM)) * STEP_MM + way * steps * STEP_MM);
  while (most - least > 1) {
    const middle = Math.floor((least + most) / 2);
    if (isClear(at(middle))) least = middle;
    else most = middle;
  }
  return at(least);
}

const floorOf = ({ leftMm, rightMm, nearestMm, farthestMm }: ViewingZone) => (rightMm - leftMm) * (farthestMm - nearestMm);
const within = (least: number, value: number, most: number) => Math.max(least, Math.min(value, most));
