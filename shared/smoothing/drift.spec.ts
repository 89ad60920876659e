import { describe, expect, it } from 'vitest';
import { CALM_DRIFT, driftOffset, driftRate, NO_DRIFT } from './drift';

describe('drift', () => {
  it('stays within its amplitudes and under 20 mm/s along each axis for an hour', () => {
    for (let t = 0; t < 3_600_000; t += 500) {
      expect(Math.abs(driftOffset('x', t, CALM_DRIFT))).toBeLessThanOrEqual(60);
      expect(Math.abs(driftOffset('y', t, CALM_DRIFT))).toBeLessThanOrEqual(15);
      expect(Math.abs(driftOffset('z', t, CALM_DRIFT))).toBeLessThanOrEqual(40);
      for (const axis of ['x', 'y', 'z'] as const) {
        expect(Math.abs(driftRate(axis, t, CALM_DRIFT)) * 1000).toBeLessThan(20);
      }
    }
  });

  it('has the rate of its own offset, and its stated periods', () => {
    const periods = { x: 23_000, y: 31_000, z: 41_000 };
    for (const axis of ['x', 'y', 'z'] as const) {
      for (const t of [0, 1234, 98_765]) {
        const slope = (driftOffset(axis, t + 1, CALM_DRIFT) - driftOffset(axis, t - 1, CALM_DRIFT)) / 2;
        expect(driftRate(axis, t, CALM_DRIFT)).toBeCloseTo(slope, 6);
        expect(driftOffset(axis, t + periods[axis], CALM_DRIFT)).toBeCloseTo(driftOffset(axis, t, CALM_DRIFT), 9);
      }
    }
  });

  it('is still for those who ask for less motion', () => {
    expect(Math.abs(driftOffset('x', 5000, NO_DRIFT))).toBe(0);
    expect(Math.abs(driftRate('z', 5000, NO_DRIFT))).toBe(0);
  });
});
