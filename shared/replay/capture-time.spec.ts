import { describe, expect, it } from 'vitest';
import { captureKnown, onOneClock } from './capture-time';
import type { ReplaySample } from './sample';

const sample = (receivedMs: number, underWayMs: number): ReplaySample => ({
  capturedMs: receivedMs - underWayMs,
  receivedMs,
  eye: [0, 0, 1000],
});

describe('when a sample was captured', () => {
  it('is not known of one that would have come in no time', () => {
    expect([sample(100, 0), sample(100, 0.01), sample(100, 40)].map(captureKnown)).toEqual([false, true, true]);
  });

  it('is put on one clock where the first of them are not known', () => {
    const run = [sample(0, 0), sample(33, 0), sample(66, 38), sample(99, 40), sample(132, 44)];
    // By hand: the median of 38, 40 and 44 is 40.
    expect(onOneClock(run).map(({ capturedMs }) => capturedMs)).toEqual([-40, -7, 28, 59, 88]);
  });

  it('stays as it is where all or none are known', () => {
    for (const underWayMs of [0, 40]) {
      const run = [sample(0, underWayMs), sample(33, underWayMs)];
      expect(onOneClock(run)).toEqual(run);
    }
  });
});
