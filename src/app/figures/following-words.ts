import type { FollowingTuning } from '@oriel/shared/contracts/wall-set-up';

/** How a wall follows, in one line of figures. */
export function followingWords({ filter: { across, along }, longestHorizonMs, displayDelayMs }: FollowingTuning): string {
  const delay = displayDelayMs > 0 ? `, with ${displayDelayMs} ms for screen and camera` : '';
  return `At rest it smooths at ${across.minCutoffHz} Hz from side to side and ${along.minCutoffHz} Hz nearer and farther; it looks ahead ${longestHorizonMs} ms at most${delay}.`;
}
