/*
 * The delay from drawing to capture, from what was drawn and what the camera saw of it in a mirror.
 *
 * The drawn light s(t) is +1 or -1, changing when it was really drawn. The camera gives brightness b at its own times of capture t_i. For
 * a delay d the normalised correlation r(d) = cov(b_i, s(t_i - d)) / (sd sd) is greatest where d is the true delay, and falls off on both
 * sides in straight flanks as long as a symbol (the autocorrelation of a maximal-length sequence, maximal-sequence.ts). Between two frames
 * nothing is seen, so that near the top r is a staircase; lines through the flanks pass through the middle of its steps, and where they
 * cross is the delay, to a part of a frame.
 */

/** A change of the drawn light: from `atMs` on (the page's clock) its level is 1 or 0. */
export interface Drawn {
  readonly atMs: number;
  readonly level: number;
}

/** What the camera saw of one part of its picture, at its time of capture on the same clock. */
export interface Seen {
  readonly atMs: number;
  readonly brightness: number;
}

export interface MirrorDelay {
  /** From drawing to capture, ms, from the whole recording. */
  readonly delayMs: number;
  /** The median of its parts, each taken alone, ms: near the whole, or something moved. */
  readonly medianMs: number;
  /** The standard deviation over the parts of the recording, each taken alone, ms. */
  readonly spreadMs: number;
  /** How well what was seen follows what was drawn, 0 to 1. */
  readonly correlation: number;
  /** How many parts gave a delay. */
  readonly parts: number;
}

/** No loop of screen and camera is quicker or slower than this. */
const LONGEST_MS = 500;
const STEP_MS = 4;
/** How much of each flank is judged: three frames of the camera. Farther down, noise adds up along the flank. */
const FLANK_MS = 100;
const PARTS = 4;

/** Below this the blink was not seen: the best of fifty parts of a picture that has nothing to do with it reaches about 0.45 (computed: sqrt(2 ln 500) / sqrt(62)). */
export const LEAST_CORRELATION = 0.6;
/** Parts that disagree by more than this do not count as a measurement, ms. */
export const GREATEST_SPREAD_MS = 25;

/** The delay; null where what was seen has nothing to do with what was drawn, or its parts disagree. */
export function mirrorDelay(drawn: readonly Drawn[], filmed: readonly Seen[]): MirrorDelay | null {
  const seen = withoutTrend(filmed);
  const whole = crossing(drawn, seen);
  if (!whole || whole.correlation < LEAST_CORRELATION) return null;
  const alone = inParts(seen)
    .map((part) => crossing(drawn, part))
    .filter((found) => found !== null && found.correlation >= LEAST_CORRELATION)
    .map((found) => found!.delayMs)
    .sort((a, b) => a - b);
  if (alone.length < PARTS / 2) return null;
  const mean = alone.reduce((sum, ms) => sum + ms, 0) / alone.length;
  const spreadMs = Math.sqrt(alone.reduce((sum, ms) => sum + (ms - mean) ** 2, 0) / (alone.length - 1));
  if (spreadMs > GREATEST_SPREAD_MS) return null;
  return {
    delayMs: whole.delayMs,
    medianMs: median(alone),
    spreadMs,
    correlation: whole.correlation,
    parts: alone.length,
  };
}

/** The part of the picture that follows the blink best, and its correlation; the places share their times of capture. */
export function bestPlace(
  drawn: readonly Drawn[],
  places: readonly (readonly Seen[])[],
): { place: number; correlation: number } {
  return places.reduce(
    (best, seen, place) => {
      const correlation = peakOf(drawn, seen).correlation;
      return correlation > best.correlation ? { place, correlation } : best;
    },
    { place: -1, correlation: 0 },
  );
}

/** Less the straight line through it: daylight and exposure change slowly, the blink does not. */
function withoutTrend(seen: readonly Seen[]): Seen[] {
  const n = seen.length;
  const meanT = seen.reduce((sum, { atMs }) => sum + atMs / n, 0);
  const mean = seen.reduce((sum, { brightness }) => sum + brightness / n, 0);
  const tt = seen.reduce((sum, { atMs }) => sum + (atMs - meanT) ** 2, 0);
  const slope = tt ? seen.reduce((sum, { atMs, brightness }) => sum + (atMs - meanT) * (brightness - mean), 0) / tt : 0;
  return seen.map(({ atMs, brightness }) => ({ atMs, brightness: brightness - mean - slope * (atMs - meanT) }));
}

/** Normalised correlation for one delay, -1 to 1; 0 where either does not change. */
export function correlationAt(drawn: readonly Drawn[], seen: readonly Seen[], delayMs: number): number {
  let [n, sb, sl, sbb, sbl, sll] = [0, 0, 0, 0, 0, 0];
  let change = 0;
  const endMs = drawn[drawn.length - 1]?.atMs ?? 0;
  for (const { atMs, brightness } of seen) {
    const at = atMs - delayMs;
    if (at < drawn[0].atMs || at >= endMs) continue;
    while (change + 1 < drawn.length && drawn[change + 1].atMs <= at) change++;
    const { level } = drawn[change];
    n++;
    sb += brightness;
    sl += level;
    sbb += brightness * brightness;
    sbl += brightness * level;
    sll += level * level;
  }
  const spread = (sbb - (sb * sb) / n) * (sll - (sl * sl) / n);
  return spread > 1e-12 * sbb * sll ? (sbl - (sb * sl) / n) / Math.sqrt(spread) : 0;
}

function peakOf(drawn: readonly Drawn[], seen: readonly Seen[]): { delayMs: number; correlation: number } {
  let best = { delayMs: 0, correlation: 0 };
  for (let delayMs = 0; delayMs <= LONGEST_MS; delayMs += 4 * STEP_MS) {
    const correlation = correlationAt(drawn, seen, delayMs);
    if (correlation > best.correlation) best = { delayMs, correlation };
  }
  return best;
}

/** Where the lines through the two flanks of the peak cross; null where there are no two flanks. Found twice: from the top of the staircase, then from there. */
function crossing(drawn: readonly Drawn[], seen: readonly Seen[]): { delayMs: number; correlation: number } | null {
  const { delayMs: top, correlation } = peakOf(drawn, seen);
  if (correlation <= 0) return null;
  const flank = (from: number, way: 1 | -1) =>
    Array.from({ length: FLANK_MS / STEP_MS }, (_, i) => {
      const d = from + way * (i + 0.5) * STEP_MS;
      return { d, r: correlationAt(drawn, seen, d) };
    });
  let delayMs = top;
  for (let round = 0; round < 2; round++) {
    const [rising, falling] = [lineThrough(flank(delayMs, -1)), lineThrough(flank(delayMs, 1))];
    if (rising.slope <= 0 || falling.slope >= 0) return null;
    delayMs = (falling.at0 - rising.at0) / (rising.slope - falling.slope);
    if (Math.abs(delayMs - top) > FLANK_MS) return null;
  }
  return { delayMs, correlation };
}

function lineThrough(points: readonly { d: number; r: number }[]): { at0: number; slope: number } {
  const n = points.length;
  const meanD = points.reduce((sum, { d }) => sum + d, 0) / n;
  const meanR = points.reduce((sum, { r }) => sum + r, 0) / n;
  const slope =
    points.reduce((sum, { d, r }) => sum + (d - meanD) * (r - meanR), 0) /
    points.reduce((sum, { d }) => sum + (d - meanD) ** 2, 0);
  return { at0: meanR - slope * meanD, slope };
}

function inParts(seen: readonly Seen[]): Seen[][] {
  const length = Math.floor(seen.length / PARTS);
  return Array.from({ length: PARTS }, (_, part) => seen.slice(part * length, (part + 1) * length));
}

function median(sorted: readonly number[]): number {
  const middle = sorted.length >> 1;
  return sorted.length % 2 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}
