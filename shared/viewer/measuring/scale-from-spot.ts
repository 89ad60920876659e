import type { Point3 } from '../../projection/types';
import { requirePositive } from '../../projection/requirements';
import { type Measured, propagate } from './uncertainty';

/*
 * A viewer's own scale. The tracker's places are proportional to (distance between the eyes)/k, measured from the lens; standing at a
 * known spot tells what they should have been:
 *
 *     k_true = k_used · (range seen) / (range true).
 *
 * Size and distance cannot be told apart from pictures alone, so the distance between the eyes may stay as it is assumed: k makes up
 * for both, and from then on only the uncertainty of k counts.
 */

type MeasuredPoint = Readonly<Record<keyof Point3, Measured>>;

/**
 * k of this viewer with its standard uncertainty.
 * @param lens and `spot` from the centre of the glass, mm.
 * @param rangeSeenMm from the lens to the eye as the tracker saw it with `factorUsed`.
 */
export function factorFromSpot(factorUsed: number, rangeSeenMm: Measured, lens: MeasuredPoint, spot: MeasuredPoint): Measured {
  requirePositive('factorUsed', factorUsed);
  requirePositive('rangeSeenMm', rangeSeenMm.value);
  const inputs = [rangeSeenMm, lens.x, lens.y, lens.z, spot.x, spot.y, spot.z];
  return propagate(([seen, cx, cy, cz, px, py, pz]) => {
    const range = Math.hypot(px - cx, py - cy, pz - cz);
    requirePositive('spot', range);
    return (factorUsed * seen) / range;
  }, inputs);
}
