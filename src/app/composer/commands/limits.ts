import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import { EYE_MARGIN_MM } from '@oriel/shared/projection/clearance';

/** The largest figure a scene stores, mm (as the contract has it). */
const FARTHEST_MM = 100_000;
/** The least size of a layer or a glass that can still be taken hold of, mm. */
const LEAST_SIZE_MM = 1;

export interface Range {
  readonly least: number;
  readonly most: number;
}

export const clamp = (value: number, { least, most }: Range) => Math.min(Math.max(value, least), most);

/** Depths a layer may have: as far behind as a scene stores, and in front no nearer the nearest eye than its margin. */
export function depthLimits({ zone, homeEye }: SceneDocument): Range {
  return { least: Math.min(0, EYE_MARGIN_MM - Math.min(zone.nearestMm, homeEye.z)), most: FARTHEST_MM };
}

/** Distances an eye may have: before every layer by its margin. */
export function eyeLimits({ layers }: SceneDocument): Range {
  const nearestLayerMm = Math.max(0, ...layers.map((layer) => -layer.depthMm));
  return { least: nearestLayerMm + EYE_MARGIN_MM, most: FARTHEST_MM };
}

export const positionLimits: Range = { least: -FARTHEST_MM, most: FARTHEST_MM };
export const sizeLimits: Range = { least: LEAST_SIZE_MM, most: FARTHEST_MM };
