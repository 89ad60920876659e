import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addJump, createSettling, settlingRate, stepSettling } from './settling';

describe('settling', () => {
  it('dies away to 2 % in the time asked for, without passing zero', () => {
    const state = { p: 1, v: 0 };
    let least = 1;
    for (let t = 0; t < 600; t += 10) {
      stepSettling(state, 10, settlingRate(600));
      least = Math.min(least, state.p);
    }
    expect(state.p).toBeCloseTo(0.02, 4);
    expect(least).toBeGreaterThan(0);
  });

  it('takes the same way in one step as in many', () => {
    const any = fc.double({ min: -100, max: 100, noNaN: true });
    fc.assert(
      fc.property(any, any, fc.integer({ min: 1, max: 12 }), (p, v, steps) => {
        const one = { p, v };
        const many = { p, v };
        stepSettling(one, 48, 0.05);
        for (let i = 0; i < steps; i++) stepSettling(many, 48 / steps, 0.05);
        expect(many.p).toBeCloseTo(one.p, 8);
        expect(many.v).toBeCloseTo(one.v, 8);
      }),
    );
  });

  it('obeys the critically damped equation o" + 2w o\' + w2 o = 0 (by central differences of an independent step)', () => {
    const w = 0.01;
    const at = (t: number) => {
      const state = { p: 40, v: -1 };
      stepSettling(state, t, w);
      return state;
    };
    for (const t of [5, 50, 300]) {
      const acceleration = (at(t + 0.01).v - at(t - 0.01).v) / 0.02;
      const speed = (at(t + 0.01).p - at(t - 0.01).p) / 0.02;
      expect(at(t).v).toBeCloseTo(speed, 6);
      expect(acceleration + 2 * w * at(t).v + w * w * at(t).p).toBeCloseTo(0, 7);
    }
  });

  it('adds jumps', () => {
    const state = createSettling();
    addJump(state, 3, 0.5);
    addJump(state, -1, 0.25);
    expect(state).toEqual({ p: 2, v: 0.75 });
  });
});
