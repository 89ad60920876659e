import { RgbaPicture } from './rgba-picture';

const SIZE = 32;

/** Red slopes to the right and green downward; blue stays. */
function slopes(redAt: 0 | 2): RgbaPicture {
  const data = new Uint8Array(SIZE * SIZE * 4);
  for (let y = 0; y < SIZE; y++) {
    for (let x = 0; x < SIZE; x++) {
      const at = (y * SIZE + x) * 4;
      data[at + redAt] = 4 * x + 10;
      data[at + 1] = 3 * y + 20;
      data[at + 2 - redAt] = 77;
    }
  }
  return new RgbaPicture(SIZE, SIZE, data, redAt);
}

describe('RgbaPicture', () => {
  it.each([0, 2] as const)('is exact on slopes at places between pixels, with red at byte %i', (redAt) => {
    const into = new Float32Array(3);
    slopes(redAt).sample({ cx: 11.25, cy: 19.6, size: 1, angleRad: 0 }, 1, 0, 'black', into);
    expect(into[0] * 255).toBeCloseTo(4 * 10.75 + 10, 3);
    expect(into[1] * 255).toBeCloseTo(3 * 19.1 + 20, 3);
    expect(into[2] * 255).toBeCloseTo(77, 3);
  });

  it('carries 0 to 255 to -1 to 1, and is -1 beyond the edge', () => {
    const into = new Float32Array(3);
    slopes(0).sample({ cx: -5, cy: 5, size: 1, angleRad: 0 }, 1, -1, 'black', into);
    expect([...into]).toEqual([-1, -1, -1]);
  });
});
