import { onOneClock } from './capture-time';
import { laterKnown } from './later-known';
import type { ReplaySample } from './sample';
import { movingStretches, stillStretches, totalMs } from './stretches';

/** How long somebody does in a run what replay judges it by, ms: stands still, moves from side to side or up and down, comes nearer or goes back. */
export interface RunShows {
  readonly stillMs: number;
  readonly acrossMs: number;
  readonly alongMs: number;
}

/** Less than this of rest or of motion says nothing. */
export const LEAST_JUDGED_MS = 1000;

/** With so much of each the figures hold. (Practice: two pieces and more of the two seconds jitter is judged by, and a few turns to and fro.) */
export const WELL_SHOWN: RunShows = { stillMs: 5000, acrossMs: 3000, alongMs: 3000 };

export const NOTHING_SHOWN: RunShows = { stillMs: 0, acrossMs: 0, alongMs: 0 };

export function whatItShows(samples: readonly ReplaySample[]): RunShows {
  const known = laterKnown(onOneClock(samples));
  return {
    stillMs: totalMs(stillStretches(known)),
    acrossMs: totalMs(movingStretches(known, 'across')),
    alongMs: totalMs(movingStretches(known, 'along')),
  };
}

export type Judged = 'too-little' | 'roughly' | 'well';

/** How far something of a run can be judged. */
export const judgedBy = (shows: RunShows, what: keyof RunShows): Judged =>
  shows[what] < LEAST_JUDGED_MS ? 'too-little' : shows[what] < WELL_SHOWN[what] ? 'roughly' : 'well';

/** Whether replay finds settings for one direction at least. */
export const canBeReplayed = (shows: RunShows): boolean =>
  judgedBy(shows, 'stillMs') !== 'too-little' &&
  (judgedBy(shows, 'acrossMs') !== 'too-little' || judgedBy(shows, 'alongMs') !== 'too-little');

/** Whether there is enough of everything. */
export const showsAll = (shows: RunShows): boolean =>
  (Object.keys(WELL_SHOWN) as (keyof RunShows)[]).every((what) => judgedBy(shows, what) === 'well');
