import type { Point2 } from '@oriel/shared/projection/types';
import { depthToPx, pxToDepth } from './depth-scale';
import type { DepthFrame, ElevationFrame } from './frames';

/** A point of the scene's cross-section: along the axis the view shares with the elevation, and z toward the viewer, mm. */
export interface Across {
  readonly across: number;
  readonly z: number;
}

/** Where a point of the cross-section is drawn, px on the paper. */
export function drawnAt(frame: DepthFrame, { across, z }: Across): Point2 {
  const along = frame.glassAt - depthToPx(frame.depth, -z);
  return frame.view === 'plan'
    ? { x: frame.centre + across * frame.pxPerMm, y: along }
    : { x: along, y: frame.centre - across * frame.pxPerMm };
}

/** The inverse of `drawnAt`. */
export function pointedAt(frame: DepthFrame, { x, y }: Point2): Across {
  const [side, along] = frame.view === 'plan' ? [x - frame.centre, y] : [frame.centre - y, x];
  return { across: side / frame.pxPerMm, z: -pxToDepth(frame.depth, frame.glassAt - along) };
}

/** The farthest depth and the farthest eye within the frame, mm. */
export function depthRangeOf(frame: DepthFrame): { readonly behindMm: number; readonly beforeMm: number } {
  const [start, length] = frame.view === 'plan' ? [frame.top, frame.height] : [frame.left, frame.width];
  return {
    behindMm: pxToDepth(frame.depth, frame.glassAt - start),
    beforeMm: -pxToDepth(frame.depth, frame.glassAt - start - length),
  };
}

/** Where a point on the glass is drawn in the elevation, px on the paper. */
export function drawnOnGlass(frame: ElevationFrame, { x, y }: Point2): Point2 {
  return { x: frame.centreX + x * frame.pxPerMm, y: frame.centreY - y * frame.pxPerMm };
}
