import type { Point } from './flat-face';

/** Three places in the list of points. */
export type Corners = readonly [number, number, number];

interface Circled {
  readonly corners: Corners;
  readonly x: number;
  readonly y: number;
  readonly radius2: number;
}

/**
 * The Delaunay triangulation of points in the plane: no circle through a triangle's corners holds another point. Points are put in one by one
 * (A. Bowyer, D. F. Watson, The Computer Journal 24(2), 1981), in time of the square of their number: for some hundred points.
 */
export function triangulate(points: readonly Point[]): Corners[] {
  const all = [...points, ...enclosing(points)];
  const n = points.length;
  let triangles: Circled[] = [circled(all, [n, n + 1, n + 2])];
  for (let p = 0; p < n; p++) {
    const [x, y] = all[p];
    const holds = ({ x: cx, y: cy, radius2 }: Circled): boolean => (x - cx) ** 2 + (y - cy) ** 2 < radius2;
    const rim = rimOf(triangles.filter(holds));
    triangles = triangles.filter((triangle) => !holds(triangle));
    for (const [a, b] of rim) triangles.push(circled(all, [a, b, p]));
  }
  return triangles.map(({ corners }) => corners).filter((corners) => corners.every((corner) => corner < n));
}

/** Three points so far out that they do not matter. */
function enclosing(points: readonly Point[]): Point[] {
  const reach = 1e4 * Math.max(1, ...points.flat().map(Math.abs));
  return [
    [-reach, -reach],
    [reach, -reach],
    [0, reach],
  ];
}

/** The edges that belong to one of the triangles only. */
function rimOf(triangles: readonly Circled[]): [number, number][] {
  const edges = new Map<string, [number, number]>();
  for (const { corners } of triangles) {
    for (let k = 0; k < 3; k++) {
      const [a, b] = [corners[k], corners[(k + 1) % 3]];
      if (!edges.delete(`${String(b)} ${String(a)}`)) edges.set(`${String(a)} ${String(b)}`, [a, b]);
    }
  }
  return [...edges.values()];
}

/** The circle through three points. */
function circled(points: readonly Point[], corners: Corners): Circled {
  const [[ax, ay], [bx, by], [cx, cy]] = corners.map((corner) => points[corner]);
  const [ux, uy, vx, vy] = [bx - ax, by - ay, cx - ax, cy - ay];
  const twice = 2 * (ux * vy - uy * vx);
  const [u2, v2] = [ux * ux + uy * uy, vx * vx + vy * vy];
  const x = (vy * u2 - uy * v2) / twice;
  const y = (ux * v2 - vx * u2) / twice;
  return { corners, x: ax + x, y: ay + y, radius2: x * x + y * y };
}
