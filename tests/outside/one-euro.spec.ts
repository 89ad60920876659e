import { OneEuroFilter } from '1eurofilter';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createOneEuro, stepOneEuro } from '@oriel/shared/smoothing/one-euro';

/** Reference: the filter's own authors' npm package, which takes seconds. */
describe('stepOneEuro beside the authors’ own filter', () => {
  it('gives the same values for any samples at any intervals and settings', () => {
    const sample = fc.tuple(fc.integer({ min: 1, max: 200 }), fc.double({ min: -1000, max: 1000, noNaN: true }));
    const cutoff = fc.double({ min: 0.1, max: 10, noNaN: true });
    fc.assert(
      fc.property(
        fc.array(sample, { minLength: 2, maxLength: 80 }),
        cutoff,
        fc.double({ min: 0, max: 1, noNaN: true }),
        cutoff,
        (samples, minCutoffHz, beta, derivativeCutoffHz) => {
          const reference = new OneEuroFilter(30, minCutoffHz, beta, derivativeCutoffHz);
          const state = createOneEuro();
          let tMs = 1000;
          for (const [interval, value] of samples) {
            tMs += interval;
            const ours = stepOneEuro(state, value, tMs, { minCutoffHz, beta, derivativeCutoffHz });
            expect(ours).toBeCloseTo(reference.filter(value, tMs / 1000), 6);
          }
        },
      ),
    );
  });
});
