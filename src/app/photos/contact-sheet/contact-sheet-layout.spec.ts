import type { Photo } from '@oriel/shared/contracts/photos';
import { layContactSheet, rowsBetween } from './contact-sheet-layout';

const photo = (id: number, width: number, height: number, takenAt: string) =>
  ({ id: String(id), width, height, takenAt }) as Photo;

describe('the contact sheet', () => {
  const may = Array.from({ length: 10 }, (_, i) => photo(i, 3000, 2000, '2024-05-10T10:00:00Z'));
  const april = [photo(10, 2000, 3000, '2024-04-02T10:00:00Z')];

  it('fills every full row to the width and keeps each photo its shape', () => {
    const { rows } = layContactSheet(may, 1000, 200);
    for (const row of rows.slice(0, -1)) {
      const last = row.tiles[row.tiles.length - 1];
      expect(last.leftPx + last.widthPx).toBeCloseTo(1000, 6);
      for (const tile of row.tiles) expect(tile.widthPx / row.heightPx).toBeCloseTo(1.5, 6);
    }
  });

  it('starts each month on a row of its own, under a heading', () => {
    const { rows } = layContactSheet([...may, ...april], 1000, 200);
    expect(rows.filter((row) => row.heading).map((row) => row.month)).toEqual(['May 2024', 'April 2024']);
    expect(rows[rows.length - 1].tiles).toHaveLength(1);
  });

  it('holds every photo once, in order, rows never overlapping', () => {
    const { rows, heightPx } = layContactSheet([...may, ...april], 777, 150);
    expect(rows.flatMap((row) => row.tiles.map((tile) => tile.photo.id))).toEqual([...may, ...april].map((p) => p.id));
    rows.slice(1).forEach((row, i) => expect(row.topPx).toBeGreaterThanOrEqual(rows[i].topPx + rows[i].heightPx));
    expect(heightPx).toBeGreaterThan(rows[rows.length - 1].topPx);
  });

  it('finds the rows of a stretch just as a search through all of them does', () => {
    const { rows } = layContactSheet([...may, ...april], 500, 100);
    const [first, end] = rowsBetween(rows, 250, 420);
    const seen = rows.filter((row) => row.topPx + row.heightPx >= 250 && row.topPx - 44 <= 420);
    expect(rows.slice(first, end)).toEqual(seen);
  });
});
