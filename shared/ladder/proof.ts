/** How long it must be borne out that a step above would do, before it is taken. */
export interface Proof {
  readonly seconds: number;
  /** A second without a change has gone. */
  calm(): void;
  climbed(): void;
  fell(): void;
}

export interface ProofSettings {
  /** Seconds in a row that must bear a climb out; doubled by every climb that had to be taken back, up to the longest. */
  readonly proofS: number;
  readonly longestProofS: number;
  /** Seconds without a change after which climbs taken back are forgotten; longer than the longest proof. */
  readonly forgiveS: number;
}

/** Whatever the load, steps cannot oscillate for long: each fall after a climb doubles the proof asked of the next climb. */
export function createProof({ proofS, longestProofS, forgiveS }: ProofSettings): Proof {
  let seconds = proofS;
  let climbs = 0;
  let calmS = 0;
  return {
    get seconds() {
      return seconds;
    },
    calm() {
      if (++calmS < forgiveS) return;
      seconds = proofS;
      climbs = calmS = 0;
    },
    climbed() {
      climbs++;
      calmS = 0;
    },
    fell() {
      calmS = 0;
      if (climbs === 0) return;
      climbs--;
      seconds = Math.min(2 * seconds, longestProofS);
    },
  };
}
