import { tilesOf } from './tiles';

describe('tilesOf', () => {
  it('covers 1280 x 720 with six squares of 480', () => {
    const tiles = tilesOf(1280, 720);
    expect(tiles.map(({ cx, cy, size }) => [cx, cy, size])).toEqual([
      [240, 240, 480],
      [640, 240, 480],
      [1040, 240, 480],
      [240, 480, 480],
      [640, 480, 480],
      [1040, 480, 480],
    ]);
  });

  it.each([
    [640, 480],
    [1280, 720],
    [1920, 1080],
    [720, 1280],
  ])('leaves no pixel of %i x %i out', (width, height) => {
    const tiles = tilesOf(width, height);
    const missed: [number, number][] = [];
    for (let y = 0.5; y < height; y += 7) {
      for (let x = 0.5; x < width; x += 7) {
        const covered = tiles.some(({ cx, cy, size }) => Math.abs(x - cx) <= size / 2 && Math.abs(y - cy) <= size / 2);
        if (!covered) missed.push([x, y]);
      }
    }
    expect(missed).toEqual([]);
  });

  it('has none for a frame no larger than one square', () => {
    expect(tilesOf(320, 240)).toEqual([]);
  });
});
