import { stillStretches, type Hit } from './hits';
import { deviationWithin, mean, quantile, rounded } from './statistics';
import type { TruthFrame } from './truth';

/** What is printed besides where the truth is known in millimetres. The viewer's scale is set once, from the frames at rest. */
export interface DistanceScore {
  /** Root mean square and greatest error of distance over all frames found, in percent of the distance. */
  readonly distanceRmsPct: number;
  readonly distanceMaxPct: number;
  /** Standard deviation of measured distance where the truth stands still, in percent of it. */
  readonly restDistanceSdPct: number | null;
  /** Median error across the line of sight, in millimetres. */
  readonly lateralMmP50: number;
  /** Frames from the first with a face to the first in which one was found; 0 where that is the same. */
  readonly acquiredFrames: number | null;
}

type KnownHit = Hit & { readonly truth: { readonly eyeMm: readonly [number, number, number] } };

const isKnown = (hit: Hit | null): hit is KnownHit => hit !== null && hit.truth.eyeMm !== null;

/** Distances held against the truth; nothing where the truth has none, or nobody was found. */
export function scoreDistances(
  truths: readonly TruthFrame[],
  hits: readonly (Hit | null)[],
  scale: number,
): Partial<DistanceScore> {
  const known = hits.filter(isKnown);
  if (known.length === 0) return {};
  const distanceErrors = known.map(({ found, truth }) => 100 * (found.eyeMm[2] / scale / truth.eyeMm[2] - 1));
  const lateral = known.map(({ found, truth }) =>
    Math.hypot(found.eyeMm[0] / scale - truth.eyeMm[0], found.eyeMm[1] / scale - truth.eyeMm[1]),
  );
  const still = stillStretches(hits).map((stretch) =>
    stretch.filter(isKnown).map((hit) => (100 * hit.found.eyeMm[2]) / scale / hit.truth.eyeMm[2]),
  );
  const appears = truths.findIndex((truth) => truth.faces.length > 0);
  return {
    distanceRmsPct: rounded(Math.sqrt(mean(distanceErrors.map((error) => error ** 2)))),
    distanceMaxPct: rounded(Math.max(...distanceErrors.map(Math.abs))),
    restDistanceSdPct: still.length > 0 ? rounded(deviationWithin(still)) : null,
    lateralMmP50: rounded(quantile(lateral, 0.5)),
    acquiredFrames: hits.findIndex((hit) => hit !== null) - appears,
  };
}

/** Measured over true distance, from the segment `rest`, or else from the first second in which the head faces the camera; 1 where none is known. */
export function scaleAtRest(hits: readonly (Hit | null)[], fps: number): number {
  const known = hits.filter(isKnown);
  if (known.length === 0) return 1;
  const rest = known.filter((hit) => hit.frame.segment === 'rest');
  const facing = known.filter((hit) => hit.truth.facing).slice(0, Math.round(fps));
  const chosen = [rest, facing].find((group) => group.length > 0) ?? known.slice(0, Math.round(fps));
  return mean(chosen.map(({ found, truth }) => found.eyeMm[2] / truth.eyeMm[2]));
}
