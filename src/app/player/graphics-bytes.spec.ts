import { describe, expect, it } from 'vitest';
import { mippedBytes, pixelBytes } from './graphics-bytes';

describe('bytes on the graphics side', () => {
  it('counts every level to the single pixel', () => {
    // By hand: 4 x 2, 2 x 1, 1 x 1 pixels (computed).
    expect(mippedBytes(4, 2)).toBe(4 * (8 + 2 + 1));
    expect(mippedBytes(1, 1)).toBe(4);
    // Odd edges round down: 5 x 3, 2 x 1, 1 x 1.
    expect(mippedBytes(5, 3)).toBe(4 * (15 + 2 + 1));
  });

  it('comes to a third more than the picture where edges are powers of two', () => {
    // The sum of 1/4^k for k = 0 to 11 (computed).
    expect(mippedBytes(2048, 2048)).toBe((4 ** 12 - 1) / 3 * 4);
    expect(mippedBytes(2048, 2048) / pixelBytes(2048, 2048)).toBeCloseTo(4 / 3, 6);
  });
});
