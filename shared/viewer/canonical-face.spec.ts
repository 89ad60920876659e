import { describe, expect, it } from 'vitest';
import { CANONICAL_FACE_CM, LANDMARK_COUNT } from './canonical-face';

const apartMm = (a: number, b: number) =>
  10 * Math.hypot(...[0, 1, 2].map((axis) => CANONICAL_FACE_CM[3 * a + axis] - CANONICAL_FACE_CM[3 * b + axis]));

describe('the canonical face', () => {
  it('has 468 vertices', () => {
    expect(CANONICAL_FACE_CM).toHaveLength(3 * LANDMARK_COUNT);
  });

  // Read and computed from the canonical face model; mm.
  it.each([
    ['outer eye corners', 33, 263, 88.917],
    ['inner eye corners', 133, 362, 37.129],
    ['forehead to chin', 10, 152, 176.66],
    ['width', 234, 454, 153.28],
  ])('has its %s (%i, %i) %f mm apart', (_, a, b, mm) => {
    expect(Math.abs(apartMm(a, b) - mm)).toBeLessThan(0.01);
  });
});
