import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { frustumMatrix, offAxisFrustum, writeOffAxisMatrix } from './frustum';
import { project } from './layer-on-glass';
import { anyEye, anyGlass, figure } from './testing/arbitraries';

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

describe('offAxisFrustum', () => {
  it.each(TABLE)('from $eye is as the table says', ({ eye, sides, offAxis }) => {
    const frustum = offAxisFrustum(GLASS, eye, 10, 5000);
    [frustum.left, frustum.right, frustum.bottom, frustum.top].forEach((side, i) =>
      expect(side).toBeCloseTo(sides[i], 6),
    );
    const matrix = frustumMatrix(frustum);
    expect(matrix[8]).toBeCloseTo(offAxis[0], 6);
    expect(matrix[9]).toBeCloseTo(offAxis[1], 6);
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
          const m = frustumMatrix(offAxisFrustum(glass, eye, 10, 20_000));
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
    ['glass.widthMm', () => offAxisFrustum({ widthMm: 0, heightMm: 10 }, TABLE[0].eye, 10, 5000)],
    ['glass.heightMm', () => offAxisFrustum({ widthMm: 10, heightMm: -1 }, TABLE[0].eye, 10, 5000)],
    ['eye.z', () => offAxisFrustum(GLASS, { x: 0, y: 0, z: 0 }, 10, 5000)],
    ['nearMm', () => offAxisFrustum(GLASS, TABLE[0].eye, 0, 5000)],
    ['farMm', () => offAxisFrustum(GLASS, TABLE[0].eye, 10, 10)],
  ])('names %s when it is impossible', (value, attempt) => {
    expect(attempt).toThrowError(expect.objectContaining({ name: 'GeometryError', value }));
  });
});

describe('frustumMatrix', () => {
  it('is the perspective matrix of the OpenGL convention: -1..1, near 1, far 100 (read in a general-purpose library’s own test)', () => {
    expect(frustumMatrix({ left: -1, right: 1, bottom: -1, top: 1, near: 1, far: 100 })).toEqual([
      ...[1, 0, 0, 0],
      ...[0, 1, 0, 0],
      ...[0, 0, -101 / 99, -1],
      ...[0, 0, -200 / 99, 0],
    ]);
  });
});

describe('writeOffAxisMatrix', () => {
  it('is the matrix of the frustum', () => {
    const out = new Array<number>(16).fill(NaN);
    fc.assert(
      fc.property(anyGlass, anyEye, (glass, eye) => {
        writeOffAxisMatrix(glass, eye, 10, 20_000, out);
        frustumMatrix(offAxisFrustum(glass, eye, 10, 20_000)).forEach((entry, i) =>
          expect(out[i]).toBeCloseTo(entry, 9),
        );
      }),
    );
  });
});
