import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { GeometryError } from './geometry-error';
import { layerOnGlass, layerScale, layerShift, project } from './layer-on-glass';
import { anyDepth, anyEye, figure } from './testing/arbitraries';

// Computed (ray and perspective matrix agreed), after R. Kooima, Generalized Perspective Projection (2009): where three points are seen on the glass.
const SEEN = [
  { eye: { x: 0, y: 0, z: 600 }, behind: [0, 0], before: [0, 0], aside: [37.5, -22.5] },
  { eye: { x: 100, y: 0, z: 600 }, behind: [14.285714, 0], before: [-9.090909, 0], aside: [62.5, -22.5] },
  {
    eye: { x: -150, y: 80, z: 700 },
    behind: [-18.75, 10],
    before: [11.538462, -6.153846],
    aside: [5.555556, -5.555556],
  },
  {
    eye: { x: 60.5, y: -40.25, z: 450 },
    behind: [11, -7.318182],
    before: [-7.5625, 5.03125],
    aside: [53.230769, -33.153846],
  },
];

describe('project', () => {
  it.each(SEEN)('sees points from $eye where the table says', ({ eye, behind, before, aside }) => {
    for (const [point, [x, y]] of [
      [{ x: 0, y: 0, z: -100 }, behind],
      [{ x: 0, y: 0, z: 50 }, before],
      [{ x: 50, y: -30, z: -200 }, aside],
    ] as const) {
      const seen = project(point, eye);
      expect(seen.x).toBeCloseTo(x, 6);
      expect(seen.y).toBeCloseTo(y, 6);
    }
  });

  it('leaves a point on the glass where it is', () => {
    fc.assert(
      fc.property(anyEye, figure(-2000, 2000), figure(-2000, 2000), (eye, x, y) => {
        const seen = project({ x, y, z: 0 }, eye);
        expect(seen.x).toBeCloseTo(x, 9);
        expect(seen.y).toBeCloseTo(y, 9);
      }),
    );
  });

  it('mirrors the picture when eye and point are mirrored', () => {
    fc.assert(
      fc.property(anyEye, anyDepth, figure(-2000, 2000), (eye, depthMm, x) => {
        const seen = project({ x, y: 0, z: -depthMm }, eye);
        const mirrored = project({ x: -x, y: 0, z: -depthMm }, { ...eye, x: -eye.x });
        expect(mirrored.x).toBeCloseTo(-seen.x, 9);
        expect(mirrored.y).toBeCloseTo(seen.y, 9);
      }),
    );
  });
});

describe('layerShift and layerScale', () => {
  it('shift with an error of distance as computed: 10 % of 600 mm moves a layer at 100 mm by 0.19 mm of 14.29 mm', () => {
    const true600 = layerShift({ x: 100, y: 0, z: 600 }, 100).x;
    // A wrong distance moves the eye along its ray, so x is wrong by the same 10 %.
    expect(true600).toBeCloseTo(14.2857, 4);
    expect(true600 - layerShift({ x: 110, y: 0, z: 660 }, 100).x).toBeCloseTo(-0.19, 2);
  });

  it('shift a layer at 1000 mm by 6 % for the same error (computed)', () => {
    const wrong = layerShift({ x: 110, y: 0, z: 660 }, 1000).x / layerShift({ x: 100, y: 0, z: 600 }, 1000).x - 1;
    expect(wrong).toBeCloseTo(0.06, 2);
  });

  it.each([
    [20, 0.57],
    [50, 1.43],
    [100, 2.86],
  ])('a head at 200 mm/s moves a layer at 100 mm (D = 600) in %i ms by %f mm (computed)', (ms, mm) => {
    expect(layerShift({ x: (200 * ms) / 1000, y: 0, z: 600 }, 100).x).toBeCloseTo(mm, 2);
  });

  it('together place every point as the ray does', () => {
    fc.assert(
      fc.property(anyEye, anyDepth, figure(-2000, 2000), figure(-2000, 2000), (eye, depthMm, x, y) => {
        const scale = layerScale(eye, depthMm);
        const shift = layerShift(eye, depthMm);
        const seen = project({ x, y, z: -depthMm }, eye);
        expect(x * scale + shift.x).toBeCloseTo(seen.x, 8);
        expect(y * scale + shift.y).toBeCloseTo(seen.y, 8);
      }),
    );
  });

  it('shift a layer at infinity exactly with the eye', () => {
    fc.assert(
      fc.property(anyEye, (eye) => {
        const shift = layerShift(eye, 1e15);
        expect(shift.x).toBeCloseTo(eye.x, 6);
        expect(shift.y).toBeCloseTo(eye.y, 6);
      }),
    );
  });

  it('shift more the deeper the layer', () => {
    fc.assert(
      fc.property(anyEye, anyDepth, figure(0.1, 5000), (eye, depthMm, further) => {
        const nearer = layerShift({ ...eye, x: 100 }, depthMm).x;
        expect(layerShift({ ...eye, x: 100 }, depthMm + further).x).toBeGreaterThan(nearer);
      }),
    );
  });
});

describe('layerOnGlass', () => {
  it('writes the same scale and shift into the given object', () => {
    fc.assert(
      fc.property(anyEye, anyDepth, (eye, depthMm) => {
        const out = { scale: 0, x: 0, y: 0 };
        layerOnGlass(eye, depthMm, out);
        expect(out.scale).toBeCloseTo(layerScale(eye, depthMm), 9);
        expect({ x: out.x, y: out.y }).toEqual(layerShift(eye, depthMm));
      }),
    );
  });
});

describe('impossible inputs', () => {
  const out = { scale: 0, x: 0, y: 0 };
  it.each([
    ['eye.z', () => layerScale({ x: 0, y: 0, z: 0 }, 100)],
    ['eye.z', () => layerShift({ x: 0, y: 0, z: -5 }, 100)],
    ['eye.z', () => layerScale({ x: 0, y: 0, z: Infinity }, 100)],
    ['eye.x', () => layerShift({ x: NaN, y: 0, z: 600 }, 100)],
    ['eye.y', () => project({ x: 0, y: 0, z: 0 }, { x: 0, y: Infinity, z: 600 })],
    ['depthMm', () => layerScale({ x: 0, y: 0, z: 600 }, -600)],
    ['depthMm', () => layerOnGlass({ x: 0, y: 0, z: 600 }, -700, out)],
    ['depthMm', () => layerShift({ x: 0, y: 0, z: 600 }, NaN)],
    ['point.x', () => project({ x: NaN, y: 0, z: 0 }, { x: 0, y: 0, z: 600 })],
  ])('name %s', (value, attempt) => {
    expect(attempt).toThrowError(GeometryError);
    expect(attempt).toThrowError(expect.objectContaining({ value }));
  });
});
