import { describe, expect, it } from 'vitest';
import { figuresOf, secondsOf } from './figures';
import type { Seen } from './probe';

/** No camera is quite regular, and by that its frames are told apart; ms. */
const waver = (i: number): number => ((i * 7) % 5) / 2;

/** A made-up page: 50 frames a second, each drawn in 4 ms; 25 looks a second that reach the page 31 ms after capture; a camera clock 1000 ms behind. */
function made(seconds: number): Seen {
  const frames = Array.from({ length: seconds * 50 }, (_, i): [number, number] => [i * 20, i * 20 + 4]);
  const looks = Array.from({ length: seconds * 25 }, (_, i): [number, number, boolean, number] => [i * 40 - 1030 + waver(i), i * 40 + 1 + waver(i), i % 5 !== 0, 9]);
  const captures = looks.slice(0, 60).map(([timestampMs]) => timestampMs + 1000);
  return { frames, looks, captures, presented: [[504, 520], [1504, 1524]], changes: [{ tMs: 1500, from: 1, to: 2, reason: 'made up' }], rateChanges: [] };
}

// Expected values follow from how the page was made up (computed).
describe('figures of what was seen of a page', () => {
  it('counts frames and faces, and measures delays', () => {
    expect(figuresOf(made(4), 1000, 3000)).toEqual({
      framesPerS: 50,
      frameMs: [20, 20],
      trackedPerS: 20,
      lookMs: [9, 9],
      // The sample comes 1 ms after a frame has begun and before that frame is drawn: it is in that frame, 34 ms after capture less what the camera wavers: 32, 32.5, 33 or 33.5.
      captureToDrawnMs: [32.5, 33.5],
      drawnToPresentedMs: [20, 20],
    });
  });

  it('says nothing where nothing was seen', () => {
    const nothing = figuresOf({ frames: [], looks: [], captures: [], presented: [], changes: [], rateChanges: [] }, 0, 1000);
    expect(nothing).toEqual({ framesPerS: 0, frameMs: null, trackedPerS: 0, lookMs: null, captureToDrawnMs: null, drawnToPresentedMs: null });
  });

  it('tells each second, with the step on which it ended', () => {
    expect(secondsOf(made(3), 0, 3000, 1)).toEqual([
      [50, 20, 9, 1],
      [50, 20, 9, 2],
      [50, 20, 9, 2],
    ]);
  });
});
