import type { Point2 } from '@oriel/shared/projection/types';
import type { DepthScale } from './depth-scale';

/** A rectangle of the paper, px. */
export interface Frame {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** The view from the front: x to the right, y up, about the centre of the glass. */
export interface ElevationFrame extends Frame {
  readonly centreX: number;
  readonly centreY: number;
  readonly pxPerMm: number;
}

/**
 * A view in which depth is seen. In the plan (from above) `across` is x and the viewer stands below; in the section (from
 * the left) `across` is y and the viewer stands to the right. Behind the glass lies toward the elevation in both: first angle.
 */
export interface DepthFrame extends Frame {
  readonly view: 'plan' | 'section';
  /** Where the centre of the glass lies along the shared axis, px. */
  readonly centre: number;
  readonly pxPerMm: number;
  /** Where the glass lies along the depth axis, px. */
  readonly glassAt: number;
  readonly depth: DepthScale;
}

/** Room on the page, px. */
export interface Room {
  readonly width: number;
  readonly height: number;
}

/** Points as SVG's `points` has them. */
export const asPoints = (points: readonly Point2[]) => points.map(({ x, y }) => `${x.toFixed(2)},${y.toFixed(2)}`).join(' ');

/** The rectangle between two opposite corners. */
export const boxOf = (a: Point2, b: Point2): Frame => ({
  left: Math.min(a.x, b.x),
  top: Math.min(a.y, b.y),
  width: Math.abs(b.x - a.x),
  height: Math.abs(b.y - a.y),
});
