import { createProof, type ProofSettings } from './proof';

/** How many frames a second are drawn at most. */
export interface DrawingStep {
  readonly mostPerS: number;
  /** Seconds with fewer frames than this are poor; so many, less the better ones, and fewer are drawn. */
  readonly poorPerS: number;
  readonly patienceS: number;
}

/**
 * Every refresh of the screen; otherwise a half, a third or a quarter of 60. A machine asked for more frames than it can compose gives them
 * late and unevenly, and takes the time from tracking.
 */
const DRAWING_STEPS: readonly DrawingStep[] = [
  { mostPerS: Infinity, poorPerS: 45, patienceS: 4 },
  { mostPerS: 30, poorPerS: 25, patienceS: 8 },
  { mostPerS: 20, poorPerS: 18, patienceS: 8 },
  { mostPerS: 15, poorPerS: 0, patienceS: Infinity },
];

/** The rate taken is the greatest that is no more than what was achieved, and this much. */
const GENEROSITY = 1.15;
/** A rate is kept where this share of it is drawn. */
const KEPT = 0.95;
/** Of seconds in which the rate is kept, after which more is tried. */
const PROOF: ProofSettings = { proofS: 30, longestProofS: 1800, forgiveS: 7200 };

export interface DrawingChange {
  readonly tMs: number;
  readonly fromPerS: number;
  readonly toPerS: number;
  readonly reason: string;
}

export interface DrawingRate {
  readonly mostPerS: number;
  /** Takes in how many frames were drawn in a second; gives the change it led to, or null. */
  second(tMs: number, framesPerS: number): DrawingChange | null;
}

/**
 * Chooses how often to draw by how often drawing succeeds. Whether more would succeed cannot be foretold, so it is tried; as with the ladder
 * each trial taken back doubles the wait for the next, so that it cannot oscillate. Pure, but for what it remembers.
 */
export function createDrawingRate(): DrawingRate {
  let step = 0;
  let excess = 0;
  let poorFrames = 0;
  let poorS = 0;
  let goodS = 0;
  let fresh = true;
  const proof = createProof(PROOF);

  const change = (tMs: number, to: number, reason: string): DrawingChange => {
    const fromPerS = DRAWING_STEPS[step].mostPerS;
    step = to;
    excess = poorFrames = poorS = goodS = 0;
    fresh = true;
    if (DRAWING_STEPS[to].mostPerS < fromPerS) proof.fell();
    else proof.climbed();
    return { tMs, fromPerS, toPerS: DRAWING_STEPS[to].mostPerS, reason };
  };

  const fall = (tMs: number): DrawingChange => {
    const achieved = poorFrames / poorS;
    const fitting = DRAWING_STEPS.findIndex(({ mostPerS }, index) => index > step && mostPerS <= GENEROSITY * achieved);
    return change(tMs, fitting < 0 ? DRAWING_STEPS.length - 1 : fitting, `${achieved.toFixed(0)} frames a second were drawn`);
  };

  return {
    get mostPerS() {
      return DRAWING_STEPS[step].mostPerS;
    },
    second(tMs, framesPerS) {
      // The second in which the rate changed, or drawing began, belongs to neither.
      if (fresh) {
        fresh = false;
        return null;
      }
      proof.calm();
      const { poorPerS, patienceS } = DRAWING_STEPS[step];
      if (framesPerS < poorPerS) {
        excess++;
        poorS++;
        poorFrames += framesPerS;
        goodS = 0;
        return excess >= patienceS ? fall(tMs) : null;
      }
      excess = Math.max(0, excess - 1);
      if (excess === 0) poorFrames = poorS = 0;
      goodS = framesPerS >= KEPT * DRAWING_STEPS[step].mostPerS ? goodS + 1 : 0;
      if (step === 0 || goodS < proof.seconds) return null;
      return change(tMs, step - 1, `drawing kept its rate for ${proof.seconds} s`);
    },
  };
}
