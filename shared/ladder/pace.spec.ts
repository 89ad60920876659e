import { describe, expect, it } from 'vitest';
import { Pace } from './pace';

/** Frames looked at of ten seconds at `perS`, each early or late by up to 3 ms. */
function passed(perS: number, mostPerS: number): number {
  const pace = new Pace();
  let count = 0;
  for (let k = 0; k < 10 * perS; k++) if (pace.due((k * 1000) / perS + 3 * Math.sin(k * 7), mostPerS)) count++;
  return count;
}

describe('Pace', () => {
  it.each([
    [30, Infinity, 300],
    [30, 20, 200],
    [30, 15, 150],
    [30, 10, 100],
    [30, 0, 0],
    [10, 15, 100],
  ])('of %i frames a second, at most %d, passes %i in ten seconds', (perS, mostPerS, expected) => {
    expect(passed(perS, mostPerS)).toBe(expected);
  });

  it('goes on when the clock is set back, as with another camera', () => {
    const pace = new Pace();
    expect(pace.due(50_000, 10)).toBe(true);
    expect(pace.due(20, 10)).toBe(true);
    expect(pace.due(40, 10)).toBe(false);
  });
});
