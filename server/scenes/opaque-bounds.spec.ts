import * as fc from 'fast-check';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { opaqueBounds } from './opaque-bounds';
import { cutOut } from './testing/cut-out';

describe('opaqueBounds', () => {
  it('finds a rectangle wherever it stands, as it was drawn', async () => {
    const size = { width: 40, height: 30 };
    const part = fc
      .record({
        left: fc.nat(39),
        top: fc.nat(29),
        width: fc.integer({ min: 1, max: 40 }),
        height: fc.integer({ min: 1, max: 30 }),
      })
      .filter(({ left, top, width, height }) => left + width <= size.width && top + height <= size.height);
    await fc.assert(
      fc.asyncProperty(part, async (drawn) => {
        expect(await opaqueBounds(sharp(await cutOut(size, drawn)))).toEqual(drawn);
      }),
      { numRuns: 60 },
    );
  });

  it('holds parts that are apart, and finds a shape by its outermost points', async () => {
    const dots = sharp(Buffer.alloc(20 * 10 * 4), { raw: { width: 20, height: 10, channels: 4 } }).composite(
      [
        [3, 7],
        [15, 2],
        [9, 8],
      ].map(([left, top]) => ({
        input: { create: { width: 1, height: 1, channels: 3 as const, background: 'red' } },
        left,
        top,
      })),
    );
    expect(await opaqueBounds(sharp(await dots.png().toBuffer()))).toEqual({ left: 3, top: 2, width: 13, height: 7 });
  });

  it('finds nothing in what nobody could see', async () => {
    expect(
      await opaqueBounds(
        sharp({ create: { width: 9, height: 9, channels: 4, background: { r: 255, g: 0, b: 0, alpha: 3 / 255 } } }),
      ),
    ).toBeNull();
  });

  it('takes a picture without alpha whole', async () => {
    expect(await opaqueBounds(sharp({ create: { width: 9, height: 7, channels: 3, background: 'red' } }))).toEqual({
      left: 0,
      top: 0,
      width: 9,
      height: 7,
    });
  });
});
