import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { triangulate } from './delaunay';
import type { Point } from './flat-face';
import { repeatableRandom } from './random';

const SQUARE: Point[] = [
  [0, 0],
  [100, 0],
  [100, 100],
  [0, 100],
];

const twiceArea = ([ax, ay]: Point, [bx, by]: Point, [cx, cy]: Point): number =>
  (bx - ax) * (cy - ay) - (by - ay) * (cx - ax);

describe('the triangulation', () => {
  it('covers a square of scattered points once, with 2n - 2 - 4 triangles (Euler), none of whose circles holds a point', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), (seed) => {
        const random = repeatableRandom(seed);
        const inner = Array.from({ length: 30 }, (): Point => [1 + 98 * random(), 1 + 98 * random()]);
        const points = [...SQUARE, ...inner];
        const triangles = triangulate(points);
        expect(triangles).toHaveLength(2 * points.length - 2 - 4);
        const areas = triangles.map(([a, b, c]) => twiceArea(points[a], points[b], points[c]));
        expect(areas.reduce((sum, area) => sum + Math.abs(area), 0)).toBeCloseTo(20_000, 4);
        for (const [a, b, c] of triangles) {
          for (const other of points) expect(inCircle(points[a], points[b], points[c], other)).toBeLessThan(1e-6);
        }
      }),
      { numRuns: 20 },
    );
  });
});

/** The in-circle determinant (memory: J. R. Shewchuk, Adaptive Precision Floating-Point Arithmetic, 1997), positive within, over twice the area. */
function inCircle(a: Point, b: Point, c: Point, d: Point): number {
  const rows = [a, b, c].map(([x, y]) => [x - d[0], y - d[1], (x - d[0]) ** 2 + (y - d[1]) ** 2]);
  const [p, q, r] = rows;
  const determinant =
    p[0] * (q[1] * r[2] - q[2] * r[1]) - p[1] * (q[0] * r[2] - q[2] * r[0]) + p[2] * (q[0] * r[1] - q[1] * r[0]);
  return ((determinant / Math.abs(twiceArea(a, b, c))) * Math.sign(twiceArea(a, b, c))) / 1e3;
}
