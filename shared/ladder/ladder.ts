import { createBlame } from './blame';
import { createProof, type ProofSettings } from './proof';
import { FIRST_STEP, LADDER_STEPS, loadOf, type LadderStep } from './steps';

export interface LadderSettings extends ProofSettings {
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
}

/**
 * Practice, not derived: with these the emulated computers of `npm run bench:player -- --layers 5 --size 720p --settle 30` found their step within
 * fifteen seconds (DEVELOPERS.md), and `ladder.spec.ts` bounds the changes under any load.
 */
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
const CAMERA_PER_S = 30;

/**
 * Chooses how finely to look by what looking takes. Down after a sustained excess over the step's budget, or while frames are drawn poorly
 * and tracking is to blame; up when the time foretold for the step above (this step's time by the ratio of the costs) has fitted into its
 * budget for long. Each fall after a climb doubles the proof asked of the next climb. For the drawing's sake it never looks less than 20
 * times a second. Pure, but for what it remembers.
 */
export function createLadder(settings: LadderSettings = USUAL_LADDER): Ladder {
  const { steps } = settings;
  const proof = createProof(settings);
  const blame = createBlame(settings.drawingBudgetMs);
  let step = settings.firstStep;
  let excess = 0;
  let proven = 0;
  let fresh = false;

  const change = (tMs: number, to: number, reason: string): LadderChange => {
    const from = step;
    step = to;
    excess = proven = 0;
    fresh = true;
    if (to > from) proof.fell();
    else proof.climbed();
    return { tMs, from, to, reason };
  };

  const fallForDrawing = (tMs: number, frameMs: number): LadderChange | null => {
    excess = 0;
    if (!blame.stillLies(frameMs)) return null;
    const to = lighterStep(settings, step);
    if (to < 0) return null;
    blame.gaveWay(frameMs);
    return change(tMs, to, `frames were drawn every ${frameMs.toFixed(0)} ms, and ${settings.drawingBudgetMs} are allowed`);
  };

  const fitsAbove = ({ lookMs, frameMs }: LadderSecond): boolean | null => {
    if (steps[step].looking.by === 'nothing') return true;
    if (blame.lies(frameMs)) return false;
    if (lookMs === null) return null;
    const above = steps[step - 1];
    return (lookMs * above.cost) / steps[step].cost <= settings.calmShare * above.budgetMs;
  };

  const climb = (second: LadderSecond): LadderChange | null => {
    const fits = step > 0 ? fitsAbove(second) : null;
    if (fits === null) return null;
    proven = fits ? proven + 1 : 0;
    return proven < proof.seconds ? null : change(second.tMs, step - 1, `looks fitted for ${proof.seconds} s`);
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
      proof.calm();
      blame.hear(frameMs);
      const { budgetMs } = steps[step];
      const slowLook = lookMs !== null && lookMs > budgetMs;
      const slowFrames = lookMs !== null && blame.lies(frameMs);
      excess = slowLook || slowFrames ? excess + 1 : Math.max(0, excess - 1);
      if (excess >= settings.excessS && step < steps.length - 1) {
        if (slowLook) return change(tMs, step + 1, `a look took ${lookMs.toFixed(0)} ms, and ${budgetMs} are allowed`);
        if (slowFrames) return fallForDrawing(tMs, frameMs);
      }
      return climb(second);
    },
  };
}

/** The first step below that gives drawing enough of the processor back; -1 where none may be taken. */
function lighterStep({ steps, leastForDrawingPerS }: LadderSettings, step: number): number {
  const most = RELIEF_SHARE * loadOf(steps[step], CAMERA_PER_S);
  return steps.findIndex((candidate, index) => index > step && candidate.looking.mostPerS >= leastForDrawingPerS && loadOf(candidate, CAMERA_PER_S) <= most);
}
