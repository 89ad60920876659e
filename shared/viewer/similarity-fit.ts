import { GeometryError } from '../projection/geometry-error';
import { LANDMARK_COUNT } from './canonical-face';
import type { FaceModel } from './face-model';
import { largestEigenvector } from './largest-eigenvector';

/*
 * The similarity that carries the face model onto the landmarks with least weighted squares: B. K. P. Horn, Closed-form
 * Solution of Absolute Orientation Using Unit Quaternions, JOSA A 4(4), 1987. With c' and q' taken from their means,
 *
 *     S = sum w c' q'^T;  R from the eigenvector of Horn's 4 x 4 matrix of S;  s = sum w (R c') . q' / sum w |c'|^2.
 */
export interface SimilarityFit {
  /** Nine numbers by rows: the head's turn against one that squarely faces the camera, in the picture's directions. */
  readonly rotation: Float64Array;
  /** Pixels for each eye distance, at the depth of the face's middle. */
  scalePx: number;
  /** Weighted mean of the landmarks, px. */
  readonly mean: Float64Array;
  /** Root of the weighted mean squared residual, px: how unlike the model the landmarks are. */
  residualPx: number;
  readonly scratch: {
    readonly cross: Float64Array;
    readonly horn: Float64Array;
    readonly vectors: Float64Array;
    readonly quaternion: Float64Array;
  };
}

export function createSimilarityFit(): SimilarityFit {
  return {
    rotation: new Float64Array([1, 0, 0, 0, 1, 0, 0, 0, 1]),
    scalePx: 0,
    mean: new Float64Array(3),
    residualPx: 0,
    scratch: {
      cross: new Float64Array(9),
      horn: new Float64Array(16),
      vectors: new Float64Array(16),
      quaternion: new Float64Array(4),
    },
  };
}

/**
 * Fits the model to landmarks: x, y, z of each in frame pixels, z growing away from the camera. Writes into `fit` and
 * allocates nothing.
 * @throws GeometryError 'landmarks' where there are too few, they are not finite or they fall on one point.
 */
export function similarityFit(model: FaceModel, landmarks: ArrayLike<number>, fit: SimilarityFit): void {
  if (landmarks.length < 3 * LANDMARK_COUNT) {
    throw new GeometryError(
      'landmarks',
      `A face has ${LANDMARK_COUNT} landmarks of three numbers; got ${landmarks.length} numbers.`,
    );
  }
  const squares = correlate(model, landmarks, fit);
  if (!(squares > LEAST_SPREAD_PX2 * model.total && squares < Infinity)) {
    throw new GeometryError(
      'landmarks',
      'The landmarks are not finite or all lie on one point: look for the face again.',
    );
  }
  const { cross, horn, vectors, quaternion } = fit.scratch;
  hornMatrix(cross, horn);
  largestEigenvector(horn, vectors, quaternion);
  rotationOf(quaternion, fit.rotation);
  let along = 0;
  // sum (R c') . q' is the trace of R S, S being by rows c', by columns q'.
  for (let i = 0; i < 3; i++) for (let j = 0; j < 3; j++) along += fit.rotation[3 * i + j] * cross[3 * j + i];
  fit.scalePx = along / model.spread;
  fit.residualPx = Math.sqrt(Math.max(0, squares - (along * along) / model.spread) / model.total);
}

/** A face no wider than a thousandth of a pixel is none, px squared. */
const LEAST_SPREAD_PX2 = 1e-6;

/** Writes the mean of the landmarks and S; returns the weighted sum of |q'|^2. */
function correlate(
  { points, weights, total, mean }: FaceModel,
  landmarks: ArrayLike<number>,
  fit: SimilarityFit,
): number {
  const { cross } = fit.scratch;
  const q = fit.mean;
  q.fill(0);
  for (let i = 0; i < LANDMARK_COUNT; i++) {
    for (let j = 0; j < 3; j++) q[j] += weights[i] * landmarks[3 * i + j];
  }
  for (let j = 0; j < 3; j++) q[j] /= total;
  cross.fill(0);
  let squares = 0;
  for (let i = 0; i < LANDMARK_COUNT; i++) {
    for (let k = 0; k < 3; k++) {
      const from = landmarks[3 * i + k] - q[k];
      squares += weights[i] * from * from;
      for (let j = 0; j < 3; j++) cross[3 * j + k] += weights[i] * (points[3 * i + j] - mean[j]) * from;
    }
  }
  return squares;
}

/** Places of S_xx, S_xy and so on in S by rows. */
const [XX, XY, XZ, YX, YY, YZ, ZX, ZY, ZZ] = [0, 1, 2, 3, 4, 5, 6, 7, 8];

/** Horn's symmetric matrix of S, whose foremost eigenvector is the quaternion (w, x, y, z). */
function hornMatrix(s: Float64Array, n: Float64Array): void {
  n[0] = s[XX] + s[YY] + s[ZZ];
  n[1] = n[4] = s[YZ] - s[ZY];
  n[2] = n[8] = s[ZX] - s[XZ];
  n[3] = n[12] = s[XY] - s[YX];
  n[5] = s[XX] - s[YY] - s[ZZ];
  n[6] = n[9] = s[XY] + s[YX];
  n[7] = n[13] = s[ZX] + s[XZ];
  n[10] = s[YY] - s[XX] - s[ZZ];
  n[11] = n[14] = s[YZ] + s[ZY];
  n[15] = s[ZZ] - s[XX] - s[YY];
}

function rotationOf(q: Float64Array, r: Float64Array): void {
  const w = q[0];
  const x = q[1];
  const y = q[2];
  const z = q[3];
  r[0] = w * w + x * x - y * y - z * z;
  r[1] = 2 * (x * y - w * z);
  r[2] = 2 * (x * z + w * y);
  r[3] = 2 * (x * y + w * z);
  r[4] = w * w - x * x + y * y - z * z;
  r[5] = 2 * (y * z - w * x);
  r[6] = 2 * (x * z - w * y);
  r[7] = 2 * (y * z + w * x);
  r[8] = w * w - x * x - y * y + z * z;
}
