import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure } from '../projection/testing/arbitraries';
import { largestEigenvector } from './largest-eigenvector';

const foremost = (matrix: number[]) => {
  const out = new Float64Array(4);
  largestEigenvector(Float64Array.from(matrix), new Float64Array(16), out);
  return out;
};

describe('largestEigenvector', () => {
  it('is (1,1,1,1)/2 for the matrix of ones (by hand: eigenvalues 4, 0, 0, 0)', () => {
    const v = foremost(Array(16).fill(1));
    for (const entry of v) expect(Math.abs(entry)).toBeCloseTo(0.5, 12);
    expect(v[0] * v[1]).toBeGreaterThan(0);
  });

  it('takes the largest, not the largest in size (by hand: diagonal)', () => {
    expect([...foremost([1, 0, 0, 0, 0, -9, 0, 0, 0, 0, 2, 0, 0, 0, 0, 0])].map(Math.abs)).toEqual([0, 0, 1, 0]);
  });

  it('gives A v = lambda v, and no direction has a greater v A v', () => {
    fc.assert(
      fc.property(
        fc.array(figure(-10, 10), { minLength: 10, maxLength: 10 }),
        fc.array(figure(-1, 1), { minLength: 4, maxLength: 4 }),
        (entries, other) => {
          const a = Array<number>(16).fill(0);
          let next = 0;
          for (let i = 0; i < 4; i++) for (let j = i; j < 4; j++) a[4 * i + j] = a[4 * j + i] = entries[next++];
          const times = (v: ArrayLike<number>) =>
            [0, 1, 2, 3].map((i) => [0, 1, 2, 3].reduce((sum, j) => sum + a[4 * i + j] * v[j], 0));
          const dot = (v: ArrayLike<number>, w: ArrayLike<number>) =>
            [0, 1, 2, 3].reduce((sum, i) => sum + v[i] * w[i], 0);
          const v = foremost(a);
          const lambda = dot(v, times(v));
          expect(dot(v, v)).toBeCloseTo(1, 10);
          times(v).forEach((entry, i) => expect(entry).toBeCloseTo(lambda * v[i], 8));
          expect(dot(other, times(other))).toBeLessThanOrEqual(lambda * dot(other, other) + 1e-8);
        },
      ),
    );
  });
});
