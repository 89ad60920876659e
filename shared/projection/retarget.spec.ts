import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clearance } from './clearance';
import { onGlassFrom, planeFromHome } from './home-plane';
import { retarget } from './retarget';
import { anyDepth, anyGlass, anyRectangle, anySetting } from './testing/arbitraries';

const SCENE = {
  glass: { widthMm: 600, heightMm: 400 },
  homeEye: { x: 10, y: 20, z: 1000 },
  zone: { leftMm: -500, rightMm: 500, lowestMm: -100, highestMm: 100, nearestMm: 500, farthestMm: 2000 },
  layers: [{ name: 'hill', placed: { xMm: 5, yMm: -5, widthMm: 700, heightMm: 500 }, depthMm: 250 }],
};

describe('retarget', () => {
  it('scales everything by the ratio of widths where the shapes agree, and keeps what else a layer has', () => {
    expect(retarget(SCENE, { widthMm: 1200, heightMm: 800 })).toEqual({
      factor: 2,
      glass: { widthMm: 1200, heightMm: 800 },
      homeEye: { x: 20, y: 40, z: 2000 },
      zone: { leftMm: -1000, rightMm: 1000, lowestMm: -200, highestMm: 200, nearestMm: 1000, farthestMm: 4000 },
      layers: [{ name: 'hill', placed: { xMm: 10, yMm: -10, widthMm: 1400, heightMm: 1000 }, depthMm: 500 }],
    });
  });

  it('fits within a glass of another shape', () => {
    expect(retarget(SCENE, { widthMm: 1200, heightMm: 400 })).toMatchObject({ factor: 1, glass: SCENE.glass });
    expect(retarget(SCENE, { widthMm: 300, heightMm: 900 })).toMatchObject({
      factor: 0.5,
      glass: { widthMm: 300, heightMm: 200 },
    });
  });

  it('covers a glass of almost its own shape, so that no dark line is left: 941 x 529 of 1210 x 681 (by hand: 941/1210 = 0.77769, 529/681 = 0.77680)', () => {
    const { factor, glass } = retarget({ ...SCENE, glass: { widthMm: 1210, heightMm: 681 } }, { widthMm: 941, heightMm: 529 });
    expect(factor).toBeCloseTo(0.77769, 5);
    expect(glass.widthMm).toBeCloseTo(941, 9);
    expect(glass.heightMm).toBeCloseTo(529.6, 1);
    expect(retarget(SCENE, { widthMm: 606.1, heightMm: 400 }).factor).toBe(1);
  });

  it('keeps appearance: a layer seen from a scaled eye is the scaled picture, and clear stays clear', () => {
    fc.assert(
      fc.property(anySetting, anyGlass, anyRectangle, anyDepth, (setting, other, placed, depthMm) => {
        const carried = retarget({ ...setting, layers: [{ placed, depthMm }] }, other);
        const { factor, layers } = carried;
        const eye = { x: 120, y: -40, z: 900 };
        const before = onGlassFrom(planeFromHome(placed, setting.homeEye, depthMm), eye, depthMm);
        const after = onGlassFrom(
          planeFromHome(layers[0].placed, carried.homeEye, layers[0].depthMm),
          { x: eye.x * factor, y: eye.y * factor, z: eye.z * factor },
          layers[0].depthMm,
        );
        expect(after.xMm / factor).toBeCloseTo(before.xMm, 5);
        expect(after.widthMm / factor).toBeCloseTo(before.widthMm, 5);
        expect(carried.glass.widthMm).toBeLessThanOrEqual(other.widthMm * 1.005);
        expect(carried.glass.heightMm).toBeLessThanOrEqual(other.heightMm * 1.005);
      }),
    );
    const clear = { ...SCENE, layers: [{ placed: { xMm: 0, yMm: 0, widthMm: 1300, heightMm: 700 }, depthMm: 250 }] };
    expect(clearance(clear)).toEqual([]);
    expect(clearance(retarget(clear, { widthMm: 900, heightMm: 600 }))).toEqual([]);
  });

  it('names a glass without size', () => {
    expect(() => retarget(SCENE, { widthMm: 0, heightMm: 1 })).toThrowError(
      expect.objectContaining({ value: 'glass.widthMm' }),
    );
  });
});
