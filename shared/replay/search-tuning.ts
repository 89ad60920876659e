import type { TrackerTuning } from '../contracts/walls';
import { followerSettingsOf } from './follower-settings-of';
import { jitterMm } from './jitter';
import { laterKnown, type LaterKnown } from './later-known';
import { lagInMotionMs, strayInMotion } from './lag';
import { leastOverGrid, type Dimension } from './least-over-grid';
import { replay } from './replay';
import type { Direction, ReplaySample } from './sample';
import { movingStretches, stillStretches, totalMs, type Stretch } from './stretches';
import { costOf, unbeaten, wishes, type Figures, type Wish } from './wishes';

/** One setting and what it would have done with this run. */
export interface TriedTuning extends Figures {
  readonly tuning: TrackerTuning;
  /** The delay of best fit, ms; worked out only where it is shown. */
  readonly lagMs: number;
}

/** What replay found in one direction. */
export interface SearchResult {
  readonly direction: Direction;
  /** How long the viewer stood still and moved in this run, ms: on little, little can be built. */
  readonly stillMs: number;
  readonly movingMs: number;
  readonly today: TriedTuning;
  /** The settings that no other beats in both figures, the calmest first. */
  readonly curve: readonly TriedTuning[];
  readonly best: Readonly<Record<Wish, TriedTuning>>;
}

/** Less than this of rest or of motion says nothing. */
export const LEAST_JUDGED_MS = 1000;

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
 * keeps the one it has, since both share it). @throws TooLittleMotion
 */
export function searchTuning(
  samples: readonly ReplaySample[],
  today: TrackerTuning,
  direction: Direction,
  progress: (triedSoFar: number) => void = () => undefined,
): SearchResult {
  const known = laterKnown(samples);
  const still = stillStretches(known);
  const moving = movingStretches(known, direction);
  requireEnough(still, moving, direction);
  const judged = { samples, known, still, moving, direction };
  let asked = 0;
  const measure = (tuning: TrackerTuning): TriedTuning => {
    progress(++asked);
    return judge(judged, tuning, false);
  };
  const { tried, best } = leastOverGrid(
    [CUTOFFS_HZ, BETAS[direction], ...(direction === 'across' ? [HORIZONS_MS] : [])],
    (point) => measure(tuned(today, direction, point)),
    wishes.map((wish) => (figures: TriedTuning) => costOf(figures, wish, direction)),
  );
  const now = judge(judged, today, true);
  return {
    direction,
    stillMs: totalMs(still),
    movingMs: totalMs(moving),
    today: now,
    curve: unbeaten(tried.map(({ value }) => value)),
    best: Object.fromEntries(
      wishes.map((wish, i) => {
        const { value } = best[i];
        const better = costOf(value, wish, direction) < costOf(now, wish, direction) ? value : now;
        return [wish, judge(judged, better.tuning, true)];
      }),
    ) as Record<Wish, TriedTuning>,
  };
}

/** How many settings a search tries on the grid; refinement adds some forty. */
export const triedAtLeast = (direction: Direction): number =>
  CUTOFFS_HZ.coarse.length * BETAS[direction].coarse.length * (direction === 'across' ? HORIZONS_MS.coarse.length : 1);

interface Judged {
  readonly samples: readonly ReplaySample[];
  readonly known: LaterKnown;
  readonly still: readonly Stretch[];
  readonly moving: readonly Stretch[];
  readonly direction: Direction;
}

function judge(
  { samples, known, still, moving, direction }: Judged,
  tuning: TrackerTuning,
  withLag: boolean,
): TriedTuning {
  const track = replay(samples, followerSettingsOf(tuning), tuning.displayDelayMs);
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
