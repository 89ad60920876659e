import type { BoardView } from './board-messages';
import { isNewView, movedPx } from './view-choice';

const ids = Array.from({ length: 24 }, (_, i) => i);
const view = (x: number, y = 0, seen = ids): BoardView => ({ ids: seen, corners: seen.flatMap((id) => [x + (id % 6) * 40, y + Math.floor(id / 6) * 40]) });

describe('which views of the board are kept', () => {
  it('measures how far the board moved by the corners both see (by hand: 3-4-5)', () => {
    expect(movedPx(view(100), view(103, 4, ids.slice(6)))).toBe(5);
    expect(movedPx(view(100, 0, [0, 1, 2]), view(100))).toBeNull();
  });

  it('takes one that is still and new', () => {
    expect(isNewView(view(200), view(199), [view(100)], 1280)).toBe(true);
  });

  it('leaves one that moves, one like another, and one of which little is seen', () => {
    expect(isNewView(view(200), view(190), [], 1280)).toBe(false);
    expect(isNewView(view(200), null, [], 1280)).toBe(false);
    expect(isNewView(view(200), view(200), [view(140)], 1280)).toBe(false);
    expect(isNewView(view(200, 0, ids.slice(0, 11)), view(200), [], 1280)).toBe(false);
  });
});
