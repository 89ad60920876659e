import type { Point2 } from '@oriel/shared/projection/types';
import type { Frame } from '../../drawing/frames';

/** The word beside the home eye's cross, px. */
const word = { width: 32, height: 11 };
/** Where it may begin, from the middle of the cross to its base line: right above, right below, left above. */
const places: readonly Point2[] = [{ x: 9, y: -6 }, { x: 9, y: 16 }, { x: -9 - word.width, y: -6 }];

/** Where the word stands so that it covers nothing of what is taken, from the middle of the cross; null where there is no room. */
export const homeWordAt = (home: Point2, taken: readonly Frame[]): Point2 | null =>
  places.find(({ x, y }) => {
    const own = { left: home.x + x, top: home.y + y - word.height, ...word };
    return !taken.some((box) => own.left < box.left + box.width && box.left < own.left + own.width && own.top < box.top + box.height && box.top < own.top + own.height);
  }) ?? null;
