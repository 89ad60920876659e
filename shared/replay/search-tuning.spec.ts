import { describe, expect, it } from 'vitest';
import { usualTuning } from '../contracts/new-wall';
import { leastOverGrid } from './least-over-grid';
import { searchTuning, TooLittleMotion, triedAtLeast } from './search-tuning';
import { madeUpRun, standsThenWalks } from './testing';
import { costOf, unbeaten, wishes } from './wishes';

describe('the search', () => {
  it('finds the optimum of a low-pass: jitter^2 = a fc, lag = b/fc, least at fc = (2 b^2/a)^(1/3) (computed)', () => {
    const [a, b] = [0.5, 1.7];
    const { best } = leastOverGrid(
      [{ coarse: [0.25, 0.5, 1, 2, 4, 8] }, { coarse: [0, 1, 2, 4] }],
      ([fc, other]) => a * fc + (b / fc) ** 2 + (other - 3) ** 2,
      [(cost) => cost],
    );
    expect(best[0].point[0] / Math.cbrt((2 * b * b) / a)).toBeCloseTo(1, 1);
    expect(best[0].point[1]).toBeCloseTo(3, 0);
  });

  it('asks about every point of the grid once, in order, and about the same points again the next time', () => {
    const asked: string[] = [];
    const dimensions = [{ coarse: [1, 2] }, { coarse: [0, 5] }];
    const search = () =>
      leastOverGrid(dimensions, (point) => (asked.push(point.join()), point[0] + point[1]), [(cost) => cost]);
    const first = search();
    expect(asked.slice(0, 4)).toEqual(['1,0', '1,5', '2,0', '2,5']);
    expect(new Set(asked).size).toBe(asked.length);
    expect(search()).toEqual(first);
  });

  it('keeps only what nothing beats', () => {
    const point = (jitterMm: number, strayMs: number) => ({ jitterMm, strayMs });
    expect(unbeaten([point(2, 5), point(1, 9), point(2, 6), point(3, 5), point(4, 1), point(NaN, 0)])).toEqual([
      point(1, 9),
      point(2, 5),
      point(4, 1),
    ]);
  });
});

describe('tuning found in a run', () => {
  const run = madeUpRun(standsThenWalks, { untilMs: 14_000, lateMs: 40, across: 0.5, along: 5 });
  const across = searchTuning(run, usualTuning, 'across');

  it('is never worse than today’s, for any wish, and the same every time', () => {
    for (const wish of wishes)
      expect(costOf(across.best[wish], wish, 'across')).toBeLessThanOrEqual(costOf(across.today, wish, 'across'));
    expect(searchTuning(run, usualTuning, 'across')).toEqual(across);
  });

  it('is calmer for who wants calm and quicker for who wants it quick', () => {
    expect(across.best.calmer.jitterMm).toBeLessThanOrEqual(across.best.balanced.jitterMm);
    expect(across.best.quicker.strayMs).toBeLessThanOrEqual(across.best.balanced.strayMs);
    expect(across.curve.length).toBeGreaterThan(5);
    expect(across.best.balanced.lagMs).toBeGreaterThan(-60);
    expect(across.best.balanced.lagMs).toBeLessThan(60);
  });

  it('changes only the direction asked about', () => {
    const along = searchTuning(run, usualTuning, 'along');
    expect(along.best.calmer.tuning.filter.across).toEqual(usualTuning.filter.across);
    expect(along.best.calmer.tuning.longestHorizonMs).toBe(usualTuning.longestHorizonMs);
  });

  it('tells how far it has come', () => {
    const steps: number[] = [];
    searchTuning(run, usualTuning, 'along', (tried) => steps.push(tried));
    expect(steps.length).toBeGreaterThanOrEqual(triedAtLeast('along'));
    expect(steps).toEqual(steps.map((_, i) => i + 1));
  });

  it('says what to record when a run has no motion or no rest', () => {
    expect(() =>
      searchTuning(
        madeUpRun(() => [0, 0, 1000]),
        usualTuning,
        'across',
      ),
    ).toThrow(TooLittleMotion);
    const restless = madeUpRun((t) => [300 * Math.sin(t / 300), 0, 1000]);
    expect(() => searchTuning(restless, usualTuning, 'across')).toThrow('stand still');
  });
});
