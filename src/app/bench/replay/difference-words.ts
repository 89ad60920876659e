import type { Figures } from '@oriel/shared/replay/wishes';

/** Less than so much is not told apart: a share of the jitter, and ms. */
const ALIKE_SHARE = 0.05;
const ALIKE_MS = 1.5;

/** What a setting brings against today's, for somebody who has never seen either figure. */
export function differenceWords(today: Figures, other: Figures): string {
  const share = other.jitterMm / today.jitterMm - 1;
  const ms = other.strayMs - today.strayMs;
  const percent = Math.abs(Math.round(100 * share));
  const trembles = Math.abs(share) < ALIKE_SHARE ? 'trembles as today' : `trembles ${percent} % ${share < 0 ? 'less' : 'more'} than today`;
  const strays = Math.abs(ms) < ALIKE_MS ? 'keeps up as well' : `keeps up ${Math.abs(Math.round(ms))} ms ${ms < 0 ? 'better' : 'less well'}`;
  return `${trembles}, and ${strays}`;
}
