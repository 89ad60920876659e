import { createLadder, type LadderChange } from '@oriel/shared/ladder/ladder';
import { LADDER_STEPS, type LadderStep } from '@oriel/shared/ladder/steps';

/** Where the ladder stands, and its newest changes. */
export interface LadderState {
  readonly step: number;
  readonly words: string;
  readonly lookedBy: LadderStep['looking']['by'];
  readonly changes: readonly LadderChange[];
}

const MOST_LOOKS = 64;
const MOST_CHANGES = 20;

/** Measures what the ladder asks to know, second by second. Noting a look allocates nothing. */
export class LadderKeeper {
  private readonly ladder = createLadder();
  private readonly lookMs = new Float64Array(MOST_LOOKS);
  private looks = 0;
  private changes: readonly LadderChange[] = [];

  get step(): LadderStep {
    return LADDER_STEPS[this.ladder.step];
  }

  get state(): LadderState {
    return { step: this.ladder.step, words: this.step.words, lookedBy: this.step.looking.by, changes: this.changes };
  }

  /** A look at the face that is followed took so long. */
  note(lookMs: number): void {
    if (this.looks < MOST_LOOKS) this.lookMs[this.looks++] = lookMs;
  }

  /** Ends a second; `framesPerS` drawn, where somebody counts them. Whether the step changed. */
  second(tMs: number, framesPerS: number | null): boolean {
    const lookMs = this.looks > 0 ? this.lookMs.subarray(0, this.looks).sort()[this.looks >> 1] : null;
    this.looks = 0;
    // A page that is hidden draws nothing, which is no fault of tracking.
    const frameMs = framesPerS ? 1000 / framesPerS : null;
    const change = this.ladder.second({ tMs, lookMs, frameMs });
    if (change) this.changes = [...this.changes, change].slice(-MOST_CHANGES);
    return change !== null;
  }
}
