import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { writeOffAxisMatrix } from './frustum';
import { project } from './layer-on-glass';
import { anyEye, anyGlass, figure } from './testing/arbitraries';
import type { Glass, Point3 } from './types';

const GLASS = { widthMm: 527.04, heightMm: 296.46 };

// Computed after R. Kooima (2009), near 10, far 5000: left, right, bottom, top, and the two off-axis terms of the matrix.
const TABLE = [
  { eye: { x: 0, y: 0, z: 600 }, sides: [-4.392, 4.392, -2.4705, 2.4705], offAxis: [0, 0] },
  { eye: { x: 100, y: 0, z: 600 }, sides: [-6.058667, 2.725333, -2.4705, 2.4705], offAxis: [-0.379478, 0] },
  {
    eye: { x: -150, y: 80, z: 700 },
    sides: [-1.621714, 5.907429, -3.260429, 0.974714],
    offAxis: [0.569217, -0.539702],
  },
  {
    eye: { x: 60.5, y: -40.25, z: 450 },
    sides: [-7.200444, 4.511556, -2.399556, 4.188444],
    offAxis: [-0.229584, 0.271537],
  },
];

function matrixOf(glass: Glass, eye: Point3, nearMm: number, farMm: number): number[] {
  const out = new Array<number>(16).fill(NaN);
  writeOffAxisMatrix(glass, eye, nearMm, farMm, out);
  return out;
}

describe('writeOffAxisMatrix', () => {
  it.each(TABLE)('from $eye is as the table says', ({ eye, sides, offAxis }) => {
    const m = matrixOf(GLASS, eye, 10, 5000);
    // The edges on the near plane, back from the matrix (glFrustum solved for them).
    const found = [(m[8] - 1) / m[0], (m[8] + 1) / m[0], (m[9] - 1) / m[5], (m[9] + 1) / m[5]];
    found.forEach((side, i) => expect(10 * side).toBeCloseTo(sides[i], 6));
    expect(m[8]).toBeCloseTo(offAxis[0], 6);
    expect(m[9]).toBeCloseTo(offAxis[1], 6);
  });

  it('is the perspective matrix of the OpenGL convention: -1..1, near 1, far 100 (read in a general-purpose library’s own test)', () => {
    const expected = [1, 0, 0, 0, 0, 1, 0, 0, 0, 0, -101 / 99, -1, 0, 0, -200 / 99, 0];
    matrixOf({ widthMm: 2, heightMm: 2 }, { x: 0, y: 0, z: 1 }, 1, 100).forEach((entry, i) => expect(entry).toBeCloseTo(expected[i], 12));
  });

  it('places every point on the glass where the ray does', () => {
    fc.assert(
      fc.property(
        anyGlass,
        anyEye,
        figure(-2000, 2000),
        figure(-2000, 2000),
        figure(-4000, 150),
        (glass, eye, x, y, z) => {
          const m = matrixOf(glass, eye, 10, 20_000);
          const [cx, cy, cz] = [x - eye.x, y - eye.y, z - eye.z];
          const w = m[3] * cx + m[7] * cy + m[11] * cz;
          const seen = project({ x, y, z }, eye);
          expect((((m[0] * cx + m[8] * cz) / w) * glass.widthMm) / 2).toBeCloseTo(seen.x, 6);
          expect((((m[5] * cy + m[9] * cz) / w) * glass.heightMm) / 2).toBeCloseTo(seen.y, 6);
        },
      ),
    );
  });

  it.each([
    ['glass.widthMm', () => matrixOf({ widthMm: 0, heightMm: 10 }, TABLE[0].eye, 10, 5000)],
    ['glass.heightMm', () => matrixOf({ widthMm: 10, heightMm: -1 }, TABLE[0].eye, 10, 5000)],
    ['eye.z', () => matrixOf(GLASS, { x: 0, y: 0, z: 0 }, 10, 5000)],
    ['nearMm', () => matrixOf(GLASS, TABLE[0].eye, 0, 5000)],
    ['farMm', () => matrixOf(GLASS, TABLE[0].eye, 10, 10)],
  ])('names %s when it is impossible', (value, attempt) => {
    expect(attempt).toThrowError(expect.objectContaining({ name: 'GeometryError', value }));
  });
});
