/*
 * The eigenvector of the largest eigenvalue of a symmetric 4 x 4 matrix, by Jacobi's cyclic rotations (G. Golub, C. Van
 * Loan, Matrix Computations, 8.5): sure to converge, quadratically at the end, and accurate for the nearly equal eigenvalues
 * that power iteration stalls on. Works in place on the given arrays and allocates nothing.
 */
const SWEEPS = 12;
const NEGLIGIBLE = 1e-30;

/**
 * @param matrix 16 numbers by rows; destroyed.
 * @param vectors 16 numbers of scratch.
 * @param out receives the unit eigenvector, four numbers.
 */
export function largestEigenvector(matrix: Float64Array, vectors: Float64Array, out: Float64Array): void {
  for (let i = 0; i < 16; i++) vectors[i] = i % 5 === 0 ? 1 : 0;
  for (let sweep = 0; sweep < SWEEPS; sweep++) {
    let off = 0;
    let all = 0;
    for (let i = 0; i < 16; i++) {
      all += matrix[i] * matrix[i];
      if (i % 5 !== 0) off += matrix[i] * matrix[i];
    }
    if (off <= NEGLIGIBLE * all) break;
    for (let p = 0; p < 3; p++) for (let q = p + 1; q < 4; q++) rotate(matrix, vectors, p, q);
  }
  let best = 0;
  for (let i = 1; i < 4; i++) if (matrix[5 * i] > matrix[5 * best]) best = i;
  for (let i = 0; i < 4; i++) out[i] = vectors[4 * i + best];
}

/** One rotation in the plane of p and q that brings the entry (p, q) to zero. */
function rotate(a: Float64Array, v: Float64Array, p: number, q: number): void {
  const apq = a[4 * p + q];
  if (apq === 0) return;
  const theta = (a[5 * q] - a[5 * p]) / (2 * apq);
  const t = (theta < 0 ? -1 : 1) / (Math.abs(theta) + Math.sqrt(theta * theta + 1));
  const c = 1 / Math.sqrt(t * t + 1);
  const s = t * c;
  for (let k = 0; k < 4; k++) {
    const akp = a[4 * k + p];
    const akq = a[4 * k + q];
    a[4 * k + p] = c * akp - s * akq;
    a[4 * k + q] = s * akp + c * akq;
  }
  for (let k = 0; k < 4; k++) {
    const apk = a[4 * p + k];
    const aqk = a[4 * q + k];
    a[4 * p + k] = c * apk - s * aqk;
    a[4 * q + k] = s * apk + c * aqk;
    const vkp = v[4 * k + p];
    const vkq = v[4 * k + q];
    v[4 * k + p] = c * vkp - s * vkq;
    v[4 * k + q] = s * vkp + c * vkq;
  }
}
