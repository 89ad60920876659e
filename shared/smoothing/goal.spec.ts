import { describe, expect, it } from 'vitest';
import { CALM_DRIFT } from './drift';
import { createGoal, goalAt, goalRate } from './goal';

describe('goal', () => {
  const viewer = { ...createGoal(0), kind: 'viewer' as const, level: 100, slope: 0.5, tMs: 1000 };

  it('runs straight to the longest horizon and out after it', () => {
    expect(goalAt(viewer, 'x', 1080, CALM_DRIFT, 100)).toBe(140);
    expect(goalAt(viewer, 'x', 900, CALM_DRIFT, 100)).toBe(50);
    expect(goalAt(viewer, 'x', 1e6, CALM_DRIFT, 100)).toBeCloseTo(100 + 0.5 * 160, 9);
  });

  it('has the rate of its own curve, for each kind', () => {
    for (const goal of [viewer, createGoal(7), { ...viewer, kind: 'rest' as const }]) {
      for (const t of [1010, 1095, 1105, 1400]) {
        const slope = (goalAt(goal, 'x', t + 0.5, CALM_DRIFT, 100) - goalAt(goal, 'x', t - 0.5, CALM_DRIFT, 100)) / 1;
        expect(goalRate(goal, 'x', t, CALM_DRIFT, 100)).toBeCloseTo(slope, 4);
      }
    }
  });

  it('wanders about home when nobody is there', () => {
    expect(goalAt(createGoal(7), 'x', 5750, CALM_DRIFT, 100)).toBeCloseTo(67, 9);
    expect(goalAt(createGoal(7), 'x', 11_500, CALM_DRIFT, 100)).toBeCloseTo(7, 9);
  });
});
