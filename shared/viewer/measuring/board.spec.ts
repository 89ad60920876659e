import { describe, expect, it } from 'vitest';
import { BOARD, BOARD_HEIGHT_MM, BOARD_WIDTH_MM, CORNER_COUNT, blackOfBoard } from './board';

describe('the board', () => {
  it('fits on A4 lying (297 x 210 mm, ISO 216) with 15 mm to each side', () => {
    expect(BOARD_WIDTH_MM).toBeLessThanOrEqual(297 - 30);
    expect(BOARD_HEIGHT_MM).toBeLessThanOrEqual(210 - 30);
    expect(CORNER_COUNT).toBe(24);
  });

  it('has 18 black squares and 17 markers within the white ones (by hand: 35 squares, the corners black)', () => {
    const black = blackOfBoard();
    const squares = black.filter(({ width, height }) => width === BOARD.squareMm && height === BOARD.squareMm);
    expect(squares).toHaveLength(18);
    const inMarkers = black.filter(({ height }) => height < BOARD.squareMm);
    const marked = new Set(inMarkers.map(({ x, y }) => `${Math.floor(x / BOARD.squareMm)},${Math.floor(y / BOARD.squareMm)}`));
    expect(marked.size).toBe(17);
    for (const square of marked) {
      const [column, row] = square.split(',').map(Number);
      expect((column + row) % 2).toBe(1);
    }
  });
});
