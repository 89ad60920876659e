import type { BoardView } from './board-messages';

/** Views to be gathered before the lens is worth telling, and when there are enough. */
export const fewestViews = 6;
export const enoughViews = 14;
/** Half of the corners hold a view firmly. */
const fewestCorners = 12;
/** A board that moved less than this since the last look is still, px; one that moved less than that share of the picture is no new view. */
const stillPx = 3;
const newShare = 0.06;

/** The greatest distance between where two views see the same corner, px; null where they share fewer than four. */
export function movedPx(a: BoardView, b: BoardView): number | null {
  const at = new Map(a.ids.map((id, i) => [id, i]));
  const distances = b.ids.flatMap((id, j) => {
    const i = at.get(id);
    return i === undefined ? [] : [Math.hypot(a.corners[2 * i] - b.corners[2 * j], a.corners[2 * i + 1] - b.corners[2 * j + 1])];
  });
  return distances.length < 4 ? null : Math.max(...distances);
}

/** Whether a view is to be kept: enough of the board is seen, it is held still, and it is unlike those kept before. */
export function isNewView(view: BoardView, before: BoardView | null, kept: readonly BoardView[], pictureWidth: number): boolean {
  if (view.ids.length < fewestCorners || !before) return false;
  if ((movedPx(before, view) ?? Infinity) > stillPx) return false;
  return kept.every((one) => (movedPx(one, view) ?? Infinity) > newShare * pictureWidth);
}
