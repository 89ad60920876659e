export const mean = (values: readonly number[]): number =>
  values.reduce((sum, value) => sum + value, 0) / values.length;

function squaredDeviations(values: readonly number[]): number[] {
  const centre = mean(values);
  return values.map((value) => (value - centre) ** 2);
}

/** Standard deviation in percent of the mean. */
export const scatterPct = (values: readonly number[]): number =>
  (100 * Math.sqrt(mean(squaredDeviations(values)))) / mean(values);

/** Standard deviation about the mean of each group, over all groups together. */
export const deviationWithin = (groups: readonly (readonly number[])[]): number =>
  Math.sqrt(mean(groups.flatMap(squaredDeviations)));

/** The value below which this share of the values lies, by nearest rank. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.max(0, Math.ceil(share * sorted.length) - 1))];
}

/** To a thousandth, as printed. */
export const rounded = (value: number): number => Math.round(value * 1000) / 1000;
