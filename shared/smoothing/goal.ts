import { driftOffset, driftRate, type Axis, type DriftSettings } from './drift';

/*
 * Where one coordinate of the eye is bound for: a curve in time, smooth in place and speed while it lasts.
 *   home    home + drift(t)
 *   rest    a fixed place
 *   viewer  level + slope * h(t - t0): the prediction from the last sample. h runs straight to the longest horizon and then
 *           out, h = H + tau (1 - e^-((t-H)/tau)), so that a late sample finds the motion slowing and not far astray.
 */
export interface Goal {
  kind: 'home' | 'rest' | 'viewer';
  level: number;
  slope: number;
  tMs: number;
}

/** The run-out after the longest horizon, ms. */
const RUN_OUT_MS = 60;

export function createGoal(homeMm: number): Goal {
  return { kind: 'home', level: homeMm, slope: 0, tMs: 0 };
}

export function goalAt(goal: Goal, axis: Axis, tMs: number, drift: DriftSettings, horizonMs: number): number {
  if (goal.kind === 'rest') return goal.level;
  if (goal.kind === 'home') return goal.level + driftOffset(axis, tMs, drift);
  const ahead = tMs - goal.tMs;
  const beyond = Math.max(0, ahead - horizonMs);
  return goal.level + goal.slope * (ahead - beyond + RUN_OUT_MS * (1 - Math.exp(-beyond / RUN_OUT_MS)));
}

/** The rate of the goal, mm per ms. */
export function goalRate(goal: Goal, axis: Axis, tMs: number, drift: DriftSettings, horizonMs: number): number {
  if (goal.kind === 'rest') return 0;
  if (goal.kind === 'home') return driftRate(axis, tMs, drift);
  const beyond = Math.max(0, tMs - goal.tMs - horizonMs);
  return goal.slope * Math.exp(-beyond / RUN_OUT_MS);
}
