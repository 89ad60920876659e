/** One figure that is searched: the coarse values, rising, all positive or zero; refinement stays between the first and the last. */
export interface Dimension {
  readonly coarse: readonly number[];
}

/** Tries around the best point, each at half the width (as a ratio) of the one before. */
const REFINEMENTS = 4;

/**
 * Deterministic search: the cost at every point of the coarse grid, in order, then from each wish's best point, one coordinate after the
 * other, a value between it and its neighbour on either side, halving the way each round. No randomness: the same question has the same
 * answer. `measure` is asked once for each point; every point asked about is returned, in order.
 * @param costs each is told what those before it found best.
 */
export function leastOverGrid<T>(
  dimensions: readonly Dimension[],
  measure: (point: readonly number[]) => T,
  costs: readonly ((value: T, bestBefore: readonly T[]) => number)[],
): { tried: { point: readonly number[]; value: T }[]; best: { point: readonly number[]; value: T }[] } {
  const tried = new Map<string, { point: readonly number[]; value: T }>();
  const at = (point: readonly number[]) => {
    const key = point.map((figure) => figure.toPrecision(6)).join(' ');
    const known = tried.get(key) ?? { point, value: measure(point) };
    tried.set(key, known);
    return known;
  };
  for (const point of gridOf(dimensions)) at(point);
  const best: { point: readonly number[]; value: T }[] = [];
  for (const costAfter of costs) {
    const before = best.map(({ value }) => value);
    const cost = (value: T) => costAfter(value, before);
    let least = [...tried.values()].reduce((a, b) =>
      cost(b.value) < cost(a.value) || Number.isNaN(cost(a.value)) ? b : a,
    );
    for (let round = 1; round <= REFINEMENTS; round++)
      dimensions.forEach((dimension, d) => {
        for (const figure of neighbours(dimension, least.point[d], 1 / 2 ** round)) {
          const other = at(least.point.map((own, i) => (i === d ? figure : own)));
          if (cost(other.value) < cost(least.value)) least = other;
        }
      });
    best.push(least);
  }
  return { tried: [...tried.values()], best };
}

function gridOf(dimensions: readonly Dimension[]): number[][] {
  return dimensions.reduce<number[][]>(
    (points, { coarse }) => points.flatMap((point) => coarse.map((figure) => [...point, figure])),
    [[]],
  );
}

/** The values a share of the way to the next coarse value below and above: by ratio, or straight where one of them is 0. */
function neighbours({ coarse }: Dimension, figure: number, share: number): number[] {
  const below = coarse.findLast((value) => value < figure * (1 - 1e-9));
  const above = coarse.find((value) => value > figure * (1 + 1e-9));
  return [below, above]
    .filter((value) => value !== undefined)
    .map((value) => (value > 0 && figure > 0 ? figure * (value / figure) ** share : figure + share * (value - figure)));
}
