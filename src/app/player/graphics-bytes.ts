const bytesAPixel = 4;

/** A picture or surface of 8 bits a channel. */
export const pixelBytes = (widthPx: number, heightPx: number): number => Math.ceil(widthPx) * Math.ceil(heightPx) * bytesAPixel;

/**
 * A texture with all its mipmaps: each level has half the edges of the one before, rounded down but never below one pixel, down to a
 * single pixel (OpenGL ES 3.0.6, 3.8.10.4); about four thirds of the picture itself.
 */
export function mippedBytes(widthPx: number, heightPx: number): number {
  let [width, height] = [widthPx, heightPx];
  let bytes = pixelBytes(width, height);
  while (width > 1 || height > 1) {
    width = Math.max(1, width >> 1);
    height = Math.max(1, height >> 1);
    bytes += pixelBytes(width, height);
  }
  return bytes;
}
