import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { drawFrameNumber } from '../../video/numbered-video';
import { readFrameNumber } from './frame-number';
import { splitJpegs } from './jpeg-stream';
import { matchTruth } from './match-truth';
import type { FrameResult } from './result';
import { truthSchema, type Truth, type TruthFrame } from './truth';

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
  const frame = (number: number): TruthFrame => ({ number, segment: '', faces: [] });
  const frames = Array.from({ length: 4200 }, (_, number) => frame(number));
  const truth: Truth = { fps: 30, hfovRad: null, ipdMm: 63, frames };

  it('goes by the number, by the place where there is none, and past 4096 by both', () => {
    const results = Array.from({ length: 4100 }, (_, place) => result((place + 3) % 4096));
    results[7] = result(null);
    const { truths } = matchTruth(truth, results);
    expect([0, 7, 4094, 4099].map((k) => truths[k].number)).toEqual([3, 7, 4097, 4102]);
  });

  it('goes by the place alone where the numbers do not count up', () => {
    const results = Array.from({ length: 50 }, (_, place) => result((place * 977) % 4096));
    expect(matchTruth(truth, results).truths.map(({ number }) => number)).toEqual(results.map((_, place) => place));
  });

  it('refuses a truth of another video', () => {
    expect(() => matchTruth({ ...truth, frames: [frame(900)] }, [result(1)])).toThrow('belong together');
  });
});

describe('truthSchema', () => {
  const flat = { i: 0, on: 1, ipd: 58, re: [291, 220], le: [349, 220], roll: 0 };
  const head = { re: [285, 340], le: [355, 340], mid: [0, -20, 1000], yaw: 0, pitch: 0, roll: 12 };

  it('reads a flat face, there or not', () => {
    const absent = { ...flat, i: 1, on: 0 };
    const truth = truthSchema.parse({ W: 640, H: 480, FPS: 30, frames: [flat, absent] });
    expect(truth.frames.map(({ faces }) => faces.length)).toEqual([1, 0]);
    expect(truth.frames[0].faces[0]).toMatchObject({ rightEye: [291, 220], ipdPx: 58, eyeMm: null, facing: true });
  });

  it('reads heads: at 1280 px and 60 degrees 63.36 mm at 1 m are 70.2 px (computed: checks of the camera)', () => {
    const frames = [{ i: 0, seg: 'roll', on: 1, heads: [head] }];
    const truth = truthSchema.parse({ W: 1280, H: 720, FPS: 30, hfov: 60, ipdMm: 63.36, frames });
    expect(truth.frames[0].faces[0].ipdPx).toBeCloseTo(70.2, 1);
    expect(truth.frames[0].faces[0]).toMatchObject({ eyeMm: [0, -20, 1000], facing: false });
  });

  it('reads frames with nobody that say no more than that', () => {
    const flatOnly = truthSchema.parse({ W: 640, H: 480, FPS: 30, frames: [flat, { i: 1, on: false, re: null }] });
    expect(flatOnly.frames.map(({ faces }) => faces.length)).toEqual([1, 0]);
    const frames = [{ i: 0, seg: 'gone', on: 0 }, { i: 1, seg: 'rest', on: 1, heads: [head] }];
    const heads = truthSchema.parse({ W: 1280, H: 720, FPS: 30, hfov: 60, ipdMm: 63, frames });
    expect(heads.frames.map(({ segment, faces }) => [segment, faces.length])).toEqual([['gone', 0], ['rest', 1]]);
  });

  it('refuses what is neither', () => {
    expect(() => truthSchema.parse({ W: 640, H: 480, FPS: 30, frames: [{ i: 0 }] })).toThrow();
  });
});
