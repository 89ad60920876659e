import { describe, expect, it } from 'vitest';
import { acrossFromDiagonal, acrossFromFocal, diagonalFromAcross, upFromAcross } from './field-of-view';

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
    expect(degrees(diagonalFromAcross(radians(across), 16, 9))).toBeCloseTo(diagonal, 1);
  });

  it('follows from the focal length: 300 px for a picture 342.4 px wide (computed, 2 atan(342.4/600))', () => {
    expect(degrees(acrossFromFocal(300, 342.4))).toBeCloseTo(59.4239, 3);
  });

  it('names what has no size', () => {
    expect(() => acrossFromFocal(0, 640)).toThrowError(expect.objectContaining({ value: 'focalPx' }));
  });
});
