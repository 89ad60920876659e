import { describe, expect, it } from 'vitest';
import type { Look } from './result';
import { scoreLooks } from './score';
import type { TruthFrame } from './truth';

/** A level face whose eyes are 50 px apart about (x, 100). */
const truth = (i: number, x: number, on = true): TruthFrame => ({
  i,
  on,
  ipd: 50,
  re: [x - 25, 100],
  le: [x + 25, 100],
  roll: 0,
});
const look = (x: number | null, ms = 5, ipdPx = 50): Look => ({
  face: x === null ? null : { rightEye: [x - 25, 100], leftEye: [x + 25, 100], ipdPx },
  engineMs: ms,
  roundTripMs: 2 * ms,
});

describe('scoreLooks', () => {
  it('counts what was found within one eye distance, and what was found where nothing is', () => {
    const truths = [truth(0, 100), truth(1, 110), truth(2, 120), truth(3, 0, false), truth(4, 0, false)];
    const score = scoreLooks(truths, [look(100), look(null), look(180), look(70), look(null)]);
    expect(score.detectedPct).toBeCloseTo(100 / 3, 3);
    expect(score.falsePositives).toBe(2);
  });

  it('gives the mean error of the midpoint in percent of the eye distance', () => {
    const score = scoreLooks([truth(0, 100), truth(1, 110)], [look(101), look(113)]);
    expect(score.eyeErrorPctIpd).toBeCloseTo((2 + 6) / 2, 9);
  });

  it('gives the scatter of measured over true distance about its own mean: 0.9 and 1.1 are 10 %', () => {
    const score = scoreLooks([truth(0, 100), truth(1, 110)], [look(100, 5, 45), look(110, 5, 55)]);
    expect(score.linearityRmsPct).toBeCloseTo(10, 9);
  });

  it('gives jitter only where the truth stands still, about the mean of each stretch', () => {
    const still = Array.from({ length: 25 }, (_, i) => truth(i, 100));
    const walking = Array.from({ length: 25 }, (_, i) => truth(25 + i, 110 + i));
    const looks = [...still.map((_, i) => look(103 + (i % 2))), ...walking.map((_, i) => look(110 + i + 9 * (i % 2)))];
    expect(scoreLooks([...still, ...walking], looks).jitterPx).toEqual([0.5, 0]);
    expect(scoreLooks(walking, looks.slice(25)).jitterPx).toBeNull();
  });

  it('gives times by nearest rank, and frames a second from whole round trips', () => {
    const truths = Array.from({ length: 20 }, (_, i) => truth(i, 100 + i));
    const score = scoreLooks(
      truths,
      truths.map((_, i) => look(100 + i, i + 1)),
    );
    expect(score.msPerFrameP50).toBe(10);
    expect(score.msPerFrameP95).toBe(19);
    expect(score.fps).toBeCloseTo(1000 / 21, 2);
  });
});
