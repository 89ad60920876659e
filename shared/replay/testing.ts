import { CALM_FOLLOWING, type FollowerSettings } from '../smoothing/follower-settings';
import { NO_DRIFT } from '../smoothing/drift';
import type { ReplaySample } from './sample';

export type Eye = [number, number, number];

/** Repeatable normal noise of deviation 1 (a linear congruential generator and the Box-Muller transform). */
export function normalNoise(seed = 7): () => number {
  let state = seed;
  const uniform = () => (state = (Math.imul(state, 1103515245) + 12345) & 0x7fffffff) / 0x80000000;
  return () => Math.sqrt(-2 * Math.log(uniform() + 1e-12)) * Math.cos(2 * Math.PI * uniform());
}

/** A run made up: an eye on a path, seen `rateHz` times a second and `lateMs` late, with noise across and along, mm. */
export function madeUpRun(
  path: (tMs: number) => Eye,
  { untilMs = 10_000, rateHz = 30, lateMs = 0, across = 0, along = 0, seed = 7 } = {},
): ReplaySample[] {
  const noise = normalNoise(seed);
  return Array.from({ length: Math.floor((untilMs * rateHz) / 1000) }, (_, i) => {
    const capturedMs = (i * 1000) / rateHz;
    const [x, y, z] = path(capturedMs);
    return {
      capturedMs,
      receivedMs: capturedMs + lateMs,
      eye: [x + across * noise(), y + across * noise(), z + along * noise()],
    };
  });
}

/** A follower that is nothing but a first-order low-pass: no prediction, no easing, no limit. */
export function lowPassOnly(cutoffHz: number): FollowerSettings {
  const filter = { minCutoffHz: cutoffHz, beta: 0, derivativeCutoffHz: 1 };
  return {
    ...CALM_FOLLOWING,
    homeEye: { x: 0, y: 0, z: 1000 },
    filter: { across: filter, along: filter },
    predictor: { acrossMs: 1e-6, alongMs: 1e-6 },
    restMmPerS: 1e12,
    correctionMs: 1e-6,
    appearMs: 1e-6,
    jumpMm: 1e9,
    greatestMmPerS: 1e9,
    drift: NO_DRIFT,
  };
}

/** Stands still for six seconds, then walks to and fro across 0.6 m and between 0.7 and 1.3 m for eight. */
export const standsThenWalks = (tMs: number): Eye => {
  const t = Math.max(0, tMs - 6000) / 1000;
  return [100 + 300 * Math.sin(2 * Math.PI * 0.5 * t), 20, 1000 + 300 * Math.sin(2 * Math.PI * 0.35 * t)];
};
