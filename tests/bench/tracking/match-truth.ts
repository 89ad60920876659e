import { NUMBER_BITS } from './frame-number';
import type { FrameResult } from './result';
import type { Truth, TruthFrame } from './truth';

const WRAP = 1 << NUMBER_BITS;

/** The share of the frames that must carry numbers in order for the numbers to be believed. */
const IN_ORDER = 0.9;

/**
 * Pairs each replayed frame with its truth by the number it carries (which wraps at 4096, so the nearest to its place in the video is
 * meant); by its place in a video that carries none. Frames without a truth are left out.
 * @throws Error where no frame has a truth: video and truth do not belong together
 */
export function matchTruth(
  truth: Truth,
  results: readonly FrameResult[],
): { truths: TruthFrame[]; matched: FrameResult[] } {
  const byNumber = new Map(truth.frames.map((frame) => [frame.number, frame]));
  const numbered = carriesNumbers(results);
  const truths: TruthFrame[] = [];
  const matched: FrameResult[] = [];
  results.forEach((result, place) => {
    const found = byNumber.get(numbered && result.number !== null ? nearestTo(place, result.number) : place);
    if (!found) return;
    truths.push(found);
    matched.push(result);
  });
  if (matched.length === 0)
    throw new Error('No frame of the video matches a frame of the truth: do they belong together?');
  return { truths, matched };
}

/** Blocks read where none were drawn agree with their parity half of the time, but do not count up. */
function carriesNumbers(results: readonly FrameResult[]): boolean {
  const inOrder = results.filter(({ number }, place) => {
    const before = results[place - 1]?.number;
    return number !== null && (place === 0 || before === null || (number - before + WRAP) % WRAP <= 8);
  });
  return inOrder.length >= IN_ORDER * results.length;
}

const nearestTo = (place: number, number: number): number => number + WRAP * Math.round((place - number) / WRAP);
