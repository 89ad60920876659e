import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure } from '../projection/testing/arbitraries';
import { turnedByRay } from './viewing-ray';

const IDENTITY = new Float64Array([1, 0, 0, 0, 1, 0, 0, 0, 1]);

describe('turnedByRay', () => {
  it('is a rotation that carries the axis onto the ray, and turns nothing about the axis of the turn', () => {
    fc.assert(
      fc.property(figure(-2, 2), figure(-2, 2), (x, y) => {
        const r = new Float64Array(9);
        turnedByRay(x, y, IDENTITY, r);
        const length = Math.hypot(x, y, 1);
        [x, y, 1].forEach((entry, i) => expect(r[3 * i + 2]).toBeCloseTo(entry / length, 10));
        [0, 1, 2].forEach((i) => expect(r[3 * i] * -y + r[3 * i + 1] * x).toBeCloseTo([-y, x, 0][i], 10));
        const determinant =
          r[0] * (r[4] * r[8] - r[5] * r[7]) - r[1] * (r[3] * r[8] - r[5] * r[6]) + r[2] * (r[3] * r[7] - r[4] * r[6]);
        expect(determinant).toBeCloseTo(1, 10);
      }),
    );
  });

  it('comes after the apparent turn', () => {
    const half = new Float64Array([-1, 0, 0, 0, -1, 0, 0, 0, 1]); // half a turn about the axis
    const [alone, both] = [new Float64Array(9), new Float64Array(9)];
    turnedByRay(0.5, -0.2, IDENTITY, alone);
    turnedByRay(0.5, -0.2, half, both);
    for (const i of [0, 1, 3, 4, 6, 7]) expect(both[i]).toBeCloseTo(-alone[i], 12);
    for (const i of [2, 5, 8]) expect(both[i]).toBeCloseTo(alone[i], 12);
  });
});
