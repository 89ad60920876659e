import type { FollowingTuning, TrackerTuning, WallSetUp } from '@oriel/shared/contracts/wall-set-up';

const followingOf = ({ filter, displayDelayMs, longestHorizonMs }: TrackerTuning): FollowingTuning => ({
  filter,
  displayDelayMs,
  longestHorizonMs,
});

/** A set-up with its tuning changed; where that changes how it follows, how it followed until now is kept as the way back. */
export function tuned(setUp: WallSetUp, change: (tuning: TrackerTuning) => TrackerTuning): WallSetUp {
  const tuning = change(setUp.tuning);
  const before = followingOf(setUp.tuning);
  const same = JSON.stringify(before) === JSON.stringify(followingOf(tuning));
  return { ...setUp, tuning, followingBefore: same ? setUp.followingBefore : before };
}

/** A set-up that follows as it did before; whatever else was changed since stays. */
export const goneBack = (setUp: WallSetUp): WallSetUp => ({
  ...setUp,
  tuning: { ...setUp.tuning, ...setUp.followingBefore },
  followingBefore: null,
});
