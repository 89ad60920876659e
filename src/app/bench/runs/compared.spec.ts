import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { madeUpRun, standsThenWalks } from '@oriel/shared/replay/testing';
import { compared } from './compared';
import type { WholeRun } from './runs-store';

const whole = (lateMs: number, totalMs: number): WholeRun => {
  const stages = { cropMs: 1, detectMs: 2, landmarksMs: 3, totalMs };
  const samples = madeUpRun(standsThenWalks, { untilMs: 14_000, lateMs, across: 0.5, along: 5 }).map((sample) => ({ ...sample, ...stages }));
  const run = { id: '', name: '', wallId: null, machine: '', tuning: usualTuning, recordedAt: '', recordedBy: '', durationMs: 0, sampleCount: 0 };
  return { run: { ...run, frameIntervalP50Ms: 0, frameIntervalP95Ms: 0 }, samples };
};
const row = (a: WholeRun, b: WholeRun, name: string) => compared(a, b).find((one) => one.name === name)!;

describe('two runs in figures', () => {
  it('says which is better where it is by a tenth and more', () => {
    expect(row(whole(40, 20), whole(40, 10), 'One look, ms')).toMatchObject({ a: '20.0 / 20.0', b: '10.0 / 10.0', better: 'b' });
    expect(row(whole(40, 10), whole(40, 10.5), 'One look, ms').better).toBeNull();
    const uneven = whole(40, 8);
    const peaks = { ...uneven, samples: uneven.samples.map((sample, i) => ({ ...sample, totalMs: i % 10 ? 8 : 90 })) };
    expect(row(whole(40, 10), peaks, 'One look, ms').better).toBeNull();
    expect(row(whole(40, 10), whole(120, 10), 'Capture to the page, ms').better).toBe('a');
  });

  it('says not known here, and why, where the capture is not known; not shown where frames were not counted', () => {
    const unknown = row(whole(40, 10), whole(0, 10), 'Capture to the page, ms');
    expect(unknown).toMatchObject({ a: '40.0 / 40.0', b: 'not known here', better: null });
    expect(unknown.why).toContain('did not tell');
    expect(row(whole(40, 10), whole(40, 10), 'Capture to the page, ms').why).toBeUndefined();
    expect(row(whole(40, 10), whole(40, 10), 'Between frames drawn, ms').a).toBe('not shown');
  });
});
