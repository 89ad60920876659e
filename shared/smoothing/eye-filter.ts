import type { Point3 } from '../projection/types';
import { createOneEuro, lagMs, stepOneEuro, type OneEuroSettings, type OneEuroState } from './one-euro';

/*
 * The 1 euro filter on an eye. Distance (z) comes from the size of a face in pixels and is noisier than x and y by an order
 * of magnitude, so it has settings of its own. A step allocates nothing.
 */

export interface EyeFilterSettings {
  /** For x and y. */
  readonly across: OneEuroSettings;
  /** For z. */
  readonly along: OneEuroSettings;
}

export interface EyeFilterState {
  readonly x: OneEuroState;
  readonly y: OneEuroState;
  readonly z: OneEuroState;
}

export function createEyeFilter(): EyeFilterState {
  return { x: createOneEuro(), y: createOneEuro(), z: createOneEuro() };
}

/** Takes one eye, mm, at `tMs`; the filtered eye is in the three `value`s of the state. */
export function stepEyeFilter(state: EyeFilterState, eye: Point3, tMs: number, settings: EyeFilterSettings): void {
  stepOneEuro(state.x, eye.x, tMs, settings.across);
  stepOneEuro(state.y, eye.y, tMs, settings.across);
  stepOneEuro(state.z, eye.z, tMs, settings.along);
}

/** Forgets everything: the next sample starts afresh. */
export function resetEyeFilter(state: EyeFilterState): void {
  state.x.started = state.y.started = state.z.started = false;
}

/** The lag of one axis behind a steady motion, ms. */
export function axisLagMs(state: EyeFilterState, axis: 'x' | 'y' | 'z'): number {
  return lagMs(state[axis]);
}
