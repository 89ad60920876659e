import { scaleAtRest, scoreDistances, type DistanceScore } from './distance-score';
import { scoreOnGlass, type GlassScore } from './glass-score';
import { hitOf, stillStretches, type Hit } from './hits';
import type { Look } from './result';
import { deviationWithin, mean, quantile, rounded, scatterPct } from './statistics';
import type { TruthFrame } from './truth';

/** What is printed of an engine. */
export interface Score extends Partial<DistanceScore>, Partial<GlassScore> {
  /** Of the frames with a face, those in which the engine found it within one eye distance of the truth, in percent. */
  readonly detectedPct: number;
  /** Frames in which the engine reported a face where none is, or more than one eye distance from any that is. */
  readonly falsePositives: number;
  /** Mean distance of the measured from the true midpoint between the eyes, in percent of the true eye distance. */
  readonly eyeErrorPctIpd: number | null;
  /** Scatter of measured over true eye distance about its mean, root mean square over all frames found, in percent of that mean. */
  readonly linearityRmsPct: number | null;
  /** Standard deviation of the midpoint in x and y where the truth stands still. */
  readonly jitterPx: readonly [number, number] | null;
  readonly msPerFrameP50: number;
  readonly msPerFrameP95: number;
  /** Frames a second when each is handed over as soon as the one before is answered. */
  readonly fps: number;
}

/** Holds an engine's looks against the truth, frame by frame (the k-th look is of the k-th truth). */
export function scoreLooks(truths: readonly TruthFrame[], looks: readonly Look[], fps: number): Score {
  const hits = hitsOf(truths, looks);
  return scoreHits(truths, looks, hits, fps, scaleAtRest(hits, fps));
}

/** The same for each segment by itself, with the viewer's scale of the whole. */
export function scoreSegments(
  truths: readonly TruthFrame[],
  looks: readonly Look[],
  fps: number,
): Record<string, Score> {
  const hits = hitsOf(truths, looks);
  const scale = scaleAtRest(hits, fps);
  const segments = [...new Set(truths.map(({ segment }) => segment))];
  return Object.fromEntries(
    segments.map((segment) => {
      const within = <T>(values: readonly T[]): T[] => values.filter((_, k) => truths[k].segment === segment);
      return [segment, scoreHits(within(truths), within(looks), within(hits), fps, scale)];
    }),
  );
}

const hitsOf = (truths: readonly TruthFrame[], looks: readonly Look[]): (Hit | null)[] =>
  truths.map((truth, k) => hitOf(truth, looks[k]));

function scoreHits(
  truths: readonly TruthFrame[],
  looks: readonly Look[],
  hits: readonly (Hit | null)[],
  fps: number,
  scale: number,
): Score {
  const found = hits.filter((hit) => hit !== null);
  const present = truths.filter((truth) => truth.faces.length > 0).length;
  const engineMs = looks.map((look) => look.engineMs);
  return {
    detectedPct: rounded((100 * found.length) / Math.max(present, 1)),
    falsePositives: looks.filter((look, k) => look.face !== null && hits[k] === null).length,
    eyeErrorPctIpd: found.length > 0 ? rounded(100 * mean(found.map((hit) => hit.error))) : null,
    linearityRmsPct:
      found.length > 0 ? rounded(scatterPct(found.map((hit) => hit.found.ipdPx / hit.truth.ipdPx))) : null,
    jitterPx: jitterOf(stillStretches(hits)),
    msPerFrameP50: rounded(quantile(engineMs, 0.5)),
    msPerFrameP95: rounded(quantile(engineMs, 0.95)),
    fps: rounded(1000 / mean(looks.map((look) => look.roundTripMs))),
    ...scoreDistances(truths, hits, scale),
    ...scoreOnGlass(truths, hits, fps, scale),
  };
}

function jitterOf(still: readonly Hit[][]): [number, number] | null {
  if (still.length === 0) return null;
  const along = (value: (hit: Hit) => number): number =>
    rounded(deviationWithin(still.map((stretch) => stretch.map(value))));
  return [along((hit) => hit.x), along((hit) => hit.y)];
}
