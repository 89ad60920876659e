import { tapsFor, type Beyond, type Picture } from './picture';
import type { Region } from './region';

/** Where the planes of an 8-bit 4:2:0 frame lie in its buffer; `chromaStep` 1 for separate planes (I420), 2 for interleaved (NV12). */
export interface YuvLayout {
  readonly lumaAt: number;
  readonly lumaStride: number;
  readonly blueAt: number;
  readonly redAt: number;
  readonly chromaStride: number;
  readonly chromaStep: 1 | 2;
}

/** How luma and colour differences become red, green and blue: R = y + rv V, G = y - gu U - gv V, B = y + bu U, y = lumaGain (Y - black). */
export interface YuvMatrix {
  readonly black: number;
  readonly lumaGain: number;
  readonly rv: number;
  readonly gu: number;
  readonly gv: number;
  readonly bu: number;
}

/**
 * The matrix from the luma weights of red and blue: ITU-R BT.601-7 (0.299, 0.114) or BT.709-6 (0.2126, 0.0722). Full range uses all
 * 256 levels; video range has luma in 16 to 235 and colour differences in 16 to 240.
 */
export function yuvMatrix(standard: 'bt601' | 'bt709', fullRange: boolean): YuvMatrix {
  const [kr, kb] = standard === 'bt601' ? [0.299, 0.114] : [0.2126, 0.0722];
  const kg = 1 - kr - kb;
  const chromaGain = fullRange ? 1 : 255 / 224;
  return {
    black: fullRange ? 0 : 16,
    lumaGain: fullRange ? 1 : 255 / 219,
    rv: 2 * (1 - kr) * chromaGain,
    gu: ((2 * (1 - kb) * kb) / kg) * chromaGain,
    gv: ((2 * (1 - kr) * kr) / kg) * chromaGain,
    bu: 2 * (1 - kb) * chromaGain,
  };
}

/** A frame as cameras give it: one byte of luma a pixel, colour differences at half the resolution each way. Odd sizes round up. */
export class YuvPicture implements Picture {
  constructor(
    readonly width: number,
    readonly height: number,
    private readonly data: Uint8Array,
    private readonly layout: YuvLayout,
    private readonly matrix: YuvMatrix,
  ) {}

  /** As `Picture.sample`; colour is taken from the nearest colour sample, not interpolated: what places landmarks is luma. */
  sample(region: Region, n: number, low: number, beyond: Beyond, into: Float32Array): void {
    const { width, height, data } = this;
    const { lumaAt, lumaStride, blueAt, redAt, chromaStride, chromaStep } = this.layout;
    const { black, lumaGain, rv, gu, gv, bu } = this.matrix;
    const step = region.size / n;
    const taps = tapsFor(step);
    const ca = Math.cos(region.angleRad) * step;
    const sa = Math.sin(region.angleRad) * step;
    const gain = (1 - low) / 255;
    const weight = 1 / (taps * taps);
    const maxX = width - 2;
    const maxY = height - 2;
    const blackOut = beyond === 'black';
    // Where no tap can fall beyond the frame nothing needs to be held within it: the usual case, in two thirds of the time.
    const reach = (Math.abs(ca) + Math.abs(sa)) * (n / 2) + 1;
    const single =
      taps === 1 &&
      region.cx - reach > 0 &&
      region.cy - reach > 0 &&
      region.cx + reach < maxX &&
      region.cy + reach < maxY;
    let out = 0;
    for (let row = 0; row < n; row++) {
      const v0 = row + 0.5 - n / 2;
      const startX = region.cx - sa * v0 - 0.5;
      const startY = region.cy + ca * v0 - 0.5;
      for (let column = 0; column < n; column++) {
        const u0 = column + 0.5 - n / 2;
        const xc = startX + ca * u0;
        const yc = startY + sa * u0;
        let luma = 0;
        let xi = (xc + 0.5) | 0;
        let yi = (yc + 0.5) | 0;
        if (single) {
          const x0 = xc | 0;
          const y0 = yc | 0;
          const fx = xc - x0;
          const at = lumaAt + y0 * lumaStride + x0;
          const below = at + lumaStride;
          const upper = data[at] + fx * (data[at + 1] - data[at]);
          const lower = data[below] + fx * (data[below + 1] - data[below]);
          luma = upper + (yc - y0) * (lower - upper);
        } else {
          if (blackOut && (xc < -0.5 || yc < -0.5 || xc >= width - 0.5 || yc >= height - 0.5)) {
            into[out++] = low;
            into[out++] = low;
            into[out++] = low;
            continue;
          }
          for (let j = 0; j < taps; j++) {
            const dv = (j + 0.5) / taps - 0.5;
            for (let i = 0; i < taps; i++) {
              const du = (i + 0.5) / taps - 0.5;
              const x = xc + ca * du - sa * dv;
              const y = yc + sa * du + ca * dv;
              const x0 = x < 0 ? 0 : x > maxX ? maxX : x | 0;
              const y0 = y < 0 ? 0 : y > maxY ? maxY : y | 0;
              const fx = x < x0 ? 0 : x > x0 + 1 ? 1 : x - x0;
              const fy = y < y0 ? 0 : y > y0 + 1 ? 1 : y - y0;
              const at = lumaAt + y0 * lumaStride + x0;
              const upper = data[at] + fx * (data[at + 1] - data[at]);
              const lower = data[at + lumaStride] + fx * (data[at + lumaStride + 1] - data[at + lumaStride]);
              luma += upper + fy * (lower - upper);
            }
          }
          if (xc < 0) xi = 0;
          else if (xc > maxX) xi = maxX;
          if (yc < 0) yi = 0;
          else if (yc > maxY) yi = maxY;
        }
        const chroma = (yi >> 1) * chromaStride + (xi >> 1) * chromaStep;
        const cb = data[blueAt + chroma] - 128;
        const cr = data[redAt + chroma] - 128;
        const y = (luma * weight - black) * lumaGain;
        const red = y + rv * cr;
        const green = y - gu * cb - gv * cr;
        const blue = y + bu * cb;
        into[out++] = (red < 0 ? 0 : red > 255 ? 255 : red) * gain + low;
        into[out++] = (green < 0 ? 0 : green > 255 ? 255 : green) * gain + low;
        into[out++] = (blue < 0 ? 0 : blue > 255 ? 255 : blue) * gain + low;
      }
    }
  }
}
