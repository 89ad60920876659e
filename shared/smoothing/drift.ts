/*
 * Where the eye wanders while nobody is there: a slow Lissajous figure about the home eye, so that the picture is seen to
 * be deep and yet draws no glance. Periods of 23, 31 and 41 s have no common measure below eight hours, so it does not
 * visibly repeat. Smooth in every derivative; at the amplitudes below it moves at most at 60 * 2 pi/23 = 16 mm/s sideways.
 */
export interface DriftSettings {
  readonly xMm: number;
  readonly yMm: number;
  readonly zMm: number;
}

export const CALM_DRIFT: DriftSettings = { xMm: 60, yMm: 15, zMm: 40 };

/** For those who ask for less motion: none. */
export const NO_DRIFT: DriftSettings = { xMm: 0, yMm: 0, zMm: 0 };

const PERIOD_MS = { x: 23_000, y: 31_000, z: 41_000 };

/** One coordinate of an eye. */
export type Axis = 'x' | 'y' | 'z';

/** The offset from home along one axis at a time, mm. */
export function driftOffset(axis: Axis, tMs: number, settings: DriftSettings): number {
  return amplitude(axis, settings) * Math.sin(angularRate(axis) * tMs);
}

/** The rate of that offset, mm per ms. */
export function driftRate(axis: Axis, tMs: number, settings: DriftSettings): number {
  return amplitude(axis, settings) * angularRate(axis) * Math.cos(angularRate(axis) * tMs);
}

const angularRate = (axis: Axis) => (2 * Math.PI) / PERIOD_MS[axis];

const amplitude = (axis: Axis, settings: DriftSettings) =>
  axis === 'x' ? settings.xMm : axis === 'y' ? settings.yMm : settings.zMm;
