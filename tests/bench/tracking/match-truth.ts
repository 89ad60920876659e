import { NUMBER_BITS } from './frame-number';
import type { FrameResult } from './result';
import type { Truth, TruthFrame } from './truth';

const WRAP = 1 << NUMBER_BITS;

/**
 * Pairs each replayed frame with its truth by the number it carries (which wraps at 4096, so the nearest to its place in the video is
 * meant); by its place where it carries none. Frames without a truth are left out.
 */
export function matchTruth(
  truth: Truth,
  results: readonly FrameResult[],
): { truths: TruthFrame[]; matched: FrameResult[] } {
  const byNumber = new Map(truth.frames.map((frame) => [frame.i, frame]));
  const truths: TruthFrame[] = [];
  const matched: FrameResult[] = [];
  results.forEach((result, place) => {
    const found = byNumber.get(result.number === null ? place : nearestTo(place, result.number));
    if (!found) return;
    truths.push(found);
    matched.push(result);
  });
  if (matched.length === 0)
    throw new Error('No frame of the video matches a frame of the truth: do they belong together?');
  return { truths, matched };
}

const nearestTo = (place: number, number: number): number => number + WRAP * Math.round((place - number) / WRAP);
