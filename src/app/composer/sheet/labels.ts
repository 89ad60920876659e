/** A label that wants to stand at a place, and how much room it takes; px. */
export interface Label {
  readonly id: string;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  /** How far left and right it may begin: beside what it names. */
  readonly least: number;
  readonly most: number;
}

/**
 * Places labels in the order given, each moved to the right past those it would cover, or else to the left. One that finds no
 * room beside what it names is left out: the ledger names every layer.
 */
export function spreadLabels(labels: readonly Label[]): Map<string, number> {
  const placed: Label[] = [];
  for (const label of labels) {
    const wanted = { ...label, x: Math.max(Math.min(label.x, label.most), label.least) };
    const x = firstRoom(placed, wanted, 1) ?? firstRoom(placed, wanted, -1);
    if (x !== null) placed.push({ ...label, x });
  }
  return new Map(placed.map(({ id, x }) => [id, x]));
}

function firstRoom(placed: readonly Label[], label: Label, way: 1 | -1): number | null {
  let { x } = label;
  for (;;) {
    if (x < label.least || x > label.most) return null;
    const covered = placed.find((other) => overlaps({ ...label, x }, other));
    if (!covered) return x;
    x = way > 0 ? covered.x + covered.width + SPACE_PX : covered.x - label.width - SPACE_PX;
  }
}

const SPACE_PX = 10;

const overlaps = (a: Label, b: Label) =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
