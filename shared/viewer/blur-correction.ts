/*
 * Motion blur smears a face along its way, so that whoever walks past is drawn too wide and their distance reads short: on rendered
 * walkers by 1 % where the face is drawn 1.12 as wide as it should be against its height, 5 % at 1.20, 9 % at 1.28, 15 % at 1.36.
 * Seen sharply the same faces are drawn 1.10 as wide when they face the camera; turned or at the edge of the picture too, up to 1.2,
 * which is no blur. So the distance is corrected by what the widening w says, as far as the face both moves and is smeared:
 *
 *     Z = Z read / (1 - share * 0.5 (w - 1.10)).
 *
 * Against this, holding the distance at which someone was last seen sharply fails those first seen blurred, and those seen sharply by a
 * camera that exposes briefly, which never says so. Measured on walkers at 1 and 1.5 m/s, rms: blurred 9 and 11 % to 3 %, sharp 2 %
 * (npm run video:heads -- --path blur and --path walk, --who 0 and 1; npm run bench:tracking). All figures below are from the same films.
 * A face that moves up or down is drawn too high instead, and is left as it is.
 */

/** Widening of a face seen sharply, and the share of the distance lost for each unit beyond. */
const SHARP_WIDENING = 1.1;
const LOSS = 0.5;
/** More than was ever seen is none of blur's. */
const MOST_LOSS = 0.25;
/** Movement while the shutter is open, in eye distances: nothing is corrected below the first, and all from the second on. */
const MOVES_FROM = 0.1;
const MOVES_SURELY = 0.2;
/** More movement than this is another face, as at a hand-over. */
const ANOTHER_FROM = 1.2;
/** Detail along the way against detail across it: sharp faces have 0.73 to 0.87, smeared ones 0.4 to 0.7. */
const SHARP_FROM = 0.78;
const SMEARED_FROM = 0.63;
/** How long a webcam indoors exposes when asked for a shorter time; its own figure is seldom told. */
const USUAL_EXPOSURE_MS = 25;
/** Frames farther apart say nothing about speed. */
const LONGEST_GAP_MS = 250;

/** Where the midpoint between the eyes was, and when; changed in place. */
export interface BlurCorrection {
  xPx: number;
  yPx: number;
  tMs: number;
}

export const createBlurCorrection = (): BlurCorrection => ({ xPx: 0, yPx: 0, tMs: -Infinity });

/** A face in one frame, as far as blur concerns it. */
export interface SeenFace {
  readonly tMs: number;
  /** The midpoint between the eyes, and their distance from each other, px. */
  readonly xPx: number;
  readonly yPx: number;
  readonly eyeDistancePx: number;
  /** Direction of the line between the eyes in the picture. */
  readonly eyeLineRad: number;
  /** See face-widening.ts. */
  readonly widening: () => number;
  /** Detail along this direction of the picture against detail across it; asked for only of a face that moves. */
  readonly detailAlong: (directionRad: number) => number;
}

const between = (from: number, to: number, value: number): number => Math.min(1, Math.max(0, (value - from) / (to - from)));

/** By how much to multiply the distance that was read: 1 or more. Takes the face in for the next frame. */
export function correctionForBlur(state: BlurCorrection, face: SeenFace): number {
  const gapMs = face.tMs - state.tMs;
  const dx = face.xPx - state.xPx;
  const dy = face.yPx - state.yPx;
  state.xPx = face.xPx;
  state.yPx = face.yPx;
  state.tMs = face.tMs;
  const moved = (Math.hypot(dx, dy) * USUAL_EXPOSURE_MS) / (gapMs * face.eyeDistancePx);
  // Whoever is seen for the first time may be walking: then the smear alone says so.
  const known = gapMs > 0 && gapMs <= LONGEST_GAP_MS && moved < ANOTHER_FROM;
  const moves = known ? between(MOVES_FROM, MOVES_SURELY, moved) : 1;
  const directionRad = known ? Math.atan2(dy, dx) : face.eyeLineRad;
  const sideways = between(0.5, 0.8, Math.abs(Math.cos(directionRad - face.eyeLineRad)));
  if (moves * sideways === 0) return 1;
  const share = moves * sideways * between(SHARP_FROM, SMEARED_FROM, face.detailAlong(directionRad));
  return 1 / (1 - share * Math.min(MOST_LOSS, Math.max(0, LOSS * (face.widening() - SHARP_WIDENING))));
}
