import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';

/** A tuning with what one change changed put back, and whatever else was changed since left as it is. */
export function takenBack(now: TrackerTuning, before: TrackerTuning, after: TrackerTuning): TrackerTuning {
  const changed = (Object.keys(before) as (keyof TrackerTuning)[]).filter(
    (key) => JSON.stringify(before[key]) !== JSON.stringify(after[key]),
  );
  return { ...now, ...Object.fromEntries(changed.map((key) => [key, before[key]])) };
}
