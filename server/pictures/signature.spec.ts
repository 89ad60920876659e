import { describe, expect, it } from 'vitest';
import { formatOf } from './signature';
import { quadrants } from './testing/quadrants';

describe('formatOf', () => {
  it.each(['jpeg', 'png', 'webp', 'tiff', 'gif', 'avif'] as const)('knows %s as sharp writes it', async (format) => {
    expect(formatOf(await quadrants().toFormat(format).toBuffer())).toBe(format);
  });

  // ISO/IEC 23008-12 (memory): a general brand first, and the codec's own among those it is compatible with.
  it('knows HEIC and AVIF by a compatible brand', () => {
    const file = (...brands: string[]) => {
      const bytes = Buffer.alloc(16 + 4 * (brands.length - 1));
      bytes.writeUInt32BE(bytes.length, 0);
      bytes.write('ftyp', 4, 'latin1');
      brands.forEach((brand, i) => bytes.write(brand, i === 0 ? 8 : 12 + 4 * i, 'latin1'));
      return bytes;
    };
    expect(formatOf(file('mif1', 'miaf', 'heic'))).toBe('heic');
    expect(formatOf(file('mif1', 'avif'))).toBe('avif');
    expect(formatOf(file('isom', 'mp42'))).toBeNull();
  });

  it.each([
    ['nothing', ''],
    ['text', 'The meadow, in words only, long enough to be read.'],
    ['SVG', '<svg xmlns="http://www.w3.org/2000/svg"><script>1</script></svg>'],
    ['PDF', '%PDF-1.7 and so on'],
    ['a page', '<!doctype html><script>alert(1)</script>'],
  ])('security: takes %s for no picture', (_what, text) => {
    expect(formatOf(Buffer.from(text))).toBeNull();
  });
});
