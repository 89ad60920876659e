import type { Glass } from '@oriel/shared/projection/types';

/** Near is warm, far is cool: tokens of the theme and where on the scale they stand, in longer sides of the glass. */
const STOPS = [
  { at: -0.05, token: '--near' },
  { at: 0.35, token: '--middle' },
  { at: 0.75, token: '--far' },
  { at: 1.25, token: '--farthest' },
] as const;

/** The colour of a depth as CSS, mixed between the two nearest tokens so that it follows day and evening. */
export function depthColour(depthMm: number, glass: Glass): string {
  const at = depthMm / Math.max(glass.widthMm, glass.heightMm);
  const next = STOPS.findIndex((stop) => at <= stop.at);
  if (next === 0) return `var(${STOPS[0].token})`;
  if (next < 0) return `var(${STOPS[STOPS.length - 1].token})`;
  const [nearer, farther] = [STOPS[next - 1], STOPS[next]];
  const share = ((at - nearer.at) / (farther.at - nearer.at)) * 100;
  return `color-mix(in oklab, var(${farther.token}) ${share.toFixed(1)}%, var(${nearer.token}))`;
}
