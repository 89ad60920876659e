import { jitterMm } from '@oriel/shared/replay/jitter';
import { createTrack, type Track } from '@oriel/shared/replay/sample';
import type { Point3 } from '@oriel/shared/projection/types';

/** Over this long the eye is judged. */
export const JUDGED_MS = 2000;
/** Slower than this, the eye stands still (as in shared/replay/stretches.ts). */
const STILL_MM_PER_S = 30;
const PIECES = 4;
const CAPACITY = 400;

/** The last two seconds of an eye: whether it stands still, and then how much it jitters. */
export class StillJitter {
  private readonly kept = createTrack(CAPACITY);
  private taken = 0;

  add(tMs: number, { x, y, z }: Point3): void {
    const at = this.taken++ % CAPACITY;
    this.kept.tMs[at] = tMs;
    this.kept.x[at] = x;
    this.kept.y[at] = y;
    this.kept.z[at] = z;
  }

  clear(): void {
    this.taken = 0;
  }

  /** Jitter across, mm; null while the eye moves or is known for less than two seconds. */
  at(nowMs: number): number | null {
    const track = this.last(nowMs - JUDGED_MS);
    const { tMs } = track;
    const n = tMs.length;
    if (n < 10 || tMs[n - 1] - tMs[0] < 0.8 * JUDGED_MS) return null;
    if (!isStill(track)) return null;
    return jitterMm(track, [{ fromMs: tMs[0], toMs: tMs[n - 1] + 1 }], 'across');
  }

  private last(sinceMs: number): Track {
    const indices: number[] = [];
    for (let i = Math.max(0, this.taken - CAPACITY); i < this.taken; i++)
      if (this.kept.tMs[i % CAPACITY] >= sinceMs) indices.push(i % CAPACITY);
    const track = createTrack(indices.length);
    for (const key of ['tMs', 'x', 'y', 'z'] as const)
      indices.forEach((from, to) => (track[key][to] = this.kept[key][from]));
    return track;
  }
}

/** Whether the means of each quarter follow one another slowly: someone who turns about has halves with equal means. */
function isStill({ x, y }: Track): boolean {
  const quarter = x.length / PIECES;
  const meanOf = (values: Float64Array, piece: number) => {
    const part = values.subarray(Math.floor(piece * quarter), Math.floor((piece + 1) * quarter));
    return part.reduce((sum, value) => sum + value, 0) / part.length;
  };
  for (let piece = 1; piece < PIECES; piece++) {
    const gone = Math.hypot(meanOf(x, piece) - meanOf(x, piece - 1), meanOf(y, piece) - meanOf(y, piece - 1));
    if (gone / (JUDGED_MS / PIECES / 1000) > STILL_MM_PER_S) return false;
  }
  return true;
}
