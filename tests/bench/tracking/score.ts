import type { Look } from './result';
import type { TruthFrame } from './truth';

/** What is printed of an engine. */
export interface Score {
  /** Of the frames with a face, those in which the engine found it within one eye distance of the truth, in percent. */
  readonly detectedPct: number;
  /** Frames in which the engine reported a face where none is, or more than one eye distance from the one that is. */
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

/** A stretch in which the truth stands still counts from this many frames on, the first few left out while regions settle. */
const STILL_FRAMES = 15;
const SETTLING_FRAMES = 5;

interface Hit {
  readonly truth: TruthFrame;
  readonly x: number;
  readonly y: number;
  readonly errorPct: number;
  readonly ratio: number;
}

/** Holds an engine's looks against the truth, frame by frame (the k-th look is of the k-th truth). */
export function scoreLooks(truths: readonly TruthFrame[], looks: readonly Look[]): Score {
  const hits = truths.map((truth, k) => hitOf(truth, looks[k]));
  const found = hits.filter((hit) => hit !== null);
  const present = truths.filter((truth) => truth.on).length;
  const engineMs = looks.map((look) => look.engineMs);
  return {
    detectedPct: rounded((100 * found.length) / Math.max(present, 1)),
    falsePositives: looks.filter((look, k) => look.face !== null && hits[k] === null).length,
    eyeErrorPctIpd: found.length > 0 ? rounded(mean(found.map((hit) => hit.errorPct))) : null,
    linearityRmsPct: found.length > 0 ? rounded(relativeScatterPct(found.map((hit) => hit.ratio))) : null,
    jitterPx: jitterOf(hits),
    msPerFrameP50: rounded(quantile(engineMs, 0.5)),
    msPerFrameP95: rounded(quantile(engineMs, 0.95)),
    fps: rounded(1000 / mean(looks.map((look) => look.roundTripMs))),
  };
}

function hitOf(truth: TruthFrame, look: Look): Hit | null {
  if (!truth.on || !look.face) return null;
  const { rightEye, leftEye, ipdPx } = look.face;
  const x = (rightEye[0] + leftEye[0]) / 2;
  const y = (rightEye[1] + leftEye[1]) / 2;
  const error = Math.hypot(x - (truth.re[0] + truth.le[0]) / 2, y - (truth.re[1] + truth.le[1]) / 2) / truth.ipd;
  return error <= 1 ? { truth, x, y, errorPct: 100 * error, ratio: ipdPx / truth.ipd } : null;
}

function jitterOf(hits: readonly (Hit | null)[]): [number, number] | null {
  const stretches: Hit[][] = [];
  let current: Hit[] = [];
  for (const hit of hits) {
    if (!hit || (current.length > 0 && !sameEyes(current[0].truth, hit.truth))) current = [];
    if (!hit) continue;
    if (current.length === 0) stretches.push(current);
    current.push(hit);
  }
  const still = stretches
    .filter((stretch) => stretch.length >= STILL_FRAMES)
    .map((stretch) => stretch.slice(SETTLING_FRAMES));
  if (still.length === 0) return null;
  const deviation = (value: (hit: Hit) => number): number =>
    rounded(Math.sqrt(mean(still.flatMap((stretch) => squaredDeviations(stretch.map(value))))));
  return [deviation((hit) => hit.x), deviation((hit) => hit.y)];
}

const sameEyes = (a: TruthFrame, b: TruthFrame): boolean =>
  a.re[0] === b.re[0] && a.re[1] === b.re[1] && a.le[0] === b.le[0] && a.le[1] === b.le[1];

const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;

function squaredDeviations(values: readonly number[]): number[] {
  const centre = mean(values);
  return values.map((value) => (value - centre) ** 2);
}

function relativeScatterPct(ratios: readonly number[]): number {
  return (100 * Math.sqrt(mean(squaredDeviations(ratios)))) / mean(ratios);
}

/** The value below which this share of the values lies, by nearest rank. */
function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.max(0, Math.ceil(share * sorted.length) - 1))];
}

const rounded = (value: number): number => Math.round(value * 1000) / 1000;
