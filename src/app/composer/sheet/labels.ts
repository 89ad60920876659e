/** A label that wants to stand at a place, and how much room it takes; px. */
export interface Label {
  readonly id: string;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Places labels in the order given, each moved to the right past those it would cover, as far as `right`. */
export function spreadLabels(labels: readonly Label[], right: number): Map<string, number> {
  const placed: Label[] = [];
  for (const label of labels) {
    let x = label.x;
    for (;;) {
      const covered = placed.find((other) => overlaps({ ...label, x }, other));
      if (!covered) break;
      x = covered.x + covered.width + 10;
    }
    placed.push({ ...label, x: x + label.width <= right ? x : Math.min(label.x, right - label.width) });
  }
  return new Map(placed.map(({ id, x }) => [id, x]));
}

const overlaps = (a: Label, b: Label) =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
