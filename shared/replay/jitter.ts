import type { Direction, Track } from './sample';
import type { Stretch } from './stretches';

/** Standing still is judged over pieces of this length: sway slower than that is the viewer's own and is followed. */
const PIECE_MS = 2000;
const AXES = { across: ['x', 'y'], along: ['z'] } as const;

/**
 * Jitter at rest: the rms distance of the track from a straight line in time, fitted by least squares to each piece of up to 2 s in which
 * the viewer stands still, in mm; x and y together, or z. NaN where they never stand still.
 */
export function jitterMm(track: Track, still: readonly Stretch[], direction: Direction): number {
  let sum = 0;
  let count = 0;
  for (const { fromMs, toMs } of still) {
    const pieces = Math.max(1, Math.round((toMs - fromMs) / PIECE_MS));
    const lengthMs = (toMs - fromMs) / pieces;
    for (let piece = 0; piece < pieces; piece++) {
      const from = indexAt(track.tMs, fromMs + piece * lengthMs);
      const to = indexAt(track.tMs, fromMs + (piece + 1) * lengthMs);
      if (to - from < 3) continue;
      for (const axis of AXES[direction]) sum += squaresAboutLine(track.tMs, track[axis], from, to);
      count += to - from;
    }
  }
  return count ? Math.sqrt(sum / count) : NaN;
}

/** The first index whose time is not before `tMs`. */
export function indexAt(times: Float64Array, tMs: number): number {
  let low = 0;
  let high = times.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (times[middle] < tMs) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Sum of squares about the least-squares line through values[from..to). */
function squaresAboutLine(times: Float64Array, values: Float64Array, from: number, to: number): number {
  const n = to - from;
  let meanT = 0;
  let mean = 0;
  for (let i = from; i < to; i++) {
    meanT += times[i] / n;
    mean += values[i] / n;
  }
  let tt = 0;
  let tv = 0;
  let vv = 0;
  for (let i = from; i < to; i++) {
    const t = times[i] - meanT;
    const v = values[i] - mean;
    tt += t * t;
    tv += t * v;
    vv += v * v;
  }
  return Math.max(0, tt > 0 ? vv - (tv * tv) / tt : vv);
}
