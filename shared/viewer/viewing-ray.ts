/*
 * The least turn that carries the camera's axis onto a viewing ray. A face off the axis looks as it would to a camera turned
 * toward it; its true turn is that turn after the apparent one. For a unit ray d, with z = (0, 0, 1) and n = z x d,
 * R = cos I + [n] + n n^T/(1 + cos) (O. Rodrigues), cos = d_z.
 */

/** Writes Rodrigues' turn onto the ray (x, y, 1), made unit, times `apparent`, into `out`: nine numbers by rows each. */
export function turnedByRay(x: number, y: number, apparent: Float64Array, out: Float64Array): void {
  const length = Math.sqrt(x * x + y * y + 1);
  const dx = x / length;
  const dy = y / length;
  const cos = 1 / length;
  const k = 1 / (1 + cos);
  for (let j = 0; j < 3; j++) {
    const a = apparent[j];
    const b = apparent[3 + j];
    const c = apparent[6 + j];
    out[j] = (cos + dy * dy * k) * a - dx * dy * k * b + dx * c;
    out[3 + j] = -dx * dy * k * a + (cos + dx * dx * k) * b + dy * c;
    out[6 + j] = -dx * a - dy * b + cos * c;
  }
}
