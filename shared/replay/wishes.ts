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
 * two by what is noticed, with four fifths of quicker's jitter at most; calmer strays least with three fifths of balanced's. Where not
 * even the calmest there is reaches that, half and nine tenths of the way to it will do. Where the calmest is calmer by less than a tenth,
 * nobody would see it: nothing is asked then, for it could cost any lag. (The shares are practice: a difference that is seen.)
 */
const NOTICED_STRAY_MS = 20;
const NOTICED_JITTER_MM: Readonly<Record<Direction, number>> = { across: 1, along: 6 };
const BALANCED = { share: 0.8, wayToCalmest: 0.5 };
const CALMER = { share: 0.6, wayToCalmest: 0.9 };
const HARDLY = 0.1;
const SEEN_SHARE = 0.1;
/** What is missing of the jitter to be reached outweighs whatever straying can bring. */
const MUST = 1e6;

/** The most jitter of a balanced setting after the quicker one, and of a calmer one after the balanced; `calmestMm` is the least there is. */
export const mostJitterMm = (wish: 'balanced' | 'calmer', before: Figures, calmestMm: number): number => {
  if (calmestMm > (1 - SEEN_SHARE) * before.jitterMm) return Infinity;
  const { share, wayToCalmest } = wish === 'balanced' ? BALANCED : CALMER;
  return Math.max(share * before.jitterMm, before.jitterMm - wayToCalmest * (before.jitterMm - calmestMm));
};

/** Costs, less is better, in the order in which the settings are to be found: each is told what those before it found. */
export const costsIn = (direction: Direction) => {
  const jitter = ({ jitterMm }: Figures) => jitterMm / NOTICED_JITTER_MM[direction];
  const stray = ({ strayMs }: Figures) => strayMs / NOTICED_STRAY_MS;
  const missing = (wish: 'balanced' | 'calmer', figures: Figures, before: Figures, calmest: Figures) =>
    MUST * Math.max(0, figures.jitterMm / mostJitterMm(wish, before, calmest.jitterMm) - 1);
  return {
    calmest: (figures: Figures) => figures.jitterMm,
    quicker: (figures: Figures) => stray(figures) + HARDLY * jitter(figures),
    balanced: (figures: Figures, [calmest, quicker]: readonly Figures[]) =>
      missing('balanced', figures, quicker, calmest) + jitter(figures) ** 2 + stray(figures) ** 2,
    calmer: (figures: Figures, [calmest, , balanced]: readonly Figures[]) =>
      missing('calmer', figures, balanced, calmest) + stray(figures),
  };
};

/** Those that no other beats in both figures (V. Pareto), from the calmest to the quickest. */
export function unbeaten<T extends Figures>(all: readonly T[]): T[] {
  const byJitter = all
    .filter(({ jitterMm, strayMs }) => jitterMm >= 0 && strayMs >= 0)
    .sort((a, b) => a.jitterMm - b.jitterMm || a.strayMs - b.strayMs);
  let least = Infinity;
  return byJitter.filter(({ strayMs }) => strayMs < least && ((least = strayMs), true));
}
