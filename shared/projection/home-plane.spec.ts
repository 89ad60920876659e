import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { onGlassFrom, planeFromHome } from './home-plane';
import { project } from './layer-on-glass';
import { anyDepth, anyEye, anyRectangle } from './testing/arbitraries';

describe('planeFromHome', () => {
  it('carries a rectangle to its plane (computed by hand: H = (100, 0, 600), d = 300, scale 3/2, offset -50)', () => {
    const plane = planeFromHome({ xMm: 20, yMm: 40, widthMm: 200, heightMm: 100 }, { x: 100, y: 0, z: 600 }, 300);
    expect(plane).toEqual({ xMm: -20, yMm: 60, widthMm: 300, heightMm: 150 });
  });

  it('never changes the picture from the home eye, whatever the depth', () => {
    fc.assert(
      fc.property(anyRectangle, anyEye, anyDepth, (placed, homeEye, depthMm) => {
        const seen = onGlassFrom(planeFromHome(placed, homeEye, depthMm), homeEye, depthMm);
        for (const key of ['xMm', 'yMm', 'widthMm', 'heightMm'] as const) expect(seen[key]).toBeCloseTo(placed[key], 6);
      }),
    );
  });

  it('shifts by dx * d/(hz+d) when the eye goes sideways', () => {
    fc.assert(
      fc.property(anyRectangle, anyEye, anyDepth, (placed, homeEye, depthMm) => {
        const seen = onGlassFrom(planeFromHome(placed, homeEye, depthMm), { ...homeEye, x: homeEye.x + 100 }, depthMm);
        expect(seen.xMm - placed.xMm).toBeCloseTo((100 * depthMm) / (homeEye.z + depthMm), 6);
        expect(seen.yMm).toBeCloseTo(placed.yMm, 6);
      }),
    );
  });

  it('sees each corner where the ray from any eye does', () => {
    fc.assert(
      fc.property(anyRectangle, anyEye, anyDepth, (inPlane, eye, depthMm) => {
        const seen = onGlassFrom(inPlane, eye, depthMm);
        const corner = project(
          { x: inPlane.xMm + inPlane.widthMm / 2, y: inPlane.yMm - inPlane.heightMm / 2, z: -depthMm },
          eye,
        );
        expect(seen.xMm + seen.widthMm / 2).toBeCloseTo(corner.x, 6);
        expect(seen.yMm - seen.heightMm / 2).toBeCloseTo(corner.y, 6);
      }),
    );
  });

  it.each([
    ['placed.widthMm', { xMm: 0, yMm: 0, widthMm: 0, heightMm: 1 }, 0],
    ['placed.heightMm', { xMm: 0, yMm: 0, widthMm: 1, heightMm: -1 }, 0],
    ['placed.xMm', { xMm: NaN, yMm: 0, widthMm: 1, heightMm: 1 }, 0],
    ['depthMm', { xMm: 0, yMm: 0, widthMm: 1, heightMm: 1 }, -600],
  ])('names %s when it is impossible', (value, placed, depthMm) => {
    expect(() => planeFromHome(placed, { x: 0, y: 0, z: 600 }, depthMm)).toThrowError(
      expect.objectContaining({ name: 'GeometryError', value }),
    );
  });
});
