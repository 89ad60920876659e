import { describe, expect, it } from 'vitest';
import type { Found, Look } from './result';
import { scoreLooks, scoreSegments } from './score';
import type { TruthFrame } from './truth';

/** A level face whose eyes are 50 px apart about (x, 100), so many millimetres away where that is known. */
const truth = (number: number, x: number, on = true, zMm: number | null = null, segment = ''): TruthFrame => ({
  number,
  segment,
  faces: on ? [{ ...eyesAbout(x), ipdPx: 50, eyeMm: zMm === null ? null : [0, 0, zMm], facing: true }] : [],
});
const look = (x: number | null, ms = 5, ipdPx = 50, zMm = 1000): Look => ({
  face: x === null ? null : { ...eyesAbout(x), ipdPx, eyeMm: [6, 8, zMm] },
  engineMs: ms,
  roundTripMs: 2 * ms,
});
const eyesAbout = (x: number): Pick<Found, 'rightEye' | 'leftEye'> => ({
  rightEye: [x - 25, 100],
  leftEye: [x + 25, 100],
});
const FPS = 30;

describe('scoreLooks', () => {
  it('counts what was found within one eye distance, and what was found where nothing is', () => {
    const truths = [truth(0, 100), truth(1, 110), truth(2, 120), truth(3, 0, false), truth(4, 0, false)];
    const score = scoreLooks(truths, [look(100), look(null), look(180), look(70), look(null)], FPS);
    expect(score.detectedPct).toBeCloseTo(100 / 3, 3);
    expect(score.falsePositives).toBe(2);
  });

  it('gives the mean error of the midpoint in percent of the eye distance', () => {
    const score = scoreLooks([truth(0, 100), truth(1, 110)], [look(101), look(113)], FPS);
    expect(score.eyeErrorPctIpd).toBeCloseTo((2 + 6) / 2, 9);
  });

  it('gives the scatter of measured over true distance about its own mean: 0.9 and 1.1 are 10 %', () => {
    const score = scoreLooks([truth(0, 100), truth(1, 110)], [look(100, 5, 45), look(110, 5, 55)], FPS);
    expect(score.linearityRmsPct).toBeCloseTo(10, 9);
  });

  it('gives jitter only where the truth stands still, about the mean of each stretch', () => {
    const still = Array.from({ length: 25 }, (_, i) => truth(i, 100));
    const walking = Array.from({ length: 25 }, (_, i) => truth(25 + i, 110 + i));
    const looks = [...still.map((_, i) => look(103 + (i % 2))), ...walking.map((_, i) => look(110 + i + 9 * (i % 2)))];
    expect(scoreLooks([...still, ...walking], looks, FPS).jitterPx).toEqual([0.5, 0]);
    expect(scoreLooks(walking, looks.slice(25), FPS).jitterPx).toBeNull();
  });

  it('gives times by nearest rank, and frames a second from whole round trips', () => {
    const truths = Array.from({ length: 20 }, (_, i) => truth(i, 100 + i));
    const score = scoreLooks(
      truths,
      truths.map((_, i) => look(100 + i, i + 1)),
      FPS,
    );
    expect(score.msPerFrameP50).toBe(10);
    expect(score.msPerFrameP95).toBe(19);
    expect(score.fps).toBeCloseTo(1000 / 21, 2);
  });

  it('sets the scale at rest once, and gives the errors of distance against it', () => {
    const truths = [truth(0, 0, false, 1000), truth(1, 100, true, 1000, 'rest'), truth(2, 110, true, 2000, 'walk')];
    const score = scoreLooks(truths, [look(null), look(100, 5, 50, 1100), look(110, 5, 25, 2420)], FPS);
    expect(score.distanceMaxPct).toBeCloseTo(10, 2);
    expect(score.distanceRmsPct).toBeCloseTo(10 / Math.SQRT2, 2);
    expect(score.lateralMmP50).toBeCloseTo(10 / 1.1, 2);
    expect(score.acquiredFrames).toBe(0);
  });

  it('counts the frames until someone who appears is found', () => {
    const truths = [truth(0, 0, false), ...[1, 2, 3].map((i) => truth(i, 100, true, 1000))];
    expect(scoreLooks(truths, [look(null), look(null), look(null), look(100)], FPS).acquiredFrames).toBe(2);
  });

  it('scores each segment by itself, with the scale of the whole', () => {
    const truths = [truth(0, 100, true, 1000, 'rest'), truth(1, 110, true, 2000, 'walk')];
    const segments = scoreSegments(truths, [look(100, 5, 50, 1100), look(110, 5, 25, 2420)], FPS);
    expect(segments['rest'].distanceMaxPct).toBeCloseTo(0, 6);
    expect(segments['walk'].distanceMaxPct).toBeCloseTo(10, 6);
  });

  it('draws for the eye it measured: 6 and 8 mm beside the true one 1 m away are 10 x 100/1100 mm on the glass (computed)', () => {
    const truths = Array.from({ length: 150 }, (_, i) => truth(i, 100, true, 1000, 'rest'));
    const score = scoreLooks(truths, truths.map(() => look(100)), FPS); // prettier-ignore
    expect(score.glassErrorMmP50).toBeCloseTo(1000 / 1100, 2);
    expect(score.glassErrorMmP95).toBeCloseTo(1000 / 1100, 2);
  });

  it('gives the unrest of the drawn point at rest', () => {
    const truths = Array.from({ length: 150 }, (_, i) => truth(i, 100, true, 1000, 'rest'));
    const rest = (noiseMm: number) =>
      scoreLooks(truths, truths.map((_, k) => look(100, 5, 50, 1000 + noiseMm * (k % 2 ? 1 : -1))), FPS).glassRestSdMm!; // prettier-ignore
    expect(rest(40)).toBeGreaterThan(rest(0));
  });

  it('has no distances where the truth has none', () => {
    expect(scoreLooks([truth(0, 100)], [look(100)], FPS)).not.toHaveProperty('distanceRmsPct');
  });
});
