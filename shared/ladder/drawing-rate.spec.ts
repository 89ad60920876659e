import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createDrawingRate, type DrawingChange, type DrawingRate } from './drawing-rate';

const hour = 3600;

/** A machine that can compose so many frames a second, and draws no more than it is asked to on a screen of 60. */
function run(rate: DrawingRate, canPerS: (s: number) => number, fromS: number, untilS: number): DrawingChange[] {
  const changes: DrawingChange[] = [];
  for (let s = fromS; s < untilS; s++) {
    const change = rate.second(s * 1000, Math.min(60, rate.mostPerS, canPerS(s)));
    if (change) changes.push(change);
  }
  return changes;
}

describe('the rate of drawing', () => {
  it('draws at every refresh where that succeeds', () => {
    expect(run(createDrawingRate(), () => 60, 0, hour)).toEqual([]);
  });

  it('bears the slow seconds of a page that loads, and single ones later', () => {
    expect(run(createDrawingRate(), (s) => (s < 3 || s % 3 === 0 ? 10 : 60), 0, hour)).toEqual([]);
  });

  it('takes the rate that succeeds, at once', () => {
    const half = createDrawingRate();
    run(half, () => 33, 0, 20);
    expect(half.mostPerS).toBe(30);
    expect(run(createDrawingRate(), () => 18, 0, 20)).toMatchObject([{ toPerS: 20, reason: '18 frames a second were drawn' }]);
    expect(run(createDrawingRate(), () => 9, 0, 20)).toMatchObject([{ toPerS: 15 }]);
  });

  it('tries no more where the least is more than succeeds', () => {
    const rate = createDrawingRate();
    run(rate, () => 13, 0, 20);
    expect(run(rate, () => 13, 20, hour)).toEqual([]);
  });

  it('comes back when the load has gone', () => {
    const rate = createDrawingRate();
    run(rate, (s) => (s < 60 ? 18 : 60), 0, 240);
    expect(rate.mostPerS).toBe(Infinity);
  });

  it('settles under any constant load: after an hour at most 3 trials an hour, each taken back', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 240 }), (canPerS) => {
        const rate = createDrawingRate();
        run(rate, () => canPerS, 0, hour);
        expect(run(rate, () => canPerS, hour, 4 * hour).length).toBeLessThanOrEqual(3 * 3 * 2);
      }),
    );
  });

  it('changes at most 40 times in an hour, whatever the load', () => {
    fc.assert(
      fc.property(fc.array(fc.record({ forS: fc.integer({ min: 1, max: 300 }), canPerS: fc.integer({ min: 1, max: 70 }) }), { minLength: 12, maxLength: 60 }), (loads) => {
        const can = loads.flatMap(({ forS, canPerS }) => Array<number>(forS).fill(canPerS));
        expect(run(createDrawingRate(), (s) => can[s % can.length], 0, hour).length).toBeLessThanOrEqual(40);
      }),
      { numRuns: 300 },
    );
  });
});
