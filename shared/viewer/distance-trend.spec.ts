import { describe, expect, it } from 'vitest';
import { trendOfDistance } from './distance-trend';

/** Distance read against true distance, three rendered heads (computed: bench of the tracker without this correction). */
const READ: readonly (readonly [number, readonly number[]])[] = [
  [500, [1.0062, 1.0176, 1.0059]],
  [600, [1.0088, 1.0141, 1.008]],
  [2000, [0.9922, 0.9879, 0.9917]],
  [3000, [0.9874, 0.974, 0.9935]],
  [4000, [0.9861, 0.9731, 0.9877]],
];

describe('trendOfDistance', () => {
  it('brings each head to 1.4 % of the truth at every distance, and most much nearer', () => {
    const errors = READ.flatMap(([mm, ratios]) => ratios.map((read) => Math.abs(read * trendOfDistance(read * mm, 63) - 1)));
    expect(Math.max(...errors)).toBeLessThan(0.014);
    expect(errors.filter((error) => error < 0.006).length).toBeGreaterThanOrEqual(10);
  });

  it('changes nothing at 1 m, and grows with the distance', () => {
    expect(trendOfDistance(1000, 63)).toBeCloseTo(1, 12);
    expect(trendOfDistance(4000, 63)).toBeGreaterThan(trendOfDistance(2000, 63));
  });

  it('depends on the size of the face in the picture alone', () => {
    expect(trendOfDistance(2000, 126)).toBeCloseTo(trendOfDistance(1000, 63), 12);
  });
});
