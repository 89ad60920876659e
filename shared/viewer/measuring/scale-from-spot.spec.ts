import { describe, expect, it } from 'vitest';
import { factorFromSpot } from './scale-from-spot';
import { measured } from './uncertainty';

const at = (x: number, y: number, z: number, u = 0) => ({ x: measured(x, u), y: measured(y, u), z: measured(z, u) });

describe('factorFromSpot', () => {
  it('grows where the tracker sees too far: 2100 mm for 2000 with k = 1 is k = 1.05, and 1 % of either is 0.0105 (by hand)', () => {
    expect(factorFromSpot(1, measured(2100, 0), at(0, 0, 0), at(0, 0, 2000)).value).toBeCloseTo(1.05, 12);
    const spot = { ...at(0, 0, 2000), z: measured(2000, 20) };
    expect(factorFromSpot(1, measured(2100, 0), at(0, 0, 0), spot).uncertainty).toBeCloseTo(0.0105, 5);
  });

  it('measures from the lens, not from the glass (by hand: 3-4-5)', () => {
    expect(factorFromSpot(1.048, measured(500, 5), at(0, 300, 0), at(0, 0, 400)).value).toBeCloseTo(1.048, 12);
  });
});
