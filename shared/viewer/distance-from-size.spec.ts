import { describe, expect, it } from 'vitest';
import { distanceFromSize } from './distance-from-size';

const F = 1108.51;
const IPD = 63.36;
const IRIS_MM = 11.7;
const degrees = (deg: number) => (deg * Math.PI) / 180;

describe('distanceFromSize', () => {
  // Computed: 1280 px, 60 degrees across; distance, eye distance in px, iris in px (11.7 mm), and what a pixel of the eyes is worth in mm.
  it.each([
    [600, 117.1, 21.6, 5.1],
    [1000, 70.2, 13.0, 14.2],
    [2000, 35.1, 6.5, 57],
    [3000, 23.4, 4.3, 128],
  ])('at %i mm', (distance, eyesPx, irisPx, pixelWorth) => {
    expect((F * IPD) / distance).toBeCloseTo(eyesPx, 1);
    expect(Math.abs(distanceFromSize(F, IPD, eyesPx) / distance - 1)).toBeLessThan(0.05 / eyesPx + 1e-9);
    expect(Math.abs(distanceFromSize(F, IRIS_MM, irisPx) / distance - 1)).toBeLessThan(0.05 / irisPx + 1e-9);
    const halfAPixelEitherWay = distanceFromSize(F, IPD, eyesPx - 0.5) - distanceFromSize(F, IPD, eyesPx + 0.5);
    expect(halfAPixelEitherWay / pixelWorth).toBeCloseTo(1, 1);
  });

  it.each([
    [10, 1.5],
    [20, 6.4],
    [30, 15.5],
  ])('left uncorrected, a yaw of %i degrees overstates it by %f %% (computed, 1/cos)', (yaw, percent) => {
    const seenPx = (F * IPD * Math.cos(degrees(yaw))) / 1000;
    expect(100 * (distanceFromSize(F, IPD, seenPx) / 1000 - 1)).toBeCloseTo(percent, 1);
    expect(distanceFromSize(F, IPD, seenPx, degrees(yaw))).toBeCloseTo(1000, 9);
  });

  it('names what has no size', () => {
    expect(() => distanceFromSize(F, IPD, 0)).toThrowError(expect.objectContaining({ value: 'sizePx' }));
  });
});
