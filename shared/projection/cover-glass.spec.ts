import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { coverGlass, placeTrimmed, placeTrimmedIn } from './cover-glass';
import { livingRoom } from './living-room';

const { glass } = livingRoom('landscape');

describe('coverGlass', () => {
  // Loss of a cover crop = 1 - min(a/b, b/a), a and b the two ratios of width to height (computed).
  it.each([
    [3, 2, 16, 9, 0.15625],
    [4, 3, 16, 9, 0.25],
    [16, 11, 16, 9, 0.181818],
    [1, 1, 16, 9, 0.4375],
    [3, 2, 9, 16, 0.625],
    [4, 3, 9, 16, 0.578125],
  ])('crops %i:%i on %i:%i by the known part', (width, height, across, up, loss) => {
    const covered = coverGlass({ widthMm: across, heightMm: up }, width, height);
    expect(1 - (across * up) / (covered.widthMm * covered.heightMm)).toBeCloseTo(loss, 6);
  });

  it('covers the glass tightly, in the shape of the picture, whatever the sizes', () => {
    const size = fc.integer({ min: 1, max: 20_000 });
    fc.assert(
      fc.property(size, size, (width, height) => {
        const covered = coverGlass(glass, width, height);
        expect(covered.widthMm / covered.heightMm / (width / height)).toBeCloseTo(1, 9);
        const spare = [covered.widthMm - glass.widthMm, covered.heightMm - glass.heightMm];
        expect(Math.min(...spare)).toBeCloseTo(0, 6);
      }),
    );
  });
});

describe('placeTrimmed', () => {
  it('places a cut in register with the picture it came from (computed by hand)', () => {
    // 1600 x 900 px covers 1200 x 675 mm at 0.75 mm a pixel; the cut's centre is at px (300, 200), 500 left of and 250 above the middle.
    const image = { width: 400, height: 300, trim: { left: 100, top: 50, ofWidth: 1600, ofHeight: 900 } };
    const placed = placeTrimmed({ widthMm: 1200, heightMm: 675 }, image);
    expect(placed).toEqual({ xMm: -375, yMm: 187.5, widthMm: 300, heightMm: 225 });
  });

  it('places a picture of which nothing was trimmed over the glass', () => {
    const image = { width: 3000, height: 2000, trim: { left: 0, top: 0, ofWidth: 3000, ofHeight: 2000 } };
    expect(placeTrimmed(glass, image)).toEqual(coverGlass(glass, 3000, 2000));
  });

  // By hand: 1210 mm over 1000 px is 1.21 mm a pixel. The quarter at the lower right: 250 px right of the centre and 250 below.
  it('keeps a quarter in its corner', () => {
    const image = { width: 500, height: 500, trim: { left: 500, top: 500, ofWidth: 1000, ofHeight: 1000 } };
    const placed = placeTrimmed(glass, image);
    expect(placed.xMm).toBeCloseTo(302.5, 9);
    expect(placed.yMm).toBeCloseTo(-302.5, 9);
    expect(placed.widthMm).toBeCloseTo(605, 9);
    expect(placed.heightMm).toBeCloseTo(605, 9);
  });

  // By hand: the lower left quarter of a picture stretched over 200 x 40 mm about (10, 20).
  it('keeps a part in its place in any rectangle', () => {
    const image = { width: 50, height: 10, trim: { left: 0, top: 10, ofWidth: 100, ofHeight: 20 } };
    const placed = placeTrimmedIn({ xMm: 10, yMm: 20, widthMm: 200, heightMm: 40 }, image);
    expect(placed).toEqual({ xMm: -40, yMm: 10, widthMm: 100, heightMm: 20 });
  });
});
