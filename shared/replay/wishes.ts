import type { Direction } from './sample';

export const wishes = ['calmer', 'balanced', 'quicker'] as const;
export type Wish = (typeof wishes)[number];

/** What following comes to with some settings: jitter at rest, mm, and how far it strays in motion, as ms of the viewer's way. */
export interface Figures {
  readonly jitterMm: number;
  readonly strayMs: number;
}

/*
 * A wish weighs the two by what is noticed. Straying: about 20 ms (19 ms of lag before a desktop display, secondary source; 15 ms
 * head-worn, K. Mania and others 2004, read). Jitter: 1 mm of the eye across moves a layer 100 mm behind the glass, seen from 600 mm, by
 * 100/700 = 0.14 mm, under one minute of arc (0.175 mm there); along, 6 mm of someone 100 mm off the middle do the same
 * (100 * 100 / 700^2 = 0.0204 mm a mm: 0.12 mm). Calmer forgives two and a half times the straying, quicker two and a half times the jitter.
 */
const NOTICED_STRAY_MS = 20;
const NOTICED_JITTER_MM: Readonly<Record<Direction, number>> = { across: 1, along: 6 };
const FORGIVEN = 2.5;

/** (jitter / j0)^2 + (stray / l0)^2: less is better. */
export function costOf({ jitterMm, strayMs }: Figures, wish: Wish, direction: Direction): number {
  const jitter = jitterMm / (NOTICED_JITTER_MM[direction] * (wish === 'quicker' ? FORGIVEN : 1));
  const stray = strayMs / (NOTICED_STRAY_MS * (wish === 'calmer' ? FORGIVEN : 1));
  return jitter * jitter + stray * stray;
}

/** Those that no other beats in both figures (V. Pareto), from the calmest to the quickest. */
export function unbeaten<T extends Figures>(all: readonly T[]): T[] {
  const byJitter = all
    .filter(({ jitterMm, strayMs }) => jitterMm >= 0 && strayMs >= 0)
    .sort((a, b) => a.jitterMm - b.jitterMm || a.strayMs - b.strayMs);
  let least = Infinity;
  return byJitter.filter(({ strayMs }) => strayMs < least && ((least = strayMs), true));
}
