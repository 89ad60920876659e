import { describe, expect, it } from 'vitest';
import { axisLagMs, createEyeFilter, resetEyeFilter, stepEyeFilter } from './eye-filter';
import { createOneEuro, stepOneEuro } from './one-euro';

const SETTINGS = {
  across: { minCutoffHz: 1, beta: 0.1, derivativeCutoffHz: 1 },
  along: { minCutoffHz: 0.5, beta: 0, derivativeCutoffHz: 1 },
};

describe('the eye filter', () => {
  it('filters x and y alike and z by its own settings', () => {
    const state = createEyeFilter();
    const x = createOneEuro();
    const z = createOneEuro();
    for (let i = 0; i < 30; i++) {
      const jolt = Math.sin(i * i);
      stepEyeFilter(state, { x: jolt, y: jolt, z: 1000 + jolt }, i * 33, SETTINGS);
      stepOneEuro(x, jolt, i * 33, SETTINGS.across);
      stepOneEuro(z, 1000 + jolt, i * 33, SETTINGS.along);
    }
    expect([state.x.value, state.y.value, state.z.value]).toEqual([x.value, x.value, z.value]);
    expect(axisLagMs(state, 'z')).toBeCloseTo(318.309886, 6); // computed: 1000/pi
  });

  it('starts afresh after a reset', () => {
    const state = createEyeFilter();
    stepEyeFilter(state, { x: 0, y: 0, z: 1000 }, 0, SETTINGS);
    resetEyeFilter(state);
    stepEyeFilter(state, { x: 500, y: 5, z: 2000 }, 33, SETTINGS);
    expect([state.x.value, state.y.value, state.z.value]).toEqual([500, 5, 2000]);
  });
});
