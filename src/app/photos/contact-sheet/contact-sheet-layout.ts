import type { Photo } from '@oriel/shared/contracts/photos';

export interface Tile {
  readonly photo: Photo;
  readonly leftPx: number;
  readonly widthPx: number;
}
export interface Row {
  readonly topPx: number;
  readonly heightPx: number;
  /** Month of the row, shown as a heading above the first row of each. */
  readonly month: string;
  readonly heading: boolean;
  readonly tiles: readonly Tile[];
}
export interface ContactSheetLayout {
  readonly rows: readonly Row[];
  readonly heightPx: number;
}

export const headingPx = 44;
const gapPx = 4;
const monthOf = new Intl.DateTimeFormat('en-GB', { month: 'long', year: 'numeric', timeZone: 'UTC' });

/** Panoramas and strips are shown cropped, so that a row stays a row. */
const shapeOf = (photo: Photo) => Math.min(3, Math.max(0.5, photo.width / photo.height));

/**
 * Lays photos, newest first, into rows of about `rowPx` that fill `widthPx`, a heading before each month: tiles keep their shape, and each
 * full row is stretched to the width; a month's last row keeps the plain height. Linear in the number of photos.
 */
export function layContactSheet(photos: readonly Photo[], widthPx: number, rowPx: number): ContactSheetLayout {
  const rows: Row[] = [];
  let topPx = 0;
  let waiting: Photo[] = [];
  let month = '';
  let heading = false;

  const setRow = (full: boolean) => {
    if (waiting.length === 0) return;
    const shapes = waiting.map(shapeOf);
    const room = widthPx - gapPx * (waiting.length - 1);
    const sum = shapes.reduce((a, b) => a + b, 0);
    const heightPx = full ? room / sum : Math.min(rowPx, room / sum);
    let leftPx = 0;
    const tiles = waiting.map((photo, i) => {
      const tile = { photo, leftPx, widthPx: shapes[i] * heightPx };
      leftPx += tile.widthPx + gapPx;
      return tile;
    });
    if (heading) topPx += headingPx;
    rows.push({ topPx, heightPx, month, heading, tiles });
    topPx += heightPx + gapPx;
    heading = false;
    waiting = [];
  };

  let shapesInRow = 0;
  let yearAndMonth = '';
  for (const photo of photos) {
    // Dates stand as the camera's clock had them: year and month are their first characters.
    const own = photo.takenAt.slice(0, 7);
    if (own !== yearAndMonth) {
      setRow(false);
      yearAndMonth = own;
      month = monthOf.format(new Date(photo.takenAt));
      heading = true;
      shapesInRow = 0;
    }
    waiting.push(photo);
    shapesInRow += shapeOf(photo);
    if (shapesInRow * rowPx + gapPx * (waiting.length - 1) >= widthPx) {
      setRow(true);
      shapesInRow = 0;
    }
  }
  setRow(false);
  return { rows, heightPx: topPx };
}

/** The rows that touch a stretch of the sheet, by binary search: [first, behind the last). */
export function rowsBetween(rows: readonly Row[], fromPx: number, toPx: number): readonly [number, number] {
  return [firstRow(rows, (row) => row.topPx + row.heightPx >= fromPx), firstRow(rows, (row) => row.topPx - headingPx > toPx)];
}

function firstRow(rows: readonly Row[], holds: (row: Row) => boolean): number {
  let low = 0;
  let high = rows.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (holds(rows[middle])) high = middle;
    else low = middle + 1;
  }
  return low;
}
