import { Backoff } from './backoff';

describe('Backoff', () => {
  it('doubles up to the longest, and starts anew after a success', () => {
    const backoff = new Backoff(1000, 30_000);
    expect(Array.from({ length: 7 }, () => backoff.next(0.5))).toEqual([1000, 2000, 4000, 8000, 16_000, 30_000, 30_000]);
    backoff.succeeded();
    expect(backoff.next(0)).toBe(800);
    expect(backoff.next(1)).toBeCloseTo(2400);
  });
});
