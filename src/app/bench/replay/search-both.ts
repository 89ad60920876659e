import { searchTuning, TooLittleMotion, triedAtLeast, tryTuning } from '@oriel/shared/replay/search-tuning';
import type { Direction } from '@oriel/shared/replay/sample';
import type { FromReplay, ReplayAsked, Searched, TriedBoth } from './replay-messages';

/** Refinement tries about so many more than the grid. */
const REFINED = 60;

/** Searches both directions and tells how far it has come, in whole percent. */
export function searchBoth({ samples, today }: Pick<ReplayAsked, 'samples' | 'today'>, say: (message: FromReplay) => void): void {
  const all = triedAtLeast('across') + triedAtLeast('along') + 2 * REFINED;
  let before = 0;
  let shown = 0;
  const search = (direction: Direction): Searched => {
    try {
      return {
        found: searchTuning(samples, today, direction, (tried) => {
          const share = Math.min(0.99, Math.floor((100 * (before + tried)) / all) / 100);
          if (share > shown) say({ type: 'progress', share: (shown = share) });
        }),
      };
    } catch (cause) {
      if (cause instanceof TooLittleMotion) return { direction, refusal: cause.message };
      throw cause;
    }
  };
  const across = search('across');
  before = triedAtLeast('across') + REFINED;
  say({ type: 'done', across, along: search('along') });
}

/** Tries today's setting alone, in both directions. */
export function tryBoth({ samples, today }: Pick<ReplayAsked, 'samples' | 'today'>): TriedBoth {
  const tried = (direction: Direction) => {
    try {
      return tryTuning(samples, today, direction);
    } catch (cause) {
      if (cause instanceof TooLittleMotion) return null;
      throw cause;
    }
  };
  return { across: tried('across'), along: tried('along') };
}
