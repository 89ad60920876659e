import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { madeUpRun, standsThenWalks } from '@oriel/shared/replay/testing';
import type { WholeRun } from './runs-store';
import { slowerWords } from './slower';

const whole = (name: string, lateMs: number, totalMs: number): WholeRun => {
  const stages = { cropMs: 1, detectMs: 2, landmarksMs: 3, totalMs };
  const samples = madeUpRun(standsThenWalks, { untilMs: 10_000, lateMs }).map((sample) => ({ ...sample, ...stages }));
  const run = { id: name, name, wallId: null, machine: '', tuning: usualTuning, recordedAt: '', recordedBy: '', durationMs: 0, sampleCount: 0 };
  return { run: { ...run, frameIntervalP50Ms: 0, frameIntervalP95Ms: 0 }, samples };
};

describe('whether one machine was plainly slower', () => {
  it('is said of the slower one, whichever comes first', () => {
    const [quick, slow] = [whole('A', 40, 10), whole('B', 300, 10)];
    expect(slowerWords(quick, slow)).toContain('plainly slower in B: 300 ms from capture to the page against 40');
    expect(slowerWords(slow, quick)).toContain('slower in B');
    expect(slowerWords(whole('A', 0, 90), whole('B', 0, 10))).toContain('slower in A: 90 ms for one look against 10');
  });

  it('is not said of what settings may do, nor of little', () => {
    expect(slowerWords(whole('A', 60, 10), whole('B', 100, 10))).toBe('');
    expect(slowerWords(whole('A', 10, 4), whole('B', 30, 12))).toBe('');
  });
});
