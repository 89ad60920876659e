/*
 * The 1 euro filter: G. Casiez, N. Roussel, D. Vogel, 1€ Filter: A Simple Speed-based Low-pass Filter for Noisy Input in
 * Interactive Systems, CHI 2012, 2527-2530. A first-order low-pass whose cutoff rises with speed: still hands are held
 * still, fast ones are not held back.
 *
 *     alpha(fc) = 1 / (1 + rate/(2 pi fc))
 *     dx = (x - last filtered x) * rate, low-passed at dcutoff;   fc = mincutoff + beta |dx|
 *
 * The rate is that of each interval, so samples may come unevenly. On a steady ramp the output lags by 1/(2 pi fc)
 * exactly, whatever the intervals. State is plain data, changed in place; a step allocates nothing.
 */

export interface OneEuroSettings {
  /** Cutoff at rest, Hz: lower is steadier and slower. */
  readonly minCutoffHz: number;
  /** Hz of cutoff gained for each unit a second of speed: higher lags less. */
  readonly beta: number;
  /** Cutoff of the speed itself, Hz. */
  readonly derivativeCutoffHz: number;
}

export interface OneEuroState {
  started: boolean;
  tMs: number;
  value: number;
  derivative: number;
  cutoffHz: number;
}

export function createOneEuro(): OneEuroState {
  return { started: false, tMs: 0, value: 0, derivative: 0, cutoffHz: 0 };
}

/** The weight of the newest sample in a first-order low-pass at `cutoffHz` with samples at `rateHz`. */
export function lowPassWeight(cutoffHz: number, rateHz: number): number {
  return 1 / (1 + rateHz / (2 * Math.PI * cutoffHz));
}

/** Takes one sample and returns the filtered value. A sample no later than the last is ignored: its order is lost. */
export function stepOneEuro(state: OneEuroState, value: number, tMs: number, settings: OneEuroSettings): number {
  if (!state.started) {
    state.started = true;
    state.tMs = tMs;
    state.value = value;
    state.derivative = 0;
    state.cutoffHz = settings.minCutoffHz;
    return value;
  }
  if (tMs <= state.tMs) return state.value;
  const rateHz = 1000 / (tMs - state.tMs);
  const derivative = (value - state.value) * rateHz;
  state.derivative += lowPassWeight(settings.derivativeCutoffHz, rateHz) * (derivative - state.derivative);
  state.cutoffHz = settings.minCutoffHz + settings.beta * Math.abs(state.derivative);
  state.value += lowPassWeight(state.cutoffHz, rateHz) * (value - state.value);
  state.tMs = tMs;
  return state.value;
}

/** How far the output lags behind a steady ramp, ms: 1/(2 pi fc). */
export function lagMs(state: OneEuroState): number {
  return 1000 / (2 * Math.PI * state.cutoffHz);
}
