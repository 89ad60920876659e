import { indexAt } from './jitter';
import { knownAt, type LaterKnown } from './later-known';
import type { Direction, Track } from './sample';
import type { Stretch } from './stretches';

const AXES = { across: ['x', 'y'], along: ['z'] } as const;
/** Delays tried: ahead is negative. */
const EARLIEST_MS = -120;
const LATEST_MS = 480;
const COARSE_MS = 10;
const FINE_MS = 1;

/** How far what is drawn is from where the viewer is, in motion. */
export interface Stray {
  /** The rms distance from the later-known eye of the same moment, mm. NaN without motion. */
  readonly mm: number;
  /**
   * That distance as a time: divided by the viewer's rms speed. A pure delay has its own length; overshoot and noise add to it, so that
   * no filter looks quick by running ahead.
   */
  readonly ms: number;
}

/** Compares a track with the later-known eye over the stretches in which the viewer moves. */
export function strayInMotion(
  track: Track,
  known: LaterKnown,
  moving: readonly Stretch[],
  direction: Direction,
): Stray {
  const frames = framesIn(track, moving);
  const mm = Math.sqrt(meanSquare(track, known, frames, direction, 0));
  return { mm, ms: (1000 * mm) / rmsSpeed(known, track, frames, direction) };
}

/**
 * The lag in motion, ms: the delay for which the track differs least (rms) from the later-known eye so much earlier, to a fraction of a
 * millisecond by the parabola through the least three. Negative when it runs ahead; NaN without motion.
 */
export function lagInMotionMs(
  track: Track,
  known: LaterKnown,
  moving: readonly Stretch[],
  direction: Direction,
): number {
  const frames = framesIn(track, moving);
  const differs = (delayMs: number) => meanSquare(track, known, frames, direction, delayMs);
  if (Number.isNaN(differs(0))) return NaN;
  const coarse = leastOver(differs, EARLIEST_MS, LATEST_MS, COARSE_MS);
  const fine = leastOver(differs, coarse - COARSE_MS, coarse + COARSE_MS, FINE_MS);
  return fine + FINE_MS * vertex(differs(fine - FINE_MS), differs(fine), differs(fine + FINE_MS));
}

function framesIn({ tMs }: Track, stretches: readonly Stretch[]): number[] {
  const frames: number[] = [];
  for (const { fromMs, toMs } of stretches)
    for (let i = indexAt(tMs, fromMs); i < tMs.length && tMs[i] <= toMs; i++) frames.push(i);
  return frames;
}

function meanSquare(
  track: Track,
  known: LaterKnown,
  frames: readonly number[],
  direction: Direction,
  delayMs: number,
): number {
  let sum = 0;
  let count = 0;
  for (const i of frames) {
    let square = 0;
    for (const axis of AXES[direction]) square += (track[axis][i] - knownAt(known, axis, track.tMs[i] - delayMs)) ** 2;
    if (Number.isNaN(square)) continue;
    sum += square;
    count++;
  }
  return count ? sum / count : NaN;
}

function rmsSpeed(known: LaterKnown, track: Track, frames: readonly number[], direction: Direction): number {
  const speeds = direction === 'across' ? known.acrossMmPerS : known.alongMmPerS;
  let sum = 0;
  let count = 0;
  for (const i of frames) {
    const speed = speeds[Math.round((track.tMs[i] - known.startMs) / known.stepMs)];
    if (!(speed >= 0)) continue;
    sum += speed * speed;
    count++;
  }
  return Math.sqrt(sum / count);
}

function leastOver(f: (at: number) => number, from: number, to: number, step: number): number {
  let best = from;
  let least = Infinity;
  for (let at = from; at <= to; at += step) {
    const value = f(at);
    if (value < least) {
      least = value;
      best = at;
    }
  }
  return best;
}

/** The vertex of the parabola through three values one apart, from the middle one: at most half a step away. */
function vertex(before: number, at: number, after: number): number {
  const bend = before - 2 * at + after;
  return bend > 0 ? Math.max(-0.5, Math.min(0.5, (before - after) / (2 * bend))) : 0;
}
