import { Blink } from './blink';
import { ACROSS, DOWN, brightnessOfParts } from './brightness';

/** Plays a whole blink at 60 frames a second to a camera of 30 a second whose part 13 sees it `delayMs` later; null sees nothing. */
function played(delayMs: number | null): ReturnType<Blink['result']> {
  const blink = new Blink();
  const levels: { tMs: number; level: number }[] = [];
  for (let frame = 0; !blink.over((frame * 1000) / 60); frame++) {
    const tMs = (frame * 1000) / 60;
    const level = blink.levelAt(tMs);
    if (level !== null) levels.push({ tMs, level });
    if (frame % 2) continue;
    const parts = new Float64Array(ACROSS * DOWN).fill(90 + Math.sin(frame));
    if (delayMs !== null) parts[13] = 90 + 15 * (levels.findLast((drawn) => drawn.tMs <= tMs - delayMs)?.level ?? 0);
    blink.see(tMs, parts);
  }
  return blink.result();
}

describe('a blink and what the camera saw of it', () => {
  it('finds the delay, to within a quarter of the camera’s interval', () => {
    const { delay, correlation } = played(90);
    expect(correlation).toBeGreaterThan(0.95);
    expect(Math.abs(delay!.delayMs - 90)).toBeLessThan(9);
  });
  it('gives none where nothing was seen', () => {
    expect(played(null).delay).toBeNull();
    expect(new Blink().result().delay).toBeNull();
  });
});

it('takes the mean of each part of a picture', () => {
  const pixels = new Uint8ClampedArray(32 * 24 * 4).fill(255);
  for (let y = 0; y < 4; y++) for (let x = 4; x < 8; x++) pixels.fill(0, 4 * (32 * y + x), 4 * (32 * y + x) + 3);
  const parts = brightnessOfParts(pixels, 32);
  expect(parts[0]).toBeCloseTo(255, 6);
  expect(parts[1]).toBe(0);
  expect(parts[ACROSS]).toBeCloseTo(255, 6);
});
