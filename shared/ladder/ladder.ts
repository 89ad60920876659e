import { FIRST_STEP, LADDER_STEPS, loadOf, type LadderStep } from './steps';

export interface LadderSettings {
  readonly steps: readonly LadderStep[];
  readonly firstStep: number;
  /** Intervals between drawn frames above this are poor, ms; where fewer are drawn on purpose, as if 30 a second were wanted. */
  readonly drawingBudgetMs: number;
  /** For the sake of drawing no step with fewer looks a second than this is taken: a picture that follows late is worse than one drawn seldom. */
  readonly leastForDrawingPerS: number;
  /** Seconds of excess, less the seconds without, that bring the ladder down a step. */
  readonly excessS: number;
  /** Share of the upper step's budget in which the foretold time must lie for a climb. */
  readonly calmShare: number;
  /** Seconds in a row that must bear a climb out; doubled by every climb that had to be taken back, up to the longest. */
  readonly proofS: number;
  readonly longestProofS: number;
  /** Seconds without a change after which climbs taken back are forgotten; longer than the longest proof. */
  readonly forgiveS: number;
}

export const USUAL_LADDER: LadderSettings = {
  steps: LADDER_STEPS,
  firstStep: FIRST_STEP,
  drawingBudgetMs: 45,
  leastForDrawingPerS: 20,
  excessS: 3,
  calmShare: 0.85,
  proofS: 20,
  longestProofS: 1800,
  forgiveS: 7200,
};

/** What one second was like: medians, null where nothing was to be measured. */
export interface LadderSecond {
  /** On any clock. */
  readonly tMs: number;
  /** Time of a look at a face that is followed, ms. */
  readonly lookMs: number | null;
  /** Interval between drawn frames, ms; counted only beside a look, for where nobody is followed tracking is not what hampers, and nobody sees. */
  readonly frameMs: number | null;
}

export interface LadderChange {
  readonly tMs: number;
  readonly from: number;
  readonly to: number;
  readonly reason: string;
}

export interface Ladder {
  readonly step: number;
  /** Takes in a second; gives the change it led to, or null. */
  second(second: LadderSecond): LadderChange | null;
}

/** A fall for the sake of drawing goes to the first step with no more than this share of the work: less could not be told from chance. */
const RELIEF_SHARE = 0.75;
/** Drawing is relieved when its interval has come down to this share. */
const RELIEVED = 0.9;
const CAMERA_PER_S = 30;

/**
 * Chooses how finely to look by what looking takes. Down after a sustained excess over the step's budget, or while frames are drawn poorly;
 * up when the time foretold for the step above (this step's time by the ratio of the costs) has fitted into its budget for long. Whatever
 * comes, it cannot oscillate: each fall after a climb doubles the proof asked of the next climb. Where less tracking did not help the
 * drawing, tracking is not to blame and gives up nothing more for it; and for the drawing's sake it never looks less than 20 times a second.
 * Pure, but for what it remembers.
 */
export function createLadder(settings: LadderSettings = USUAL_LADDER): Ladder {
  const { steps } = settings;
  const last = steps.length - 1;
  let step = settings.firstStep;
  let excess = 0;
  let proven = 0;
  let proofS = settings.proofS;
  let climbs = 0;
  let calmS = 0;
  let fresh = false;
  let frameMsAtFall: number | null = null;
  let blameless = false;

  const change = (tMs: number, to: number, reason: string): LadderChange => {
    const from = step;
    step = to;
    excess = proven = calmS = 0;
    fresh = true;
    return { tMs, from, to, reason };
  };

  const fall = (tMs: number, to: number, reason: string): LadderChange => {
    if (climbs > 0) {
      climbs--;
      proofS = Math.min(2 * proofS, settings.longestProofS);
    }
    return change(tMs, to, reason);
  };

  const slowDrawing = (frameMs: number | null): frameMs is number => frameMs !== null && frameMs > settings.drawingBudgetMs;

  const fallForDrawing = (tMs: number, frameMs: number): LadderChange | null => {
    if (frameMsAtFall !== null && frameMs > RELIEVED * frameMsAtFall) {
      blameless = true;
      frameMsAtFall = null;
      excess = 0;
      return null;
    }
    const least = RELIEF_SHARE * loadOf(steps[step], CAMERA_PER_S);
    const to = steps.findIndex(
      (candidate, index) => index > step && candidate.looking.mostPerS >= settings.leastForDrawingPerS && loadOf(candidate, CAMERA_PER_S) <= least,
    );
    excess = 0;
    if (to < 0) return null;
    frameMsAtFall = frameMs;
    return fall(tMs, to, `frames were drawn every ${frameMs.toFixed(0)} ms, and ${settings.drawingBudgetMs} are allowed`);
  };

  const fitsAbove = ({ lookMs, frameMs }: LadderSecond): boolean | null => {
    if (steps[step].looking.by === 'nothing') return true;
    if (slowDrawing(frameMs) && !blameless) return false;
    if (lookMs === null) return null;
    const above = steps[step - 1];
    return (lookMs * above.cost) / steps[step].cost <= settings.calmShare * above.budgetMs;
  };

  const climb = (second: LadderSecond): LadderChange | null => {
    const fits = step > 0 ? fitsAbove(second) : null;
    if (fits === null) return null;
    proven = fits ? proven + 1 : 0;
    if (proven < proofS) return null;
    const words = `looks fitted for ${proofS} s`;
    climbs++;
    return change(second.tMs, step - 1, words);
  };

  return {
    get step() {
      return step;
    },
    second(second) {
      // The second in which the step changed belongs to neither.
      if (fresh) {
        fresh = false;
        return null;
      }
      const { tMs, lookMs, frameMs } = second;
      const witnessed = lookMs !== null;
      if (++calmS >= settings.forgiveS) {
        proofS = settings.proofS;
        climbs = calmS = 0;
      }
      if (frameMs !== null && !slowDrawing(frameMs)) {
        blameless = false;
        frameMsAtFall = null;
      }
      const slowLook = lookMs !== null && lookMs > steps[step].budgetMs;
      const slowFrames = witnessed && slowDrawing(frameMs) && !blameless;
      excess = slowLook || slowFrames ? excess + 1 : Math.max(0, excess - 1);
      if (excess >= settings.excessS && step < last) {
        if (slowLook) return fall(tMs, step + 1, `a look took ${lookMs.toFixed(0)} ms, and ${steps[step].budgetMs} are allowed`);
        if (slowFrames) return fallForDrawing(tMs, frameMs);
      }
      return climb(second);
    },
  };
}
