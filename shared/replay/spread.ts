/** The middle of some figures and what nineteen of twenty do not exceed; NaN of none. */
export interface Spread {
  readonly median: number;
  readonly p95: number;
}

/** By nearest rank: the figure at place ceil(p n) of the sorted ones. */
export function spreadOf(figures: ArrayLike<number>): Spread {
  const sorted = Float64Array.from(figures).sort();
  const at = (share: number) => (sorted.length ? sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)] : NaN);
  return { median: at(0.5), p95: at(0.95) };
}
