import { walkPath } from './walk-path';

const zone = { leftMm: -600, rightMm: 500, lowestMm: -100, highestMm: 200, nearestMm: 1000, farthestMm: 2000 };
const home = { x: 0, y: 300, z: 1800 };

describe('the walk past', () => {
  it('stays within the zone and reaches both its ends', () => {
    for (let turn = 0; turn <= 1; turn += 0.01) {
      const eye = walkPath(zone, home, turn);
      expect(eye.x).toBeGreaterThanOrEqual(-600 - 1e-9);
      expect(eye.x).toBeLessThanOrEqual(500 + 1e-9);
      expect(eye.z).toBeGreaterThan(1000);
      expect(eye.z).toBeLessThan(2000);
      expect(eye.y).toBe(200);
    }
    expect(walkPath(zone, home, 0).x).toBeCloseTo(-600, 9);
    expect(walkPath(zone, home, 0.5).x).toBeCloseTo(500, 9);
  });

  it('passes on the nearer side first', () => {
    expect(walkPath(zone, home, 0.25).z).toBeCloseTo(1100, 9);
    expect(walkPath(zone, home, 0.75).z).toBeCloseTo(1900, 9);
  });
});
