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
 * From the finest to none. Costs from looks measured on one machine (landmarks 6.8 ms, a guarding look 6.6 ms); budgets from what is asked
 * of a small computer: 18 landmark looks a second or more, otherwise 14 of the detector's, and below 5 a second a window is not believed
 * (practice: about 4 is too slow). Plain wasm without SIMD is no step: where a browser lacks SIMD it is used throughout.
 */
export const LADDER_STEPS: readonly LadderStep[] = [
  { words: 'landmarks, each frame guarded', looking: { by: 'landmarks', guardEvery: 1, mostPerS: Infinity }, budgetMs: 55, cost: 1 },
  { words: 'landmarks, every fifth frame guarded', looking: { by: 'landmarks', guardEvery: 5, mostPerS: Infinity }, budgetMs: 55, cost: 0.61 },
  { words: 'landmarks, every tenth frame guarded', looking: { by: 'landmarks', guardEvery: 10, mostPerS: Infinity }, budgetMs: 55, cost: 0.56 },
  { words: 'landmarks, 20 a second, predicted between', looking: { by: 'landmarks', guardEvery: 10, mostPerS: 20 }, budgetMs: 55, cost: 0.56 },
  { words: 'zoomed detector', looking: { by: 'detector', guardEvery: 1, mostPerS: Infinity }, budgetMs: 70, cost: 0.49 },
  { words: 'zoomed detector, 20 a second, predicted between', looking: { by: 'detector', guardEvery: 1, mostPerS: 20 }, budgetMs: 90, cost: 0.49 },
  { words: 'zoomed detector, 10 a second, predicted between', looking: { by: 'detector', guardEvery: 1, mostPerS: 10 }, budgetMs: 200, cost: 0.49 },
  { words: 'no tracking', looking: { by: 'nothing', guardEvery: 1, mostPerS: 0 }, budgetMs: Infinity, cost: 0 },
];

/** Where the ladder is begun: sure enough for any machine that keeps up, and what is measured here says which way to go. */
export const FIRST_STEP = 1;

/** Work a second on a step, as a share of the first step's at `framesPerS` of the camera. */
export const loadOf = ({ cost, looking }: LadderStep, framesPerS: number): number => (cost * Math.min(looking.mostPerS, framesPerS)) / framesPerS;
