/*
 * The board for measuring a camera: a chessboard with an ArUco marker in each white square (ChArUco; S. Garrido-Jurado et al., Pattern
 * Recognition 47(6), 2014), as OpenCV draws and finds it since 4.6: the left upper square is black, markers are numbered row by row, and
 * the inner corners of the chessboard likewise. It fits on A4 lying, with a margin that any printer leaves. The focal length in pixels
 * does not depend on the size at which it is printed, as long as it is printed evenly.
 */
export const BOARD = { columns: 7, rows: 5, squareMm: 35, markerMm: 26 } as const;

/** The first markers of OpenCV's dictionary DICT_4X4_50 (OpenCV, Apache-2.0): four rows of four bits each, 1 is white. */
const markerBits = [0xb532, 0x0f9a, 0x332d, 0x9946, 0x549e, 0x79cd, 0x9e2e, 0xc4f2, 0xfeda, 0xcf56, 0xf991, 0x11a7, 0x0eb7, 0x2a0f, 0x24b1, 0x263e, 0x4665];
const bitsAcross = 4;
/** A marker has a black border one cell wide. */
const cellsAcross = bitsAcross + 2;

/** A rectangle of the printed board: from its left upper corner to the right and down, mm. */
export interface BoardRectangle {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

const { columns, rows, squareMm, markerMm } = BOARD;
export const BOARD_WIDTH_MM = columns * squareMm;
export const BOARD_HEIGHT_MM = rows * squareMm;

/** Everything black on the board. */
export function blackOfBoard(): BoardRectangle[] {
  const black: BoardRectangle[] = [];
  let marker = 0;
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const [x, y] = [column * squareMm, row * squareMm];
      if ((row + column) % 2 === 0) black.push({ x, y, width: squareMm, height: squareMm });
      else black.push(...blackOfMarker(markerBits[marker++], x + (squareMm - markerMm) / 2, y + (squareMm - markerMm) / 2));
    }
  }
  return black;
}

/** Black cells of one marker, neighbours in a row joined. */
function blackOfMarker(bits: number, left: number, top: number): BoardRectangle[] {
  const cell = markerMm / cellsAcross;
  const isBlack = (row: number, column: number) => {
    const [r, c] = [row - 1, column - 1];
    if (r < 0 || c < 0 || r >= bitsAcross || c >= bitsAcross) return true;
    return ((bits >> (bitsAcross * bitsAcross - 1 - (r * bitsAcross + c))) & 1) === 0;
  };
  const black: BoardRectangle[] = [];
  for (let row = 0; row < cellsAcross; row++) {
    for (let column = 0; column < cellsAcross; ) {
      let end = column;
      while (end < cellsAcross && isBlack(row, end)) end++;
      if (end > column) black.push({ x: left + column * cell, y: top + row * cell, width: (end - column) * cell, height: cell });
      column = Math.max(end, column + 1);
    }
  }
  return black;
}

/** How many inner corners the chessboard has. */
export const CORNER_COUNT = (columns - 1) * (rows - 1);
