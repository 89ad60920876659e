/** How a frame is looked at. */
export interface Looking {
  /** All landmarks; the eyes of the zoomed detector alone; or nothing at all. */
  readonly by: 'landmarks' | 'detector' | 'nothing';
  /** Frames from one guarding look to the next while nothing is suspect; of landmarks only. */
  readonly guardEvery: number;
  /** Looks a second at most; frames that come sooner are passed over. */
  readonly mostPerS: number;
}

/** One step of the ladder. */
export interface LadderStep {
  readonly words: string;
  readonly looking: Looking;
  /** What a look may take on this step, ms; more than that for long, and the step below is taken. */
  readonly budgetMs: number;
  /** What a look takes, against one of the first step. */
  readonly cost: number;
}

/**
 * What a look takes, ms, on one core of an AMD EPYC by wasm with SIMD, over a film of `npm run video:face` (640 x 480): landmarks alone, and the
 * zoomed detector that guards them. Every fifth frame guarded they come to 8.1; `npm run bench:tracking` gave 7.6 for the whole tracker.
 */
const LANDMARKS_MS = 6.8;
const DETECTOR_MS = 6.6;

/** Landmarks with one frame of so many guarded, against every frame guarded. */
const guarded = (every: number): number => (LANDMARKS_MS + DETECTOR_MS / every) / (LANDMARKS_MS + DETECTOR_MS);
const DETECTOR_COST = DETECTOR_MS / (LANDMARKS_MS + DETECTOR_MS);

/**
 * From the finest to none. Budgets from what is asked of a small computer (practice): 18 landmark looks a second or more, otherwise 14 of the
 * detector's, and below 5 a second a window is not believed. The detector at 20 a second has 90 ms: slower than that it gives no more than the
 * 10 or 11 a second of the step below. Plain wasm without SIMD is no step: where a browser lacks SIMD it is used throughout.
 */
export const LADDER_STEPS: readonly LadderStep[] = [
  { words: 'landmarks, checked at every frame', looking: { by: 'landmarks', guardEvery: 1, mostPerS: Infinity }, budgetMs: 55, cost: 1 },
  { words: 'landmarks, checked every fifth frame', looking: { by: 'landmarks', guardEvery: 5, mostPerS: Infinity }, budgetMs: 55, cost: guarded(5) },
  { words: 'landmarks, checked every tenth frame', looking: { by: 'landmarks', guardEvery: 10, mostPerS: Infinity }, budgetMs: 55, cost: guarded(10) },
  { words: 'landmarks, 20 a second, predicted between', looking: { by: 'landmarks', guardEvery: 10, mostPerS: 20 }, budgetMs: 55, cost: guarded(10) },
  { words: 'zoomed detector', looking: { by: 'detector', guardEvery: 1, mostPerS: Infinity }, budgetMs: 70, cost: DETECTOR_COST },
  { words: 'zoomed detector, 20 a second, predicted between', looking: { by: 'detector', guardEvery: 1, mostPerS: 20 }, budgetMs: 90, cost: DETECTOR_COST },
  { words: 'zoomed detector, 10 a second, predicted between', looking: { by: 'detector', guardEvery: 1, mostPerS: 10 }, budgetMs: 200, cost: DETECTOR_COST },
  { words: 'no tracking', looking: { by: 'nothing', guardEvery: 1, mostPerS: 0 }, budgetMs: Infinity, cost: 0 },
];

/** Where the ladder is begun: sure enough for any machine that keeps up, and what is measured here says which way to go. */
export const FIRST_STEP = 1;

/** Work a second on a step, as a share of the first step's at `framesPerS` of the camera. */
export const loadOf = ({ cost, looking }: LadderStep, framesPerS: number): number => (cost * Math.min(looking.mostPerS, framesPerS)) / framesPerS;
