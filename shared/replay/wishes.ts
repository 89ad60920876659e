import type { Direction } from './sample';

export const wishes = ['calmer', 'balanced', 'quicker'] as const;
export type Wish = (typeof wishes)[number];

/** What following comes to with some settings: jitter at rest, mm, and how far it strays in motion, as ms of the viewer's way. */
export interface Figures {
  readonly jitterMm: number;
  readonly strayMs: number;
}

/*
 * What is noticed. Straying: about 20 ms (19 ms of lag before a desktop display, secondary source; 15 ms
 * head-worn, K. Mania and others 2004, read). Jitter: 1 mm of the eye across moves a layer 100 mm behind the glass, seen from 600 mm, by
 * 100/700 = 0.14 mm, under one minute of arc (0.175 mm there); along, 6 mm of someone 100 mm off the middle do the same
 * (100 * 100 / 700^2 = 0.0204 mm a mm: 0.12 mm).
 *
 * So that the three are seen to differ, they follow from one another. Quicker strays least, and hardly minds jitter. Balanced weighs the
 * two by what is noticed, with four fifths of quicker's jitter at most; calmer strays least with three fifths of balanced's. Where
 * nothing reaches that, whatever comes nearest. (The shares are practice: a difference that is seen.)
 */
const NOTICED_STRAY_MS = 20;
const NOTICED_JITTER_MM: Readonly<Record<Direction, number>> = { across: 1, along: 6 };
export const BALANCED_JITTER = 0.8;
export const CALMER_JITTER = 0.6;
const HARDLY = 0.1;
/** What is missing of the share to be reached outweighs whatever the other figure can bring. */
const MUST = 1e6;

/** What a setting costs by a wish, given what the one before it comes to (quicker for balanced, balanced for calmer): less is better. */
export function costOf({ jitterMm, strayMs }: Figures, wish: Wish, direction: Direction, before: Figures): number {
  const jitter = jitterMm / NOTICED_JITTER_MM[direction];
  const stray = strayMs / NOTICED_STRAY_MS;
  const missing = (share: number) => MUST * Math.max(0, jitterMm / before.jitterMm - share);
  if (wish === 'quicker') return stray + HARDLY * jitter;
  return wish === 'balanced' ? missing(BALANCED_JITTER) + jitter * jitter + stray * stray : missing(CALMER_JITTER) + stray;
}

/** Those that no other beats in both figures (V. Pareto), from the calmest to the quickest. */
export function unbeaten<T extends Figures>(all: readonly T[]): T[] {
  const byJitter = all
    .filter(({ jitterMm, strayMs }) => jitterMm >= 0 && strayMs >= 0)
    .sort((a, b) => a.jitterMm - b.jitterMm || a.strayMs - b.strayMs);
  let least = Infinity;
  return byJitter.filter(({ strayMs }) => strayMs < least && ((least = strayMs), true));
}
