/*
 * Double exponential prediction: J. LaViola, Double Exponential Smoothing: An Alternative to Kalman Filter-Based
 * Predictive Tracking, EGVE 2003.
 *
 *     S = a p + (1-a) S'      S2 = a S + (1-a) S2'
 *     p(t+tau) = (2 + a tau/(1-a)) S - (1 + a tau/(1-a)) S2,   tau in samples
 *
 * Taking a = dt/(dt+T) from a time constant T makes a tau/(1-a) = h/T for a horizon h in the same unit, whatever the
 * interval: a steady ramp is then predicted exactly, once settled, from uneven samples too. (S - S2)/T is its slope.
 * State is plain data, changed in place; nothing is allocated.
 */
export interface DoubleExponentialState {
  started: boolean;
  tMs: number;
  once: number;
  twice: number;
}

export function createDoubleExponential(): DoubleExponentialState {
  return { started: false, tMs: 0, once: 0, twice: 0 };
}

/** Takes one sample. A sample no later than the last is ignored. */
export function stepDoubleExponential(
  state: DoubleExponentialState,
  value: number,
  tMs: number,
  timeConstantMs: number,
): void {
  if (!state.started) {
    state.started = true;
    state.once = state.twice = value;
    state.tMs = tMs;
    return;
  }
  const dtMs = tMs - state.tMs;
  if (dtMs <= 0) return;
  const weight = dtMs / (dtMs + timeConstantMs);
  state.once += weight * (value - state.once);
  state.twice += weight * (state.once - state.twice);
  state.tMs = tMs;
}

/** The slope at the last sample, per ms. */
export function slopeOf(state: DoubleExponentialState, timeConstantMs: number): number {
  return (state.once - state.twice) / timeConstantMs;
}

/** The value `horizonMs` after the last sample. */
export function predict(state: DoubleExponentialState, horizonMs: number, timeConstantMs: number): number {
  return 2 * state.once - state.twice + slopeOf(state, timeConstantMs) * horizonMs;
}
