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

/** How a region is walked over: one step of the output along its rows in frame pixels, (ca, sa), and how many taps a pixel has each way. */
interface Steps {
  readonly ca: number;
  readonly sa: number;
  readonly taps: number;
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
    const { width, height } = this;
    const step = region.size / n;
    const steps: Steps = { ca: Math.cos(region.angleRad) * step, sa: Math.sin(region.angleRad) * step, taps: tapsFor(step) };
    const { ca, sa } = steps;
    const plain = steps.taps === 1 && this.holds(region, n, steps);
    const blackOut = !plain && beyond === 'black';
    let out = 0;
    for (let row = 0; row < n; row++) {
      const v = row + 0.5 - n / 2;
      const startX = region.cx - sa * v - 0.5;
      const startY = region.cy + ca * v - 0.5;
      for (let column = 0; column < n; column++, out += 3) {
        const u = column + 0.5 - n / 2;
        const x = startX + ca * u;
        const y = startY + sa * u;
        if (blackOut && (x < -0.5 || y < -0.5 || x >= width - 0.5 || y >= height - 0.5)) {
          into[out] = into[out + 1] = into[out + 2] = low;
          continue;
        }
        const luma = plain ? this.lumaWithin(x, y) : steps.taps === 1 ? this.lumaHeld(x, y) : this.lumaAveraged(x, y, steps);
        this.write(luma, plain ? (x + 0.5) | 0 : nearest(x, width), plain ? (y + 0.5) | 0 : nearest(y, height), low, into, out);
      }
    }
  }

  /** Whether no tap of the region can fall beyond the frame: the usual case, read in two thirds of the time. */
  private holds({ cx, cy }: Region, n: number, { ca, sa }: Steps): boolean {
    const reach = (Math.abs(ca) + Math.abs(sa)) * (n / 2) + 1;
    return cx - reach > 0 && cy - reach > 0 && cx + reach < this.width - 2 && cy + reach < this.height - 2;
  }

  /** Luma at a place well within the frame, between its four pixels. */
  private lumaWithin(x: number, y: number): number {
    const { data } = this;
    const { lumaAt, lumaStride } = this.layout;
    const x0 = x | 0;
    const y0 = y | 0;
    const fx = x - x0;
    const at = lumaAt + y0 * lumaStride + x0;
    const below = at + lumaStride;
    const upper = data[at] + fx * (data[at + 1] - data[at]);
    const lower = data[below] + fx * (data[below + 1] - data[below]);
    return upper + (y - y0) * (lower - upper);
  }

  /** Luma about a place, the mean of taps x taps; beyond the frame its edge is repeated. */
  private lumaAveraged(x: number, y: number, { ca, sa, taps }: Steps): number {
    let sum = 0;
    for (let j = 0; j < taps; j++) {
      const dv = (j + 0.5) / taps - 0.5;
      for (let i = 0; i < taps; i++) {
        const du = (i + 0.5) / taps - 0.5;
        sum += this.lumaHeld(x + ca * du - sa * dv, y + sa * du + ca * dv);
      }
    }
    return sum / (taps * taps);
  }

  private lumaHeld(x: number, y: number): number {
    const maxX = this.width - BARELY_WITHIN;
    const maxY = this.height - BARELY_WITHIN;
    return this.lumaWithin(x < 0 ? 0 : x > maxX ? maxX : x, y < 0 ? 0 : y > maxY ? maxY : y);
  }

  /** Writes red, green and blue of this luma with the colour of the pixel (xi, yi). */
  private write(luma: number, xi: number, yi: number, low: number, into: Float32Array, out: number): void {
    const { data } = this;
    const { blueAt, redAt, chromaStride, chromaStep } = this.layout;
    const { black, lumaGain, rv, gu, gv, bu } = this.matrix;
    const gain = (1 - low) / 255;
    const chroma = (yi >> 1) * chromaStride + (xi >> 1) * chromaStep;
    const cb = data[blueAt + chroma] - 128;
    const cr = data[redAt + chroma] - 128;
    const y = (luma - black) * lumaGain;
    into[out] = held(y + rv * cr) * gain + low;
    into[out + 1] = held(y - gu * cb - gv * cr) * gain + low;
    into[out + 2] = held(y + bu * cb) * gain + low;
  }
}

/** From the frame's size to the last place between two pixels, whatever the rounding. */
const BARELY_WITHIN = 1.001;

const held = (level: number): number => (level < 0 ? 0 : level > 255 ? 255 : level);

/** The pixel nearest to a place, of `count` in a row. */
const nearest = (place: number, count: number): number => (place < 0 ? 0 : place > count - 2 ? count - 2 : (place + 0.5) | 0);
