import { describe, expect, it } from 'vitest';
import { acrossFromDiagonal, acrossFromThing, upFromAcross } from './field-of-view';

const degrees = (rad: number) => (rad * 180) / Math.PI;
const radians = (deg: number) => (deg * Math.PI) / 180;

describe('fields of view', () => {
  it.each([
    [78, 70.43, 43.31],
    [90, 82.15, 52.23],
  ])('a 16:9 webcam of %i degrees diagonal sees %f across and %f up (computed)', (diagonal, across, up) => {
    const hfov = acrossFromDiagonal(radians(diagonal), 16, 9);
    expect(degrees(hfov)).toBeCloseTo(across, 2);
    expect(degrees(upFromAcross(hfov, 16, 9))).toBeCloseTo(up, 1);
  });

  it('measures with a card of ISO/IEC 7810 ID-1: 85.60 mm at 300 mm over a quarter of the width (computed, 2 atan(342.4/600))', () => {
    expect(degrees(acrossFromThing(85.6, 300, 0.25))).toBeCloseTo(59.4239, 3);
  });

  it('names what has no size', () => {
    expect(() => acrossFromThing(85.6, 0, 0.5)).toThrowError(expect.objectContaining({ value: 'distanceMm' }));
  });
});
