import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createOneEuro, lagMs, lowPassWeight, stepOneEuro } from './one-euro';

// Read: the first rows of the authors' conformance set, 120 Hz, mincutoff 1, beta 0.1, dcutoff 1, tolerance 1e-4.
const NOISY = [
  -0.0385099, -0.0280664, 0.048622, 0.111498, 0.053026, 0.120548, 0.00972308, 0.074193, -0.0236801, 0.0462396,
  0.0892027, 0.158329,
];
const FILTERED = [
  -0.0385099, -0.0379872, -0.0334427, -0.0252696, -0.0207099, -0.0119912, -0.0106507, -0.00526521, -0.00641239,
  -0.00308863, 0.00291027, 0.0135545,
];
const SETTINGS = { minCutoffHz: 1, beta: 0.1, derivativeCutoffHz: 1 };

describe('lowPassWeight', () => {
  it('is alpha of the paper (computed): 1 Hz at 30 and at 60 samples a second', () => {
    expect(lowPassWeight(1, 30)).toBeCloseTo(0.173171, 6);
    expect(lowPassWeight(1, 60)).toBeCloseTo(0.094793, 6);
  });
});

describe('stepOneEuro', () => {
  it('follows the authors’ conformance rows', () => {
    const state = createOneEuro();
    NOISY.forEach((noisy, i) => {
      expect(Math.abs(stepOneEuro(state, noisy, (i * 1000) / 120, SETTINGS) - FILTERED[i])).toBeLessThan(1e-4);
    });
  });

  it('lags behind a ramp by 1/(2 pi fc), from uneven samples too', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 5, max: 80 }), { minLength: 400, maxLength: 400 }), (intervals) => {
        const state = createOneEuro();
        let tMs = 0;
        for (const interval of [0, ...intervals]) {
          tMs += interval;
          stepOneEuro(state, 3 * tMs, tMs, { minCutoffHz: 2, beta: 0, derivativeCutoffHz: 1 });
        }
        expect(3 * tMs - state.value).toBeCloseTo(3 * lagMs(state), 6);
        expect(lagMs(state)).toBeCloseTo(79.577472, 6); // computed: 1000/(4 pi)
      }),
      { numRuns: 20 },
    );
  });

  it('ignores a sample that comes no later than the last', () => {
    const state = createOneEuro();
    stepOneEuro(state, 1, 100, SETTINGS);
    const before = { ...state };
    expect(stepOneEuro(state, 50, 100, SETTINGS)).toBe(1);
    expect(stepOneEuro(state, 50, 90, SETTINGS)).toBe(1);
    expect(state).toEqual(before);
  });
});
