/*
 * Which of several people is followed. Each is measured by the rule: how near, how central, or for how long; smaller is better.
 * The one followed keeps the place until the same other person has been better by a margin, without a break, for `handOverMs`;
 * where the one followed is gone, the best of those who are there takes over at once. So two who are equally near never
 * alternate, and however they move, hand-overs between people who stay are at least `handOverMs` apart.
 */

/** How the choice is made; the same figures as a wall's settings. */
export interface ChoiceRule {
  /** The smallest distance; the smallest angle off the middle; the one who has been there longest. */
  readonly rule: 'nearest' | 'most-central' | 'longest';
  readonly handOverMs: number;
  /** By how large a share another must be better. */
  readonly handOverShare: number;
}

export const CALM_CHOICE: ChoiceRule = { rule: 'nearest', handOverMs: 1500, handOverShare: 0.2 };

/** Someone who is there. */
export interface Candidate {
  readonly id: number;
  /** The size of the face in the picture, px: the larger, the nearer. */
  readonly sizePx: number;
  /** From the middle of the picture, in any one unit: how far off the axis. */
  readonly offAxis: number;
  /** Since when, ms. */
  readonly sinceMs: number;
}

/** What is remembered from frame to frame; changed in place. */
export interface ViewerChoiceState {
  /** Who is followed; null while nobody is. */
  chosen: number | null;
  /** Who has been better, and since when. */
  challenger: number | null;
  challengedMs: number;
}

export const createViewerChoice = (): ViewerChoiceState => ({ chosen: null, challenger: null, challengedMs: 0 });

/**
 * Whom to follow at `tMs` (not before the last): written into `state` and returned; null where nobody is there. Allocates nothing.
 * @param people in any order, ids their own for as long as they are there.
 */
export function chooseViewer(
  state: ViewerChoiceState,
  people: readonly Candidate[],
  tMs: number,
  rule: ChoiceRule,
): number | null {
  let chosen: Candidate | null = null;
  let best: Candidate | null = null;
  for (const one of people) {
    if (one.id === state.chosen) chosen = one;
    if (!best || costOf(one, rule, tMs) < costOf(best, rule, tMs)) best = one;
  }
  if (!best || !chosen) return follow(state, best && best.id);
  if (best === chosen || !isClearlyBetter(best, chosen, rule, tMs)) {
    state.challenger = null;
    return state.chosen;
  }
  if (state.challenger !== best.id) {
    state.challenger = best.id;
    state.challengedMs = tMs;
  }
  return tMs - state.challengedMs >= rule.handOverMs ? follow(state, best.id) : state.chosen;
}

function follow(state: ViewerChoiceState, id: number | null): number | null {
  state.chosen = id;
  state.challenger = null;
  return id;
}

/** Smaller is better: one over the size goes with the distance; a stay counts from its beginning. */
function costOf({ sizePx, offAxis, sinceMs }: Candidate, { rule }: ChoiceRule, tMs: number): number {
  if (rule === 'nearest') return 1 / sizePx;
  return rule === 'most-central' ? Math.abs(offAxis) : 1 / (1 + Math.max(0, tMs - sinceMs));
}

const isClearlyBetter = (one: Candidate, other: Candidate, rule: ChoiceRule, tMs: number): boolean =>
  costOf(one, rule, tMs) < costOf(other, rule, tMs) * (1 - rule.handOverShare);
