/** A label that wants to stand at a place, and how much room it takes; px. */
export interface Label {
  readonly id: string;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/**
 * Places labels in the order given, each moved to the right past those it would cover, or else to the left. One that finds no
 * room between `left` and `right` is left out: the ledger names every layer.
 */
export function spreadLabels(labels: readonly Label[], left: number, right: number): Map<string, number> {
  const placed: Label[] = [];
  for (const label of labels) {
    const start = Math.max(Math.min(label.x, right - label.width), left);
    const x = firstRoom(placed, { ...label, x: start }, 1, left, right) ?? firstRoom(placed, { ...label, x: start }, -1, left, right);
    if (x !== null) placed.push({ ...label, x });
  }
  return new Map(placed.map(({ id, x }) => [id, x]));
}

function firstRoom(placed: readonly Label[], label: Label, way: 1 | -1, left: number, right: number): number | null {
  let { x } = label;
  for (;;) {
    if (x < left || x + label.width > right) return null;
    const covered = placed.find((other) => overlaps({ ...label, x }, other));
    if (!covered) return x;
    x = way > 0 ? covered.x + covered.width + SPACE_PX : covered.x - label.width - SPACE_PX;
  }
}

const SPACE_PX = 10;

const overlaps = (a: Label, b: Label) =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
