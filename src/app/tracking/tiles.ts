import type { Region } from './region';

/** Side of the squares in which far faces are sought: the full-range detector then sees a face at 4 m with 60 degrees across. */
const TILE_PX = 480;

/**
 * Squares that together cover a frame, row by row, overlapping where the frame's sides are no multiple: six for 1280 x 720. None where
 * one square would be the whole frame.
 */
export function tilesOf(width: number, height: number): Region[] {
  if (Math.max(width, height) <= TILE_PX) return [];
  const size = Math.min(TILE_PX, width, height);
  const along = (extent: number): number[] => {
    const count = Math.ceil(extent / size);
    return Array.from({ length: count }, (_, i) => size / 2 + (count === 1 ? 0 : (i * (extent - size)) / (count - 1)));
  };
  return along(height).flatMap((cy) => along(width).map((cx) => ({ cx, cy, size, angleRad: 0 })));
}
