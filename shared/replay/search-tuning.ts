import type { TrackerTuning } from '../contracts/wall-set-up';
import { followerSettingsOf } from './follower-settings-of';
import { onOneClock } from './capture-time';
import { excerptOf, replayExcerpt, type Excerpt } from './excerpt';
import { jitterMm } from './jitter';
import { laterKnown, type LaterKnown } from './later-known';
import { lagInMotionMs, strayInMotion } from './lag';
import { leastOverGrid, type Dimension } from './least-over-grid';
import type { Direction, ReplaySample } from './sample';
import { movingStretches, stillStretches, totalMs, type Stretch } from './stretches';
import { LEAST_JUDGED_MS } from './what-it-shows';
import { costsIn, unbeaten, type Figures, type Wish } from './wishes';

/** One setting and what it would have done with this run. */
export interface TriedTuning extends Figures {
  readonly tuning: TrackerTuning;
  /** The delay of best fit, ms; worked out only where it is shown. */
  readonly lagMs: number;
}

/** What replay found in one direction. */
export interface SearchResult {
  readonly direction: Direction;
  /** How long the viewer stood still and moved in what was judged, ms: on little, little can be built. */
  readonly stillMs: number;
  readonly movingMs: number;
  readonly today: TriedTuning;
  /** The settings that no other beats in both figures, the calmest first. */
  readonly curve: readonly TriedTuning[];
  readonly best: Readonly<Record<Wish, TriedTuning>>;
}

/** Thrown when a run has too little rest or motion; `message` says what to record. */
export class TooLittleMotion extends Error {
  override readonly name = 'TooLittleMotion';
}

const CUTOFFS_HZ: Dimension = { coarse: [0.3, 0.6, 1.2, 2.4, 4.8] };
const BETAS: Readonly<Record<Direction, Dimension>> = {
  across: { coarse: [0, 0.01, 0.03, 0.1, 0.3] },
  along: { coarse: [0, 0.005, 0.02, 0.08] },
};
const HORIZONS_MS: Dimension = { coarse: [0, 60, 120, 200] };

/**
 * Replays a run through many settings: of the 1 euro filter in one direction, and across also how far the predictor looks ahead (along
 * keeps the one it has, since both share it). Of a long run an excerpt is replayed. @throws TooLittleMotion
 */
export function searchTuning(
  run: readonly ReplaySample[],
  today: TrackerTuning,
  direction: Direction,
  progress: (triedSoFar: number) => void = () => undefined,
): SearchResult {
  const judged = judgedPart(run, direction);
  const costs = costsIn(direction);
  let asked = 0;
  const { tried, best } = leastOverGrid(
    [CUTOFFS_HZ, BETAS[direction], ...(direction === 'across' ? [HORIZONS_MS] : [])],
    (point) => {
      progress(++asked);
      return judge(judged, tuned(today, direction, point), false);
    },
    [costs.calmest, costs.quicker, costs.balanced, costs.calmer],
  );
  const [, quicker, balanced, calmer] = best.map(({ value }) => judge(judged, value.tuning, true));
  return {
    direction,
    stillMs: totalMs(judged.still),
    movingMs: totalMs(judged.moving),
    today: judge(judged, today, true),
    curve: unbeaten(tried.map(({ value }) => value)),
    best: { calmer, balanced, quicker },
  };
}

/** What one setting would have done with this run, in the figures of `searchTuning`. @throws TooLittleMotion */
export const tryTuning = (run: readonly ReplaySample[], tuning: TrackerTuning, direction: Direction): TriedTuning =>
  judge(judgedPart(run, direction), tuning, true);

/** How many settings a search tries on the grid; refinement adds some forty. */
export const triedAtLeast = (direction: Direction): number =>
  CUTOFFS_HZ.coarse.length * BETAS[direction].coarse.length * (direction === 'across' ? HORIZONS_MS.coarse.length : 1);

interface Judged extends Excerpt {
  readonly known: LaterKnown;
  readonly direction: Direction;
}

function judgedPart(run: readonly ReplaySample[], direction: Direction): Judged {
  const samples = onOneClock(run);
  const known = laterKnown(samples);
  const still = stillStretches(known);
  const moving = movingStretches(known, direction);
  requireEnough(still, moving, direction);
  return { ...excerptOf(samples, still, moving), known, direction };
}

function judge(judged: Judged, tuning: TrackerTuning, withLag: boolean): TriedTuning {
  const { known, still, moving, direction } = judged;
  const track = replayExcerpt(judged, followerSettingsOf(tuning), tuning.displayDelayMs);
  return {
    tuning,
    jitterMm: jitterMm(track, still, direction),
    strayMs: strayInMotion(track, known, moving, direction).ms,
    lagMs: withLag ? lagInMotionMs(track, known, moving, direction) : NaN,
  };
}

function tuned(
  tuning: TrackerTuning,
  direction: Direction,
  [minCutoffHz, beta, horizonMs]: readonly number[],
): TrackerTuning {
  const filter = {
    ...tuning.filter,
    [direction]: { ...tuning.filter[direction], minCutoffHz: rounded(minCutoffHz), beta: rounded(beta) },
  };
  return {
    ...tuning,
    filter,
    longestHorizonMs: horizonMs === undefined ? tuning.longestHorizonMs : Math.round(horizonMs),
  };
}

/** Three significant figures: finer is beyond what a run can tell. */
const rounded = (figure: number): number => Number(figure.toPrecision(3));

function requireEnough(still: readonly Stretch[], moving: readonly Stretch[], direction: Direction): void {
  if (totalMs(still) < LEAST_JUDGED_MS)
    throw new TooLittleMotion(
      'Nobody stands still in this run for long enough. Record one in which you stand still for ten seconds, then move.',
    );
  if (totalMs(moving) < LEAST_JUDGED_MS)
    throw new TooLittleMotion(
      direction === 'across'
        ? 'Nobody moves from side to side in this run for long enough. Record one in which you stand still, then walk past a few times.'
        : 'Nobody comes nearer or goes back in this run for long enough. Record one in which you also step toward the glass and back.',
    );
}
