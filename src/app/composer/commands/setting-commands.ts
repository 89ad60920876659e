import { beginningOf } from '@oriel/shared/contracts/beginning-of';
import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import { EYE_MARGIN_MM } from '@oriel/shared/projection/clearance';
import { growToCover, scaleRectangle } from '@oriel/shared/projection/grow-to-cover';
import { retarget } from '@oriel/shared/projection/retarget';
import type { Glass, Point3, ViewingZone } from '@oriel/shared/projection/types';
import type { Change } from './change';
import { clamp, eyeLimits, positionLimits, sizeLimits } from './limits';

export const renameScene =
  (name: string): Change =>
  (document) =>
    name.trim() === '' ? document : { ...document, name: beginningOf(name.trim(), 120) };

/** Whose photograph it is; nothing typed takes the credit away. */
export const creditScene =
  (credit: string): Change =>
  (document) => ({ ...document, credit: beginningOf(credit.trim(), 200) || undefined });

/** Another glass before the same layers, which stay as large as they are. */
export const setGlass =
  (glass: Glass): Change =>
  (document) => ({
    ...document,
    glass: { widthMm: clamp(glass.widthMm, sizeLimits), heightMm: clamp(glass.heightMm, sizeLimits) },
  });

/** Carries the whole scene, depths and zone with it, to another glass: every angle stays as it was. */
export const scaleToGlass =
  (glass: Glass): Change =>
  (document) => {
    const { homeEye, zone, layers } = retarget(document, glass);
    return { ...document, glass, homeEye, zone, layers };
  };

/** Moves the eye from which the scene is composed. What the layers look like from there stays. */
export const setHomeEye =
  (eye: Point3): Change =>
  (document) => ({
    ...document,
    homeEye: {
      x: clamp(eye.x, positionLimits),
      y: clamp(eye.y, positionLimits),
      z: clamp(eye.z, eyeLimits(document)),
    },
  });

/** The least extent of a viewing zone, mm. */
const LEAST_ZONE_MM = 10;

/** Changes sides of the viewing zone. A side cannot pass the one opposite, nor come nearer a layer than the eye's margin. */
export const setZone =
  (sides: Partial<ViewingZone>): Change =>
  (document) => ({ ...document, zone: orderedZone({ ...document.zone, ...sides }, sides, document) });

function orderedZone(zone: ViewingZone, moved: Partial<ViewingZone>, document: SceneDocument): ViewingZone {
  const [leftMm, rightMm] = inOrder(zone.leftMm, zone.rightMm, moved.leftMm !== undefined);
  const [lowestMm, highestMm] = inOrder(zone.lowestMm, zone.highestMm, moved.lowestMm !== undefined);
  const limits = eyeLimits(document);
  const nearest = clamp(zone.nearestMm, { least: limits.least, most: limits.most - LEAST_ZONE_MM });
  const [nearestMm, farthestMm] = inOrder(nearest, Math.max(zone.farthestMm, EYE_MARGIN_MM), moved.nearestMm !== undefined);
  return { leftMm, rightMm, lowestMm, highestMm, nearestMm: Math.max(nearestMm, limits.least), farthestMm: Math.max(farthestMm, limits.least) };
}

/** Two opposite sides at least `LEAST_ZONE_MM` apart, the one not moved standing firm. */
function inOrder(low: number, high: number, lowMoved: boolean): [number, number] {
  const [a, b] = [clamp(low, positionLimits), clamp(high, positionLimits)];
  if (b - a >= LEAST_ZONE_MM) return [a, b];
  return lowMoved ? [b - LEAST_ZONE_MM, b] : [a, a + LEAST_ZONE_MM];
}

/** Scales all layers together about the centre of the glass until every edge that runs off it is covered from the whole zone. */
export const growLayersToCover: Change = (document) => {
  const factor = growthToCover(document);
  if (factor <= 1) return document;
  return { ...document, layers: document.layers.map((layer) => ({ ...layer, placed: scaleRectangle(layer.placed, factor) })) };
};

/** Grown by this much more than needed, so that rounding leaves no layer a hair short. */
const SPARE = 1 + 1e-6;

/** The factor `growLayersToCover` would use; 1 where nothing is to be gained. */
export function growthToCover({ glass, homeEye, zone, layers }: SceneDocument): number {
  const shown = layers.filter((layer) => layer.shown);
  const factor = growToCover(shown, { glass, homeEye, zone });
  const largest = Math.max(...layers.flatMap(({ placed }) => [placed.widthMm, placed.heightMm, Math.abs(placed.xMm), Math.abs(placed.yMm)]), 1);
  return factor > 1 && Number.isFinite(factor) && largest * factor * SPARE <= sizeLimits.most ? factor * SPARE : 1;
}
