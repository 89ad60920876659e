import * as fc from 'fast-check';
import { depthTicks, depthToPx, pxToDepth, roundStep, scaleAt } from './depth-scale';

const scale = { pxPerMm: 0.075, linearToMm: 1500, broken: { atMm: 200, beyond: 0.4 } };
const depth = fc.double({ min: -5000, max: 90_000, noNaN: true });

describe('the depth scale', () => {
  it('is linear to its limit: 1500 mm at 0.075 px/mm is 112.5 px (computed)', () => {
    expect(depthToPx(scale, 1500)).toBeCloseTo(112.5, 9);
    expect(depthToPx(scale, -60)).toBeCloseTo(-4.5, 9);
  });

  it('is shortened for the viewers: 1800 mm away is 200 + 0.4 x 1600 = 840 mm of drawing, 63 px (computed)', () => {
    expect(depthToPx(scale, -1800)).toBeCloseTo(-63, 9);
  });

  it('draws 1500 e mm twice as far as 1500 mm, for ln e = 1 (computed)', () => {
    expect(depthToPx(scale, 1500 * Math.E)).toBeCloseTo(225, 9);
  });

  it('is monotone and can be undone', () => {
    fc.assert(
      fc.property(depth, depth, (a, b) => {
        expect(pxToDepth(scale, depthToPx(scale, a))).toBeCloseTo(a, 5);
        if (a < b - 1e-6) expect(depthToPx(scale, a)).toBeLessThan(depthToPx(scale, b));
      }),
    );
  });

  it('meets the linear part with the same slope', () => {
    const slope = (at: number) => (depthToPx(scale, at + 0.01) - depthToPx(scale, at - 0.01)) / 0.02;
    expect(slope(1499)).toBeCloseTo(slope(1501), 3);
  });

  it('knows its own slope everywhere', () => {
    for (const at of [-3000, -500, -100, 700, 4000])
      expect(scaleAt(scale, at)).toBeCloseTo((depthToPx(scale, at + 0.01) - depthToPx(scale, at - 0.01)) / 0.02, 5);
  });

  it('finds round steps', () => {
    expect(roundStep(0.075, 1.5)).toBe(20);
    expect(roundStep(0.075, 44)).toBe(1000);
    expect(depthTicks(scale, -2200, 1700)).toEqual([-2000, 0, 1000]);
  });
});
