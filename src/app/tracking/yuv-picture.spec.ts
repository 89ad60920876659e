import { YuvPicture, yuvMatrix, type YuvLayout } from './yuv-picture';

const SIZE = 64;
const LAYOUT: YuvLayout = {
  lumaAt: 0,
  lumaStride: SIZE,
  blueAt: SIZE * SIZE,
  redAt: SIZE * SIZE * 1.25,
  chromaStride: SIZE / 2,
  chromaStep: 1,
};

/** A picture whose luma is given and whose colour differences are the same all over. */
function picture(luma: (x: number, y: number) => number, cb = 128, cr = 128, fullRange = true): YuvPicture {
  const data = new Uint8Array(SIZE * SIZE * 1.5);
  for (let y = 0; y < SIZE; y++) for (let x = 0; x < SIZE; x++) data[y * SIZE + x] = luma(x, y);
  data.fill(cb, LAYOUT.blueAt, LAYOUT.redAt);
  data.fill(cr, LAYOUT.redAt);
  return new YuvPicture(SIZE, SIZE, data, LAYOUT, yuvMatrix('bt601', fullRange));
}

const WHOLE = { cx: SIZE / 2, cy: SIZE / 2, size: SIZE, angleRad: 0 };

describe('YuvPicture', () => {
  it('turns JPEG red, Y 76 Cb 85 Cr 255, into red (read: JFIF 1.02, the inverse conversion)', () => {
    const into = new Float32Array(4 * 4 * 3);
    picture(() => 76, 85, 255).sample(WHOLE, 4, 0, 'black', into);
    expect(into[0]).toBeCloseTo(254 / 255, 2);
    expect(into[1]).toBeCloseTo(0, 2);
    expect(into[2]).toBeCloseTo(0, 2);
  });

  it('takes 16 and 235 of video range for black and white (ITU-R BT.601-7), as -1 and 1 where asked', () => {
    const into = new Float32Array(2 * 2 * 3);
    picture((x) => (x < 32 ? 16 : 235), 128, 128, false).sample({ ...WHOLE, size: 16, cx: 8 }, 2, -1, 'black', into);
    expect(into[0]).toBeCloseTo(-1, 5);
    picture((x) => (x < 32 ? 16 : 235), 128, 128, false).sample({ ...WHOLE, size: 16, cx: 50 }, 2, -1, 'black', into);
    expect(into[0]).toBeCloseTo(1, 5);
  });

  it('is exact on a slope at places between pixels, enlarged and turned', () => {
    const slope = picture((x) => 2 * x + 20);
    const region = { cx: 30.3, cy: 31.7, size: 20, angleRad: 0.4 };
    const n = 32;
    const into = new Float32Array(n * n * 3);
    slope.sample(region, n, 0, 'black', into);
    for (let row = 0; row < n; row++) {
      for (let column = 0; column < n; column++) {
        const u = ((column + 0.5) / n - 0.5) * region.size;
        const v = ((row + 0.5) / n - 0.5) * region.size;
        const x = region.cx + Math.cos(0.4) * u - Math.sin(0.4) * v;
        expect(into[(row * n + column) * 3] * 255).toBeCloseTo(2 * (x - 0.5) + 20, 3);
      }
    }
  });

  it('averages when it reduces: stripes of one pixel become grey', () => {
    const into = new Float32Array(8 * 8 * 3);
    picture((x) => (x % 2 ? 200 : 100)).sample(WHOLE, 8, 0, 'black', into);
    for (const level of into) expect(level * 255).toBeCloseTo(150, 0);
  });

  it('is black beyond the edge, or repeats it', () => {
    const beyond = { ...WHOLE, cx: -40, size: 32 };
    const into = new Float32Array(2 * 2 * 3);
    picture(() => 90).sample(beyond, 2, 0, 'black', into);
    expect(into[0]).toBe(0);
    picture(() => 90).sample(beyond, 2, 0, 'repeat', into);
    expect(into[0] * 255).toBeCloseTo(90, 4);
  });
});
