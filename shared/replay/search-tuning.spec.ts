import { describe, expect, it } from 'vitest';
import { usualTuning } from '../contracts/new-wall';
import { leastOverGrid } from './least-over-grid';
import { searchTuning, TooLittleMotion, triedAtLeast, tryTuning } from './search-tuning';
import { madeUpRun, standsThenWalks } from './testing';
import { mostJitterMm, unbeaten, wishes } from './wishes';

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

describe('a long run', () => {
  const path = (tMs: number) => standsThenWalks(tMs % 14_000);
  const runOf = (untilMs: number) => madeUpRun(path, { untilMs, lateMs: 40, across: 0.5, along: 5 });

  it('says what a short one of the same motion says', () => {
    const [short, long] = [42_000, 600_000].map((untilMs) => searchTuning(runOf(untilMs), usualTuning, 'across'));
    for (const wish of wishes) {
      expect(Math.abs(long.best[wish].jitterMm / short.best[wish].jitterMm - 1)).toBeLessThan(0.2);
      expect(Math.abs(long.best[wish].strayMs / short.best[wish].strayMs - 1)).toBeLessThan(0.2);
    }
  });
});

describe('tuning found in a run', () => {
  const run = madeUpRun(standsThenWalks, { untilMs: 14_000, lateMs: 40, across: 0.5, along: 5 });
  const across = searchTuning(run, usualTuning, 'across');

  it('is the same every time, and quicker strays no more than today’s', () => {
    expect(searchTuning(run, usualTuning, 'across')).toEqual(across);
    expect(across.best.quicker.strayMs).toBeLessThanOrEqual(1.02 * across.today.strayMs);
  });

  it('judges a setting by itself as the search judged it', () => {
    for (const tried of [across.today, across.best.calmer]) expect(tryTuning(run, tried.tuning, 'across')).toEqual(tried);
  });

  it('never looks farther ahead than a look and a frame of the screen can be old: 40 + 33 + 17 ms, which 120 ms covers', () => {
    for (const wish of wishes) expect(across.best[wish].tuning.longestHorizonMs).toBeLessThanOrEqual(120);
  });

  it('marks three different points of the curve, each calmer than the one before by a share that is seen', () => {
    const { calmer, balanced, quicker } = across.best;
    expect(balanced.jitterMm).toBeLessThanOrEqual(0.81 * quicker.jitterMm);
    expect(calmer.jitterMm).toBeLessThanOrEqual(0.61 * balanced.jitterMm);
    expect(balanced.strayMs).toBeGreaterThan(quicker.strayMs);
    expect(calmer.strayMs).toBeGreaterThan(balanced.strayMs);
    expect(across.curve.length).toBeGreaterThan(5);
    const tunings = across.curve.map(({ tuning }) => tuning);
    for (const { tuning } of [calmer, balanced, quicker]) expect(tunings).toContainEqual(tuning);
  });

  it('marks three different points too where hardly anything can be calmed: someone who sways as they stand', () => {
    const swaying = (tMs: number): [number, number, number] => {
      const [x, y, z] = standsThenWalks(tMs);
      return [x + 3 * Math.sin((2 * Math.PI * tMs) / 900), y, z];
    };
    const { calmer, balanced, quicker } = searchTuning(
      madeUpRun(swaying, { untilMs: 14_000, lateMs: 40, across: 0.1, along: 1 }),
      usualTuning,
      'across',
    ).best;
    expect(calmer.jitterMm).toBeLessThan(balanced.jitterMm);
    expect(balanced.jitterMm).toBeLessThan(quicker.jitterMm);
    expect(calmer.strayMs).toBeGreaterThan(balanced.strayMs);
    expect(balanced.strayMs).toBeGreaterThan(quicker.strayMs);
  });

  it('asks for a share of the jitter before, or for part of the way to the calmest where that is too much (computed)', () => {
    const before = { jitterMm: 2, strayMs: 30 };
    expect(mostJitterMm('balanced', before, 0.2)).toBeCloseTo(1.6, 9);
    expect(mostJitterMm('calmer', before, 0.2)).toBeCloseTo(1.2, 9);
    expect(mostJitterMm('balanced', before, 1.7)).toBeCloseTo(1.85, 9);
    expect(mostJitterMm('calmer', before, 1.7)).toBeCloseTo(1.73, 9);
    // A tenth of what there is is not seen: it may cost no lag.
    expect(mostJitterMm('calmer', before, 1.9)).toBe(Infinity);
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
