import type { Point3 } from '../projection/types';

/*
 * A limit on speed, for comfort. The limited eye y follows the wanted eye x by
 *
 *     y' = x' + k (x - y),   cut to the greatest speed;
 *
 * within the limit it *is* the wanted eye, with no lag; beyond it, it falls behind at the greatest speed, and makes the gap
 * good without a jump in place or in speed. State is plain data, changed in place; nothing is allocated.
 */
export interface SpeedLimitState {
  started: boolean;
  tMs: number;
  readonly wanted: { x: number; y: number; z: number };
  readonly limited: { x: number; y: number; z: number };
}

/** How fast a gap is made good: to a third in this time. */
const CATCH_UP_MS = 100;

export function createSpeedLimit(): SpeedLimitState {
  return { started: false, tMs: 0, wanted: { x: 0, y: 0, z: 0 }, limited: { x: 0, y: 0, z: 0 } };
}

/** Takes the wanted eye at `tMs`; the limited eye is then in `state.limited`. Times no later than the last are ignored. */
export function stepSpeedLimit(state: SpeedLimitState, wanted: Point3, tMs: number, greatestMmPerS: number): void {
  const { limited, wanted: last } = state;
  if (!state.started) {
    limited.x = wanted.x;
    limited.y = wanted.y;
    limited.z = wanted.z;
    state.started = true;
  } else {
    const dtMs = tMs - state.tMs;
    if (dtMs <= 0) return;
    const share = 1 - Math.exp(-dtMs / CATCH_UP_MS);
    const dx = wanted.x - last.x + share * (last.x - limited.x);
    const dy = wanted.y - last.y + share * (last.y - limited.y);
    const dz = wanted.z - last.z + share * (last.z - limited.z);
    const way = Math.hypot(dx, dy, dz);
    const allowed = (greatestMmPerS * dtMs) / 1000;
    const cut = way > allowed ? allowed / way : 1;
    limited.x += dx * cut;
    limited.y += dy * cut;
    limited.z += dz * cut;
  }
  last.x = wanted.x;
  last.y = wanted.y;
  last.z = wanted.z;
  state.tMs = tMs;
}
