import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure } from '../projection/testing/arbitraries';
import { createBlurHold, holdThroughBlur } from './blur-hold';

const FRAME_MS = 1000 / 30;
/** Readings of someone whose midpoint moves by so many px a frame, eyes 30 px apart. */
const read = (readings: readonly number[], pxAFrame: number): number[] => {
  const hold = createBlurHold();
  return readings.map((mm, k) => holdThroughBlur(hold, mm, 100 + k * pxAFrame, 50, 30, k * FRAME_MS, 24));
};

describe('holdThroughBlur', () => {
  it('believes every reading of someone who hardly moves', () => {
    expect(read([2000, 1900, 2100], 5)).toEqual([2000, 1900, 2100]);
  });

  it('holds what blur explains: 25 px a frame for 24 ms of 33.3 is 0.6 of 30 px, up to 18 % (computed)', () => {
    const [first, second, third] = read([2000, 1750, 1600], 25);
    expect([first, second]).toEqual([2000, 2000]);
    expect(third).toBeCloseTo(1600 * 1.18, 9);
  });

  it('never holds one who is read farther, and begins anew after a gap', () => {
    expect(read([2000, 2300], 25)).toEqual([2000, 2300]);
    const hold = createBlurHold();
    holdThroughBlur(hold, 2000, 0, 0, 30, 0);
    expect(holdThroughBlur(hold, 1700, 900, 0, 30, 400)).toBe(1700);
  });

  it('believes another face at once, as at a hand-over', () => {
    expect(read([2000, 1200], 300)).toEqual([2000, 1200]);
  });

  it('stays within what blur can do, whatever is read', () => {
    fc.assert(
      fc.property(fc.array(figure(400, 5000), { minLength: 1, maxLength: 40 }), figure(0, 60), (readings, pxAFrame) => {
        const blur = (pxAFrame * 24) / (FRAME_MS * 30);
        read(readings, pxAFrame).forEach((mm, k) => {
          expect(mm).toBeGreaterThanOrEqual(readings[k]);
          expect(mm).toBeLessThanOrEqual(readings[k] * (1 + 0.3 * blur) + 1e-9);
        });
      }),
    );
  });
});
