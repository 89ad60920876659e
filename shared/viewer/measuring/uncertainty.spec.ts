import { describe, expect, it } from 'vitest';
import { contributions, meanOf, measured, propagate, steadyMeanOf } from './uncertainty';

describe('propagate', () => {
  it('adds in squares for a sum, and by the other factor for a product (by hand: √(0.03² + 0.04²) = 0.05; √((3·0.2)² + (4·0.1)²) = 0.72111)', () => {
    expect(propagate(([a, b]) => a + b, [measured(40, 0.03), measured(42, 0.04)])).toEqual({ value: 82, uncertainty: expect.closeTo(0.05, 12) });
    expect(propagate(([a, b]) => a * b, [measured(4, 0.2), measured(3, 0.1)]).uncertainty).toBeCloseTo(0.72111, 5);
  });

  /** End gauge, JCGM 100:2008 H.1: contributions 25, 9.7, 2.9 and 16.6 nm to first order give 31.7 nm (read in the Guide, rounded there to 32). */
  it('combines the contributions of the Guide’s end gauge', () => {
    const sum = (parts: number[]) => parts.reduce((a, b) => a + b, 50_000_838);
    const parts = [25, 9.7, 2.9, 16.6].map((u) => measured(0, u));
    expect(propagate(sum, parts).uncertainty).toBeCloseTo(31.7, 1);
  });

  it('says what each input adds, with its sign', () => {
    expect(contributions(([a, b]) => 2 * a - b, [measured(1, 0.5), measured(1, 0.25)])).toEqual([1, -0.25]);
  });

  it('refuses an uncertainty below zero', () => {
    expect(() => propagate(([a]) => a, [measured(1, -1)])).toThrowError(expect.objectContaining({ value: 'uncertainty' }));
  });
});

describe('meanOf', () => {
  it('is 5 ± 0.7559 for 2 4 4 4 5 5 7 9 (by hand: squares sum to 32, s = √(32/7), s/√8)', () => {
    const mean = meanOf([2, 4, 4, 4, 5, 5, 7, 9]);
    expect(mean.value).toBe(5);
    expect(mean.uncertainty).toBeCloseTo(0.755929, 6);
  });

  it('asks for two readings', () => {
    expect(() => meanOf([1])).toThrowError(expect.objectContaining({ value: 'readings' }));
  });

  it('stays as unsure as one reading where they follow each other closely (by hand: s = √(32/7))', () => {
    expect(steadyMeanOf([2, 4, 4, 4, 5, 5, 7, 9])).toEqual({ value: 5, uncertainty: expect.closeTo(2.13809, 5) });
  });
});
