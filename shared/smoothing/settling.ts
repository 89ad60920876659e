/*
 * A difference that dies away calmly: a critically damped spring with its end at zero,
 *
 *     o(t) = (p + (v + w p) t) e^(-w t),
 *
 * p and v its value and speed at t = 0 and w its rate. Whoever adds o to a goal that has jumped by -p in place and by -v
 * in speed moves on without a jump in either, and arrives. The step is the closed form, so that frames may come at any
 * interval: two steps of 8 ms are one of 16 ms. (The same law: D. Hearn and others; any text on second-order systems.)
 */
export interface Settling {
  p: number;
  /** Per ms. */
  v: number;
}

export function createSettling(): Settling {
  return { p: 0, v: 0 };
}

/** The rate, per ms, at which a difference has died away to 2 % after `ms`: (1 + x) e^-x = 0.02 at x = 5.834. */
export function settlingRate(ms: number): number {
  return 5.834 / ms;
}

/** Lets `dtMs` pass, in place. */
export function stepSettling(state: Settling, dtMs: number, ratePerMs: number): void {
  const decay = Math.exp(-ratePerMs * dtMs);
  const drive = state.v + ratePerMs * state.p;
  state.p = (state.p + drive * dtMs) * decay;
  state.v = (state.v - drive * ratePerMs * dtMs) * decay;
}

/** Adds a jump of the goal, the other way round, so that the sum goes on as it went. */
export function addJump(state: Settling, p: number, v: number): void {
  state.p += p;
  state.v += v;
}
