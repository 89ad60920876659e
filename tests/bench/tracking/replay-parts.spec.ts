import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { drawFrameNumber } from '../../video/numbered-video';
import { readFrameNumber } from './frame-number';
import { splitJpegs } from './jpeg-stream';
import { matchTruth } from './match-truth';
import type { FrameResult } from './result';

const WIDTH = 320;
const HEIGHT = 64;

async function numbered(number: number): Promise<Buffer> {
  const frame = new Uint8Array(WIDTH * HEIGHT * 3).fill(128);
  drawFrameNumber(frame, WIDTH, HEIGHT, number);
  return sharp(frame, { raw: { width: WIDTH, height: HEIGHT, channels: 3 } })
    .jpeg({ quality: 80 })
    .toBuffer();
}

const lumaOf = (jpeg: Uint8Array): Promise<Buffer> => sharp(jpeg).greyscale().raw().toBuffer();

describe('a numbered video', () => {
  it('is split into its pictures, whose numbers survive compression', async () => {
    const numbers = [0, 1, 5, 630, 2047, 4095];
    const pictures = splitJpegs(Buffer.concat(await Promise.all(numbers.map(numbered))));
    expect(pictures).toHaveLength(numbers.length);
    const read = await Promise.all(pictures.map(async (jpeg) => readFrameNumber(await lumaOf(jpeg), WIDTH, HEIGHT)));
    expect(read).toEqual(numbers);
  });

  it('has no number where the parity does not agree', () => {
    const luma = new Uint8Array(WIDTH * HEIGHT).fill(255, (HEIGHT - 16) * WIDTH);
    expect(readFrameNumber(luma, WIDTH, HEIGHT)).toBeNull();
  });
});

describe('matchTruth', () => {
  const look = { face: null, engineMs: 1, roundTripMs: 1 };
  const result = (number: number | null): FrameResult => ({ number, oriel: look, reference: look });
  const frame = (i: number) => ({
    i,
    on: true,
    ipd: 1,
    re: [0, 0] as [number, number],
    le: [1, 0] as [number, number],
    roll: 0,
  });
  const truth = { W: 1, H: 1, FPS: 30, frames: Array.from({ length: 4200 }, (_, i) => frame(i)) };

  it('goes by the number, by the place where there is none, and past 4096 by both', () => {
    const results = Array.from({ length: 4100 }, (_, place) => result((place + 3) % 4096));
    results[7] = result(null);
    const { truths } = matchTruth(truth, results);
    expect([truths[0].i, truths[7].i, truths[4094].i, truths[4099].i]).toEqual([3, 7, 4097, 4102]);
  });

  it('goes by the place alone where the numbers do not count up', () => {
    const results = Array.from({ length: 50 }, (_, place) => result((place * 977) % 4096));
    expect(matchTruth(truth, results).truths.map(({ i }) => i)).toEqual(results.map((_, place) => place));
  });

  it('refuses a truth of another video', () => {
    expect(() => matchTruth({ ...truth, frames: [frame(900)] }, [result(1)])).toThrow('belong together');
  });
});
