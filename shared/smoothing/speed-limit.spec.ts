import { describe, expect, it } from 'vitest';
import { createSpeedLimit, stepSpeedLimit } from './speed-limit';

describe('speed limit', () => {
  it('adds no lag within the limit', () => {
    const state = createSpeedLimit();
    for (let t = 0; t <= 2000; t += 16) {
      const wanted = { x: 300 * Math.sin(t / 400), y: 20, z: 900 + t / 10 };
      stepSpeedLimit(state, wanted, t, 1000);
      expect(state.limited.x).toBeCloseTo(wanted.x, 9);
      expect(state.limited.z).toBeCloseTo(wanted.z, 9);
    }
  });

  it('never exceeds the limit, in any direction at once, and catches up', () => {
    const state = createSpeedLimit();
    stepSpeedLimit(state, { x: 0, y: 0, z: 1000 }, 0, 500);
    let last = { ...state.limited };
    for (let t = 10; t <= 3000; t += 10) {
      stepSpeedLimit(state, { x: 400, y: -300, z: 1000 }, t, 500);
      const { x, y, z } = state.limited;
      expect(Math.hypot(x - last.x, y - last.y, z - last.z)).toBeLessThanOrEqual(5 + 1e-9);
      last = { x, y, z };
    }
    expect(last.x).toBeCloseTo(400, 3);
    expect(last.y).toBeCloseTo(-300, 3);
  });

  it('comes off the limit without a jump of speed', () => {
    const state = createSpeedLimit();
    const speeds: number[] = [];
    stepSpeedLimit(state, { x: 0, y: 0, z: 1000 }, 0, 500);
    for (let t = 1; t <= 2000; t++) {
      const before = state.limited.x;
      stepSpeedLimit(state, { x: 400, y: 0, z: 1000 }, t, 500);
      speeds.push((state.limited.x - before) * 1000);
    }
    const drops = speeds.slice(1).map((speed, i) => Math.abs(speed - speeds[i]));
    expect(Math.max(...drops)).toBeLessThan(6);
  });
});
