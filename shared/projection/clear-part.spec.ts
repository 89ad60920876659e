import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clearPart } from './clear-part';
import { isClearFrom } from './eye-room';
import { anyDepth, anyRectangle, anySetting } from './testing/arbitraries';

/** Its plane at 500 mm reaches 400 mm to each side of a glass that is 300 wide (placed 800/1.5 wide as home sees it at 1000 mm), and enough up. */
const SCENE = {
  glass: { widthMm: 300, heightMm: 200 },
  homeEye: { x: 0, y: 0, z: 1000 },
  zone: { leftMm: -100, rightMm: 100, lowestMm: -50, highestMm: 50, nearestMm: 500, farthestMm: 2000 },
  layers: [{ placed: { xMm: 0, yMm: 0, widthMm: 800 / 1.5, heightMm: 600 }, depthMm: 500 }],
};

describe('the part of a zone from which a scene is clear', () => {
  it('is the whole zone where it is clear from all of it', () => {
    const zone = { leftMm: -95, rightMm: 95, lowestMm: -50, highestMm: 50, nearestMm: 505, farthestMm: 2000 };
    expect(clearPart(SCENE, zone)).toEqual(zone);
  });

  it('begins farther away, or is narrower, whichever leaves more floor (by hand: 150 + (150 + e) 500/z <= 400, so e <= z/2 - 150)', () => {
    // At 800 mm: e = 250, 500 x 1200 = 0.60 m²; at 900: 300 and 600 x 1100 = 0.66; at 1100: 400 and 800 x 900 = 0.72; the most of (z - 300)(2000 - z) is at 1150.
    const zone = { leftMm: -600, rightMm: 600, lowestMm: -50, highestMm: 50, nearestMm: 800, farthestMm: 2000 };
    const part = clearPart(SCENE, zone)!;
    // Whole centimetres: 1140 gives 420, 840 x 860; 1160 gives 430, 860 x 840, the same; the nearer is taken.
    expect(part).toEqual({ ...zone, leftMm: -420, rightMm: 420, nearestMm: 1140 });
  });

  it('is none where it is clear from nowhere', () => {
    const layers = [{ ...SCENE.layers[0], placed: { xMm: 0, yMm: 0, widthMm: 301, heightMm: 600 } }];
    expect(clearPart({ ...SCENE, layers }, { ...SCENE.zone, nearestMm: 400, farthestMm: 500 })).toBeNull();
  });

  it('is clear, and lies within', () => {
    fc.assert(
      fc.property(anySetting, anyRectangle, anyDepth, (setting, placed, depthMm) => {
        const scene = { ...setting, layers: [{ placed, depthMm }] };
        const part = clearPart(scene, setting.zone);
        if (!part) return;
        expect(isClearFrom(scene, part)).toBe(true);
        for (const [low, high] of [['leftMm', 'rightMm'], ['lowestMm', 'highestMm'], ['nearestMm', 'farthestMm']] as const) {
          expect(part[low]).toBeGreaterThanOrEqual(setting.zone[low]);
          expect(part[high]).toBeLessThanOrEqual(setting.zone[high]);
          expect(part[low]).toBeLessThanOrEqual(part[high]);
        }
      }),
      { numRuns: 60 },
    );
  });
});
