import type { FollowerSettings } from '../smoothing/follower-settings';
import { indexAt } from './jitter';
import { replay } from './replay';
import { createTrack, type ReplaySample, type Track } from './sample';
import { totalMs, type Stretch } from './stretches';

/*
 * A long run says the same of a setting as a part of it, in a part of the time: rest and motion come again and again. The run is cut into
 * windows of equal length; windows are taken from all over it, in the order of the bit-reversed count (J. van der Corput, 1935), until they
 * hold enough of both. Each is replayed by itself from a little before its beginning, when whoever is there has been approached.
 */

const WINDOW_MS = 10_000;
const RUN_IN_MS = 2000;
/** Samples of so much later still belong to a window: they were on their way. */
const UNDERWAY_MS = 500;
/** Rest and motion judged at least, where the run has so much. */
const ENOUGH_MS = 12_000;

/** One window of a run: what is replayed, and from when to when it counts. */
interface Window extends Stretch {
  readonly samples: readonly ReplaySample[];
}

/** The parts of a run that are judged, with what rest and motion they hold. */
export interface Excerpt {
  readonly windows: readonly Window[];
  readonly still: readonly Stretch[];
  readonly moving: readonly Stretch[];
}

/** The whole run as an excerpt. */
export const wholeRun = (
  samples: readonly ReplaySample[],
  still: readonly Stretch[],
  moving: readonly Stretch[],
): Excerpt => ({ windows: [{ samples, fromMs: -Infinity, toMs: Infinity }], still, moving });

/** An excerpt with 12 s each of rest and of motion, or a little more; the whole run where that is little longer. */
export function excerptOf(
  samples: readonly ReplaySample[],
  still: readonly Stretch[],
  moving: readonly Stretch[],
): Excerpt {
  const startMs = samples[0]?.capturedMs ?? 0;
  const lengthMs = (samples[samples.length - 1]?.capturedMs ?? 0) - startMs;
  const count = Math.floor(lengthMs / WINDOW_MS);
  const taken: Stretch[] = [];
  let [rest, motion] = [0, 0];
  for (const k of fromAllOver(count)) {
    const window = { fromMs: startMs + k * WINDOW_MS, toMs: startMs + (k + 1) * WINDOW_MS };
    const [restHere, motionHere] = [totalMs(within(still, window)), totalMs(within(moving, window))];
    if ((rest >= ENOUGH_MS || restHere === 0) && (motion >= ENOUGH_MS || motionHere === 0)) continue;
    taken.push(window);
    rest += restHere;
    motion += motionHere;
  }
  if (2 * taken.length >= count) return wholeRun(samples, still, moving);
  taken.sort((a, b) => a.fromMs - b.fromMs);
  return {
    windows: taken.map((window) => ({ ...window, samples: samplesOf(samples, window) })),
    still: taken.flatMap((window) => within(still, window)),
    moving: taken.flatMap((window) => within(moving, window)),
  };
}

/** The windows replayed with these settings, one after the other in one track. */
export function replayExcerpt({ windows }: Excerpt, settings: FollowerSettings, litAfterMs: number): Track {
  const tracks = windows.map(({ samples, fromMs, toMs }) => {
    const track = replay(samples, settings, litAfterMs);
    return { track, from: indexAt(track.tMs, fromMs), to: indexAt(track.tMs, toMs) };
  });
  const all = createTrack(tracks.reduce((length, { from, to }) => length + to - from, 0));
  let at = 0;
  for (const { track, from, to } of tracks) {
    for (const key of ['tMs', 'x', 'y', 'z'] as const) all[key].set(track[key].subarray(from, to), at);
    at += to - from;
  }
  return all;
}

/** 0 to count - 1, each once: every beginning of the order is spread over the whole. */
function fromAllOver(count: number): number[] {
  const bits = Math.max(1, Math.ceil(Math.log2(count + 1)));
  const reversed = (k: number): number => {
    let result = 0;
    for (let bit = 0; bit < bits; bit++) result = (result << 1) | ((k >> bit) & 1);
    return result;
  };
  return Array.from({ length: 1 << bits }, (_, k) => reversed(k)).filter((k) => k < count);
}

const within = (stretches: readonly Stretch[], window: Stretch): Stretch[] =>
  stretches
    .map(({ fromMs, toMs }) => ({ fromMs: Math.max(fromMs, window.fromMs), toMs: Math.min(toMs, window.toMs) }))
    .filter(({ fromMs, toMs }) => toMs > fromMs);

const samplesOf = (samples: readonly ReplaySample[], { fromMs, toMs }: Stretch): ReplaySample[] =>
  samples.filter(({ capturedMs, receivedMs }) => capturedMs >= fromMs - RUN_IN_MS && receivedMs <= toMs + UNDERWAY_MS);
