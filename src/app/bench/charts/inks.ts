const names = [
  'ink',
  'pencil',
  'line',
  'hairline',
  'sheet',
  'brass-line',
  'near',
  'far',
  'middle',
  'clear',
  'not-clear',
] as const;

/** Our colours a canvas may draw with. */
export type Ink = (typeof names)[number];

/** The colours as they are by the present light: a canvas cannot read `light-dark()`, so an element is asked what it makes of each. */
export function inksOf(canvas: HTMLCanvasElement): Record<Ink, string> {
  const before = canvas.style.color;
  const styles = canvas.ownerDocument.defaultView!.getComputedStyle(canvas);
  const entries = names.map((name) => {
    canvas.style.color = `var(--${name})`;
    return [name, styles.color] as const;
  });
  canvas.style.color = before;
  return Object.fromEntries(entries) as Record<Ink, string>;
}
