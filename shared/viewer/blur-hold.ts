/*
 * Motion blur draws a face larger, so distance reads short: on rendered walkers by 1.5 % where the face moves 0.16 of its eye
 * distance while the shutter is open, 5 % at 0.32, 11 % at 0.5, 19 % at 0.77. What blur b can do is bounded by
 *
 *     Z read <= Z <= Z read (1 + 0.3 b),
 *
 * so from b = 0.15 on the distance is held where it was, but within these bounds: it is never kept where blur cannot explain
 * the difference. Someone first seen blurred has no distance to hold, and reads short until they slow down.
 */

/** Blur from which distance is held, in eye distances. */
const HELD_FROM = 0.15;
/** More blur than this is no walker but another face, as at a hand-over: believed at once. */
const ANOTHER_FROM = 1.2;
/** The most that blur takes from the distance, for each eye distance of blur. */
const MOST_LOSS = 0.3;
/** How long a webcam indoors exposes when asked for a shorter time; its own figure is seldom told. */
export const USUAL_EXPOSURE_MS = 25;
/** Frames farther apart say nothing about speed. */
const LONGEST_GAP_MS = 250;

/** What is remembered from frame to frame; changed in place. */
export interface BlurHold {
  heldMm: number;
  xPx: number;
  yPx: number;
  tMs: number;
}

export const createBlurHold = (): BlurHold => ({ heldMm: NaN, xPx: 0, yPx: 0, tMs: -Infinity });

/**
 * The distance to believe, mm, for one read with the midpoint between the eyes at this pixel and the eyes this far apart. Allocates nothing.
 * @param tMs time of capture; a gap begins anew.
 */
export function holdThroughBlur(
  hold: BlurHold,
  readMm: number,
  xPx: number,
  yPx: number,
  eyeDistancePx: number,
  tMs: number,
  exposureMs = USUAL_EXPOSURE_MS,
): number {
  const gapMs = tMs - hold.tMs;
  const fresh = !(gapMs > 0 && gapMs <= LONGEST_GAP_MS);
  const blur = fresh ? 0 : (Math.hypot(xPx - hold.xPx, yPx - hold.yPx) * exposureMs) / (gapMs * eyeDistancePx);
  const holds = blur >= HELD_FROM && blur < ANOTHER_FROM;
  hold.heldMm = !holds ? readMm : Math.min(Math.max(hold.heldMm, readMm), readMm * (1 + MOST_LOSS * blur));
  hold.xPx = xPx;
  hold.yPx = yPx;
  hold.tMs = tMs;
  return hold.heldMm;
}
