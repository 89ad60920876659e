import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clearance, EYE_MARGIN_MM } from './clearance';
import { onGlassFrom, planeFromHome } from './home-plane';
import type { PlacedLayer } from './scene-geometry';
import { SIDE_AXIS, sideOf, sideOfGlass } from './sides';
import { anyDepth, anyRectangle, anySetting } from './testing/arbitraries';

const SETTING = {
  glass: { widthMm: 600, heightMm: 400 },
  homeEye: { x: 0, y: 0, z: 1000 },
  zone: { leftMm: -500, rightMm: 500, lowestMm: -100, highestMm: 100, nearestMm: 500, farthestMm: 2000 },
};
const BACK: PlacedLayer = { placed: { xMm: 0, yMm: 0, widthMm: 1200, heightMm: 600 }, depthMm: 250 };

describe('clearance', () => {
  it('finds no fault in a back layer with bleed enough, nor in one that stands inside before it', () => {
    const inside = { placed: { xMm: 50, yMm: 0, widthMm: 100, heightMm: 100 }, depthMm: -50 };
    expect(clearance({ ...SETTING, layers: [BACK, inside] })).toEqual([]);
  });

  it('names the layer, the side, how much is short and from where', () => {
    const narrow = { ...BACK, placed: { ...BACK.placed, xMm: -24, widthMm: 1152 } };
    // Right edge at 552 * 1.25 = 690 of 700 (by hand); the left one at -600 has kept its bleed.
    expect(clearance({ ...SETTING, layers: [BACK, narrow] })).toEqual([
      { kind: 'edgeShows', layer: 1, side: 'right', shortMm: 10, eye: { x: -500, y: 0, z: 500 } },
    ]);
  });

  it('names the sides that no layer reaches', () => {
    const lower = { ...BACK, placed: { xMm: 0, yMm: -150, widthMm: 1200, heightMm: 300 } };
    expect(clearance({ ...SETTING, layers: [lower] })).toEqual([{ kind: 'sideOpen', side: 'top' }]);
    expect(clearance({ ...SETTING, layers: [] }).map((fault) => fault.kind)).toEqual(Array(4).fill('sideOpen'));
  });

  it('names a layer too near the nearest eye, and by how much', () => {
    const near = { placed: { xMm: 0, yMm: 0, widthMm: 100, heightMm: 100 }, depthMm: -430 };
    expect(clearance({ ...SETTING, layers: [BACK, near] })).toEqual([
      { kind: 'tooNear', layer: 1, shortMm: EYE_MARGIN_MM - 70, eye: { x: 0, y: 0, z: 500 } },
    ]);
    expect(clearance({ ...SETTING, layers: [BACK, { ...near, depthMm: -1200 }] })).toMatchObject([
      { kind: 'tooNear', layer: 1 },
    ]);
    expect(clearance({ ...SETTING, layers: [BACK, { ...near, depthMm: -400 }] })).toEqual([]);
  });

  it('names an eye from which the fault is truly seen', () => {
    fc.assert(
      fc.property(anySetting, anyRectangle, anyDepth, (setting, placed, depthMm) => {
        for (const fault of clearance({ ...setting, layers: [{ placed, depthMm }] })) {
          if (fault.kind !== 'edgeShows') continue;
          const seen = onGlassFrom(planeFromHome(placed, setting.homeEye, depthMm), fault.eye, depthMm);
          const { outward } = SIDE_AXIS[fault.side];
          expect(outward * sideOf(seen, fault.side)).toBeLessThan(outward * sideOfGlass(setting.glass, fault.side));
        }
      }),
    );
  });
});
