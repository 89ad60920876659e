import { detailAlong } from './detail-along';

const N = 64;

/** A grey picture of whatever is there at each place. */
function pixels(of: (x: number, y: number) => number): Float32Array {
  const values = new Float32Array(N * N * 3);
  for (let y = 0; y < N; y++) for (let x = 0; x < N; x++) values.fill(of(x, y), 3 * (y * N + x), 3 * (y * N + x) + 3);
  return values;
}

describe('detailAlong', () => {
  /** Waves of 16 pixels: four pixels apart is a quarter of a wave either way, so squared differences are alike (computed). */
  const waves = (ax: number, ay: number) =>
    pixels((x, y) => ax * Math.sin((Math.PI * x) / 8) + ay * Math.sin((Math.PI * y) / 8));

  it('is 1 where both directions hold as much', () => {
    expect(detailAlong(waves(1, 1), N, 0)).toBeCloseTo(1, 1);
  });

  it('is the ratio of the two amplitudes, and its inverse a quarter turn on', () => {
    expect(detailAlong(waves(0.4, 0.8), N, 0)).toBeCloseTo(0.5, 1);
    expect(detailAlong(waves(0.4, 0.8), N, Math.PI / 2)).toBeCloseTo(2, 0);
    expect(detailAlong(waves(0.4, 0.8), N, Math.PI)).toBeCloseTo(0.5, 1);
  });

  it('falls where a picture is smeared along the direction, and is finite where there is nothing to see', () => {
    const grain = (x: number, y: number): number => Math.abs(43758.5453 * Math.sin(12.9898 * x + 78.233 * y)) % 1;
    const smeared = (x: number, y: number): number => {
      let sum = 0;
      for (let k = 0; k < 12; k++) sum += grain((x + k) % N, y);
      return sum / 12;
    };
    expect(detailAlong(pixels(smeared), N, 0)).toBeLessThan(0.8 * detailAlong(pixels(grain), N, 0));
    expect(detailAlong(pixels(() => 0.5), N, 0)).toBe(0);
  });
});
