import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clearance } from './clearance';
import { growToCover, scaleRectangle } from './grow-to-cover';
import { anySetting, figure } from './testing/arbitraries';

const SETTING = {
  glass: { widthMm: 600, heightMm: 400 },
  homeEye: { x: 0, y: 0, z: 1000 },
  zone: { leftMm: -500, rightMm: 500, lowestMm: -100, highestMm: 100, nearestMm: 500, farthestMm: 2000 },
};
const full = { xMm: 0, yMm: 0, widthMm: 600, heightMm: 400 };

describe('growToCover', () => {
  it('is what the worst side asks for (by hand, d = 250: 700 of 375 across, 350 of 250 up)', () => {
    expect(growToCover([{ placed: full, depthMm: 250 }], SETTING)).toBeCloseTo(700 / 375, 12);
  });

  it('leaves a clear scene alone', () => {
    expect(growToCover([{ placed: full, depthMm: 0 }], SETTING)).toBe(1);
    expect(growToCover([], SETTING)).toBe(1);
  });

  it('leaves out a layer that the nearest eye is not in front of', () => {
    expect(
      growToCover(
        [
          { placed: full, depthMm: 0 },
          { placed: full, depthMm: -600 },
        ],
        SETTING,
      ),
    ).toBe(1);
  });

  it('covers a side that only growing carries to the edge of the glass', () => {
    // Grown by 700/375 for the back layer, the middle one's top (150 of 200) is carried past the edge and must then be covered at its own depth.
    const middle = { placed: { xMm: 0, yMm: -50, widthMm: 200, heightMm: 400 }, depthMm: 2000 };
    const factor = growToCover([{ placed: full, depthMm: 250 }, middle], SETTING);
    expect(factor).toBeGreaterThan(700 / 375);
    const layers = [{ placed: full, depthMm: 250 }, middle].map((layer) => ({
      ...layer,
      placed: scaleRectangle(layer.placed, factor),
    }));
    expect(clearance({ ...SETTING, layers })).toEqual([]);
  });

  it('leaves no edge showing, and no smaller factor does', () => {
    const layer = fc.record({
      placed: fc.record({
        xMm: figure(-5, 5),
        yMm: figure(-5, 5),
        widthMm: figure(50, 3000),
        heightMm: figure(50, 3000),
      }),
      depthMm: figure(-80, 5000),
    });
    fc.assert(
      fc.property(anySetting, fc.array(layer, { maxLength: 4 }), (setting, layers) => {
        const shows = (factor: number) =>
          clearance({
            ...setting,
            layers: layers.map((l) => ({ ...l, placed: scaleRectangle(l.placed, factor) })),
          }).some((fault) => fault.kind === 'edgeShows' && fault.shortMm > 1e-3);
        const factor = growToCover(layers, setting);
        expect(shows(factor)).toBe(false);
        if (factor > 1.01) expect(shows(1) || shows(1 + (factor - 1) * 0.999)).toBe(true);
      }),
    );
  });
});
