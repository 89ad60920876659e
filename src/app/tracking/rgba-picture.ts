import { tapsFor, type Beyond, type Picture } from './picture';
import type { Region } from './region';

/** A frame of interleaved 8-bit pixels, four bytes each; `redAt` 0 for RGBA, 2 for BGRA. */
export class RgbaPicture implements Picture {
  constructor(
    readonly width: number,
    readonly height: number,
    private readonly data: Uint8Array | Uint8ClampedArray,
    private readonly redAt: 0 | 2 = 0,
    private readonly stride = width * 4,
  ) {}

  sample(region: Region, n: number, low: number, beyond: Beyond, into: Float32Array): void {
    const { width, height, data, redAt, stride } = this;
    const step = region.size / n;
    const taps = tapsFor(step);
    const ca = Math.cos(region.angleRad) * step;
    const sa = Math.sin(region.angleRad) * step;
    const gain = (1 - low) / (255 * taps * taps);
    const blueAt = 2 - redAt;
    const maxX = width - 2;
    const maxY = height - 2;
    let out = 0;
    for (let row = 0; row < n; row++) {
      for (let column = 0; column < n; column++) {
        let red = 0;
        let green = 0;
        let blue = 0;
        for (let tap = 0; tap < taps * taps; tap++) {
          const u = column + ((tap % taps) + 0.5) / taps - n / 2;
          const v = row + (Math.floor(tap / taps) + 0.5) / taps - n / 2;
          const x = region.cx + ca * u - sa * v - 0.5;
          const y = region.cy + sa * u + ca * v - 0.5;
          if (beyond === 'black' && (x < -0.5 || y < -0.5 || x >= width - 0.5 || y >= height - 0.5)) continue;
          const x0 = x < 0 ? 0 : x > maxX ? maxX : x | 0;
          const y0 = y < 0 ? 0 : y > maxY ? maxY : y | 0;
          const fx = x < x0 ? 0 : x > x0 + 1 ? 1 : x - x0;
          const fy = y < y0 ? 0 : y > y0 + 1 ? 1 : y - y0;
          const upper = y0 * stride + x0 * 4;
          const lower = upper + stride;
          const w00 = (1 - fx) * (1 - fy);
          const w10 = fx * (1 - fy);
          const w01 = (1 - fx) * fy;
          const w11 = fx * fy;
          red +=
            data[upper + redAt] * w00 +
            data[upper + 4 + redAt] * w10 +
            data[lower + redAt] * w01 +
            data[lower + 4 + redAt] * w11;
          green += data[upper + 1] * w00 + data[upper + 5] * w10 + data[lower + 1] * w01 + data[lower + 5] * w11;
          blue +=
            data[upper + blueAt] * w00 +
            data[upper + 4 + blueAt] * w10 +
            data[lower + blueAt] * w01 +
            data[lower + 4 + blueAt] * w11;
        }
        into[out++] = red * gain + low;
        into[out++] = green * gain + low;
        into[out++] = blue * gain + low;
      }
    }
  }
}
