import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { anyGlass, figure } from '../../projection/testing/arbitraries';
import type { Camera } from '../camera';
import { CERTAIN, glassErrorMm, middleOf } from './glass-error';

const FLUSH: Camera = { position: { x: 0, y: 0, z: 0 }, pitchRad: 0, yawRad: 0, rollRad: 0, hfovRad: Math.PI / 3, mirrored: false, widthPx: 1280, heightPx: 720 };
const SMALL = { widthMm: 1, heightMm: 1 };
const GLASS = { widthMm: 527.04, heightMm: 296.46 };

describe('glassErrorMm', () => {
  it('follows a viewer taken for a tenth too large or small: the whole eye scaled, the point seen in the middle staying in its layer (by hand)', () => {
    // From (100, 0, 600) the middle of the glass is seen at x = -100/6 in a layer 100 mm behind.
    const drawnFor = (k: number) => (600 * k * (-100 / 6) + 100 * k * 100) / (600 * k + 100);
    const expected = Math.abs(drawnFor(1.1) - drawnFor(0.9)) / 2;
    expect(glassErrorMm(SMALL, FLUSH, { ...CERTAIN, viewerScale: 0.1 }, 100, { x: 100, y: 0, z: 600 })).toBeCloseTo(expected, 1);
  });

  it('is d/(ez+d) for each mm the lens is out of place, sideways (by hand: 100/700 · 7 = 1, two axes: √2)', () => {
    expect(glassErrorMm(SMALL, FLUSH, { ...CERTAIN, positionMm: 7 }, 100, { x: 0, y: 0, z: 600 })).toBeCloseTo(Math.SQRT2, 3);
  });

  it('is ez tan(u) d/(ez+d) for a tilt (by hand: 2000·0.01·100/2100, pitch and yaw: √2 of it)', () => {
    const expected = (2000 * Math.tan(0.01) * 100) / 2100;
    expect(glassErrorMm(SMALL, FLUSH, { ...CERTAIN, tiltRad: 0.01 }, 100, { x: 0, y: 0, z: 2000 })).toBeCloseTo(Math.SQRT2 * expected, 3);
  });

  it('takes a relative error of f as one of distance (by hand: d ln f = -du / sin(hfov))', () => {
    const relative = 0.01 / Math.sin(FLUSH.hfovRad);
    const eye = { x: 300, y: 0, z: 1500 };
    const byField = glassErrorMm(SMALL, FLUSH, { ...CERTAIN, hfovRad: 0.01 }, 500, eye);
    // f changes the distance along the axis alone, and not the pixel's offset in mm: the eye moves straight away from the glass.
    const shiftOf = (k: number) => ((0 - 300 * 500 / 1500) * 1500 * k + 300 * 500) / (1500 * k + 500);
    expect(byField).toBeCloseTo(Math.abs(shiftOf(1 + relative) - shiftOf(1 - relative)) / 2, 1);
  });

  it('counts of the glass only the parallax: 1 % of the corner’s d/ez (by hand)', () => {
    const corner = Math.hypot(263.52, 148.23);
    expect(glassErrorMm(GLASS, FLUSH, { ...CERTAIN, glassScale: 0.01 }, 100, { x: 0, y: 0, z: 1000 })).toBeCloseTo(corner * 0.1 * 0.01, 9);
  });

  it('is nothing on the glass itself, or of what is certain; and grows with depth', () => {
    const unsure = { hfovRad: 0.03, tiltRad: 0.01, positionMm: 5, viewerScale: 0.05, glassScale: 0.01 };
    fc.assert(
      fc.property(anyGlass, figure(-300, 300), figure(-200, 200), figure(1000, 4000), figure(1, 2000), (glass, x, y, z, depth) => {
        const eye = { x, y, z };
        const error = (d: number) => glassErrorMm(glass, FLUSH, unsure, d, eye);
        expect(error(0)).toBeCloseTo(0, 9);
        expect(glassErrorMm(glass, FLUSH, CERTAIN, depth, eye)).toBeCloseTo(0, 9);
        expect(error(1.5 * depth)).toBeGreaterThan(error(depth));
      }),
    );
  });

  it('says so where the camera looks the other way', () => {
    expect(() => glassErrorMm(GLASS, { ...FLUSH, yawRad: 3 }, CERTAIN, 100, { x: 0, y: 0, z: 600 })).toThrow('turn it there');
  });
});

describe('middleOf', () => {
  it('is the middle (by hand)', () => {
    expect(middleOf({ leftMm: -700, rightMm: 500, lowestMm: -300, highestMm: 100, nearestMm: 1000, farthestMm: 3000 })).toEqual({ x: -100, y: -100, z: 2000 });
  });
});
