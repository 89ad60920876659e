import type { RunSample } from '../contracts/runs';

/** What replay needs of a run's samples, in the order in which they were captured: times in ms on one clock, the eye in mm or null. */
export type ReplaySample = Pick<RunSample, 'capturedMs' | 'receivedMs' | 'eye'>;

/** The viewer moves across the glass (x and y) or along its normal (z); the two are filtered apart and judged apart. */
export type Direction = 'across' | 'along';

/** A place in time: parallel arrays, times rising. */
export interface Track {
  readonly tMs: Float64Array;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly z: Float64Array;
}

export function createTrack(length: number): Track {
  return {
    tMs: new Float64Array(length),
    x: new Float64Array(length),
    y: new Float64Array(length),
    z: new Float64Array(length),
  };
}
