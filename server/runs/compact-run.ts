import type { RunHeader, RunSample } from '@oriel/shared/contracts/runs';

/** What is kept of a run beside its name, its wall and who recorded it. */
export type RunFacts = Pick<
  RunHeader,
  'machine' | 'tuning' | 'durationMs' | 'sampleCount' | 'frameIntervalP50Ms' | 'frameIntervalP95Ms'
>;

/** A sample as it is kept, without the names: captured, received, eye, crop, detect, landmarks, total. */
export type CompactSample = readonly [number, number, RunSample['eye'], number, number, number, number];

export const compact = (s: RunSample): CompactSample => [
  s.capturedMs,
  s.receivedMs,
  s.eye,
  s.cropMs,
  s.detectMs,
  s.landmarksMs,
  s.totalMs,
];

export const unfold = ([
  capturedMs,
  receivedMs,
  eye,
  cropMs,
  detectMs,
  landmarksMs,
  totalMs,
]: CompactSample): RunSample => ({
  capturedMs,
  receivedMs,
  eye,
  cropMs,
  detectMs,
  landmarksMs,
  totalMs,
});

/** From the first frame captured to the last, ms. */
export function durationOf(samples: readonly RunSample[]): number {
  let first = Infinity;
  let last = -Infinity;
  for (const { capturedMs } of samples) {
    first = Math.min(first, capturedMs);
    last = Math.max(last, capturedMs);
  }
  return Math.max(0, last - first);
}
