import type { TrackerTuning } from '../contracts/wall-set-up';
import type { Point3 } from '../projection/types';
import { NO_DRIFT } from '../smoothing/drift';
import { CALM_FOLLOWING, type FollowerSettings } from '../smoothing/follower-settings';

/** Where a replay begins: someone 1 m before the middle of the glass. It matters only until the first sample. */
const START: Point3 = { x: 0, y: 0, z: 1000 };

/** The follower as a wall with this tuning makes it, without the drift that comes when nobody is there. */
export function followerSettingsOf(tuning: TrackerTuning): FollowerSettings {
  const { filter, longestHorizonMs, appearMs, holdMs, returnMs, greatestMmPerS } = tuning;
  return {
    ...CALM_FOLLOWING,
    homeEye: START,
    drift: NO_DRIFT,
    filter,
    longestHorizonMs,
    appearMs,
    holdMs,
    returnMs,
    greatestMmPerS,
  };
}
