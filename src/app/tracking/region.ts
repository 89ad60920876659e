import type { PixelPoint } from './tracking-messages';

/** A square piece of the frame, turned by `angleRad` (clockwise in the picture) about its centre; frame pixels. */
export interface Region {
  readonly cx: number;
  readonly cy: number;
  readonly size: number;
  readonly angleRad: number;
}

/** The region enlarged or reduced about its own centre. */
export const scaled = (region: Region, factor: number): Region => ({ ...region, size: region.size * factor });

/** The region moved by (dx, dy) frame pixels. */
export const moved = (region: Region, dx: number, dy: number): Region => ({
  ...region,
  cx: region.cx + dx,
  cy: region.cy + dy,
});

/** Direction of the line from the subject's right eye to the left: 0 for an upright head. */
export const eyeLineAngle = (rightEye: PixelPoint, leftEye: PixelPoint): number =>
  Math.atan2(leftEye.y - rightEye.y, leftEye.x - rightEye.x);

/** The smallest upright square that holds a frame of this size. */
export const wholeFrame = (width: number, height: number): Region => ({
  cx: width / 2,
  cy: height / 2,
  size: Math.max(width, height),
  angleRad: 0,
});
