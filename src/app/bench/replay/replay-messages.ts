import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import type { Direction, ReplaySample } from '@oriel/shared/replay/sample';
import type { SearchResult, TriedTuning } from '@oriel/shared/replay/search-tuning';

/** What the page and the replay worker say to each other. */
export interface ReplayAsked {
  /** The search through all settings; or today's alone, where the wall was changed since. */
  readonly what: 'search' | 'today';
  readonly samples: readonly ReplaySample[];
  /** What the wall is tuned to. */
  readonly today: TrackerTuning;
}

/** The search of one direction; where the run has too little of it, `refusal` says what to record. */
export type Searched = { readonly found: SearchResult } | { readonly direction: Direction; readonly refusal: string };

/** What a setting would have done in each direction; null where the run has too little of it. */
export type TriedBoth = Readonly<Record<Direction, TriedTuning | null>>;

export type FromReplay =
  | { readonly type: 'progress'; readonly share: number }
  | { readonly type: 'done'; readonly across: Searched; readonly along: Searched }
  | { readonly type: 'today'; readonly tried: TriedBoth }
  | { readonly type: 'failed' };
