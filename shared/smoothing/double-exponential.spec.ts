import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createDoubleExponential, predict, slopeOf, stepDoubleExponential } from './double-exponential';

describe('double exponential prediction', () => {
  it('is LaViola’s formula, term by term (read): one sample a ms, a = 0.25, three samples ahead', () => {
    const a = 0.25;
    const timeConstant = (1 - a) / a;
    const samples = [2, 3.5, 1, 4, 4.5, -2, 7];
    const state = createDoubleExponential();
    let [s, s2] = [samples[0], samples[0]];
    samples.forEach((p, i) => {
      stepDoubleExponential(state, p, i, timeConstant);
      if (i > 0) {
        s = a * p + (1 - a) * s;
        s2 = a * s + (1 - a) * s2;
      }
      const k = (a * 3) / (1 - a);
      expect(predict(state, 3, timeConstant)).toBeCloseTo((2 + k) * s - (1 + k) * s2, 12);
    });
  });

  it('predicts the ramp 2t exactly once settled, at any horizon and from uneven samples', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 5, max: 80 }), { minLength: 300, maxLength: 300 }),
        fc.integer({ min: 0, max: 300 }),
        (intervals, horizonMs) => {
          const state = createDoubleExponential();
          let tMs = 0;
          for (const interval of intervals) {
            tMs += interval;
            stepDoubleExponential(state, 2 * tMs, tMs, 60);
          }
          expect(predict(state, horizonMs, 60)).toBeCloseTo(2 * (tMs + horizonMs), 6);
          expect(slopeOf(state, 60)).toBeCloseTo(2, 9);
        },
      ),
      { numRuns: 30 },
    );
  });

  it('ignores a sample that comes no later than the last', () => {
    const state = createDoubleExponential();
    stepDoubleExponential(state, 5, 10, 60);
    stepDoubleExponential(state, 50, 10, 60);
    expect(predict(state, 0, 60)).toBe(5);
  });
});
