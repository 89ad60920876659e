import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { onGlassFrom, planeFromHome } from './home-plane';
import { anyDepth, anyEye, anyRectangle, anyZone } from './testing/arbitraries';
import { shiftInPixels, shiftOverZone } from './zone-shift';

const ZONE = { leftMm: -500, rightMm: 700, lowestMm: -100, highestMm: 200, nearestMm: 400, farthestMm: 2000 };

describe('shiftOverZone', () => {
  it('is as worked by hand: d = 200, H = (100, 0, 600), so a quarter of the way the eye goes', () => {
    const shift = shiftOverZone(200, { x: 100, y: 0, z: 600 }, ZONE);
    expect(shift).toEqual({ left: -150, right: 150, across: 300, lowest: -25, highest: 50, up: 75 });
    expect(shiftInPixels(shift, 4)).toEqual({
      left: -600,
      right: 600,
      across: 1200,
      lowest: -100,
      highest: 200,
      up: 300,
    });
  });

  it('is how far a placed layer is seen to move', () => {
    fc.assert(
      fc.property(anyRectangle, anyEye, anyZone, anyDepth, (placed, homeEye, zone, depthMm) => {
        const plane = planeFromHome(placed, homeEye, depthMm);
        const shift = shiftOverZone(depthMm, homeEye, zone);
        const atRight = onGlassFrom(plane, { ...homeEye, x: zone.rightMm }, depthMm);
        const atHighest = onGlassFrom(plane, { ...homeEye, y: zone.highestMm }, depthMm);
        expect(atRight.xMm - placed.xMm).toBeCloseTo(shift.right, 5);
        expect(atHighest.yMm - placed.yMm).toBeCloseTo(shift.highest, 5);
      }),
    );
  });

  it('names what is inverted', () => {
    expect(() => shiftOverZone(100, { x: 0, y: 0, z: 600 }, { ...ZONE, leftMm: 800 })).toThrowError(
      expect.objectContaining({ value: 'zone.leftMm' }),
    );
    expect(() => shiftOverZone(100, { x: 0, y: 0, z: 600 }, { ...ZONE, farthestMm: 100 })).toThrowError(
      expect.objectContaining({ value: 'zone.nearestMm' }),
    );
  });
});
