import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';

/** One setting in words: what it is, and how it stands. */
interface Setting {
  readonly name: string;
  readonly words: (tuning: TrackerTuning) => string;
}

const rules = { nearest: 'the nearest', 'most-central': 'the most central', longest: 'the longest there' } as const;

const filterIn = (direction: 'across' | 'along', name: string): Setting[] => [
  { name: `Cutoff at rest, ${name}`, words: ({ filter }) => `${filter[direction].minCutoffHz} Hz` },
  { name: `Opens with speed (beta), ${name}`, words: ({ filter }) => String(filter[direction].beta) },
  { name: `Cutoff of the speed, ${name}`, words: ({ filter }) => `${filter[direction].derivativeCutoffHz} Hz` },
];

/** Every setting of a tuning, in the order in which a tuner thinks of them. */
const settings: readonly Setting[] = [
  ...filterIn('across', 'side to side'),
  ...filterIn('along', 'nearer and farther'),
  { name: 'Looks ahead at most', words: ({ longestHorizonMs }) => `${longestHorizonMs} ms` },
  { name: 'Delay of screen and camera', words: ({ displayDelayMs }) => `${displayDelayMs} ms` },
  { name: 'Eases in over', words: ({ appearMs }) => `${appearMs} ms` },
  { name: 'Holds on to somebody lost for', words: ({ holdMs }) => `${holdMs} ms` },
  { name: 'Goes back over', words: ({ returnMs }) => `${returnMs} ms` },
  { name: 'Fastest', words: ({ greatestMmPerS }) => `${greatestMmPerS} mm/s` },
  { name: 'Whom it follows', words: ({ choice }) => rules[choice.rule] },
  { name: 'Hands over after', words: ({ choice }) => `${choice.handOverMs} ms, to somebody clearer by ${Math.round(100 * choice.handOverShare)} %` },
  { name: 'Between the eyes', words: ({ ipdMm }) => `${ipdMm.value} mm ± ${ipdMm.uncertainty}` },
  { name: 'Factor of distance', words: ({ scaleFactor }) => String(scaleFactor) },
];

/** A setting that differs between two tunings. */
export interface TuningDifference {
  readonly name: string;
  readonly before: string;
  readonly after: string;
}

export const tuningDifferences = (before: TrackerTuning, after: TrackerTuning): TuningDifference[] =>
  settings
    .map(({ name, words }) => ({ name, before: words(before), after: words(after) }))
    .filter((setting) => setting.before !== setting.after);
