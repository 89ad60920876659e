import type { LaterKnown } from './later-known';
import type { Direction } from './sample';

/** From one moment to another, ms. */
export interface Stretch {
  readonly fromMs: number;
  readonly toMs: number;
}

/*
 * The rule. The viewer *stands still* while the later-known eye is slower than 30 mm/s across and 60 mm/s along (someone who stands
 * sways by some 10 mm/s; the noise of a face at 1 m makes 2 and 20), for at least a second, the first half second left out because the
 * follower is then still coming to rest. They *move* while it is faster than 100 mm/s in the direction asked about, for at least 0.3 s.
 * (The limits are practice.)
 */
const STILL_ACROSS_MM_PER_S = 30;
const STILL_ALONG_MM_PER_S = 60;
const LEAST_STILL_MS = 1000;
const SETTLING_MS = 500;
const MOVING_MM_PER_S = 100;
const LEAST_MOVING_MS = 300;

export function stillStretches(known: LaterKnown): Stretch[] {
  const still = (i: number) =>
    known.acrossMmPerS[i] < STILL_ACROSS_MM_PER_S && known.alongMmPerS[i] < STILL_ALONG_MM_PER_S;
  return stretchesWhere(known, still, LEAST_STILL_MS + SETTLING_MS).map(({ fromMs, toMs }) => ({
    fromMs: fromMs + SETTLING_MS,
    toMs,
  }));
}

export function movingStretches(known: LaterKnown, direction: Direction): Stretch[] {
  const speeds = direction === 'across' ? known.acrossMmPerS : known.alongMmPerS;
  return stretchesWhere(known, (i) => speeds[i] > MOVING_MM_PER_S, LEAST_MOVING_MS);
}

/** What the stretches come to, ms. */
export const totalMs = (stretches: readonly Stretch[]): number =>
  stretches.reduce((sum, { fromMs, toMs }) => sum + toMs - fromMs, 0);

function stretchesWhere(
  { startMs, stepMs, place }: LaterKnown,
  holds: (i: number) => boolean,
  leastMs: number,
): Stretch[] {
  const found: Stretch[] = [];
  const length = place.tMs.length;
  for (let from = 0; from < length; from++) {
    let to = from;
    while (to < length && holds(to)) to++;
    if ((to - from) * stepMs >= leastMs)
      found.push({ fromMs: startMs + from * stepMs, toMs: startMs + (to - 1) * stepMs });
    from = to;
  }
  return found;
}
