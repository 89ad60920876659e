/** Pixels apart that are compared, and from one place to the next: the smear of a walker is longer, an eye is larger. */
const APART = 4;
const EVERY = 2;
/** The middle of the region, where the face is, as a share of its side. */
const FROM = 0.3;
const TO = 0.7;

/**
 * How much a picture changes along a direction against across it: the root of the ratio of mean squared differences of luma between
 * places four pixels apart. A smear leaves little along its own way.
 * @param pixels n x n pixels of red, green and blue.
 */
export function detailAlong(pixels: Float32Array, n: number, directionRad: number): number {
  const alongX = Math.round(APART * Math.cos(directionRad));
  const alongY = Math.round(APART * Math.sin(directionRad));
  const along = 3 * (alongY * n + alongX);
  const across = 3 * (alongX * n - alongY);
  let changeAlong = 0;
  let changeAcross = 0;
  for (let row = Math.ceil(FROM * n); row < TO * n; row += EVERY) {
    for (let column = Math.ceil(FROM * n); column < TO * n; column += EVERY) {
      const at = 3 * (row * n + column);
      const here = luma(pixels, at);
      changeAlong += (luma(pixels, at + along) - here) ** 2;
      changeAcross += (luma(pixels, at + across) - here) ** 2;
    }
  }
  return Math.sqrt(changeAlong / Math.max(changeAcross, Number.MIN_VALUE));
}

/** Weights of ITU-R BT.601-7. */
const luma = (pixels: Float32Array, at: number): number =>
  0.299 * pixels[at] + 0.587 * pixels[at + 1] + 0.114 * pixels[at + 2];
