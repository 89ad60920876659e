import { LANDMARK_COUNT } from './canonical-face';
import type { FaceModel } from './face-model';
import type { SimilarityFit } from './similarity-fit';

/**
 * How much wider than high the landmarks are against the face model, each in the head's own directions:
 *
 *     (sum w c_x h_x / sum w c_x^2) / (sum w c_y h_y / sum w c_y^2),  h = R^T q',
 *
 * with c' and q' taken from their means, as in similarity-fit.ts. Allocates nothing.
 * @param fit the fit of these landmarks.
 */
export function faceWidening(
  { points, weights, mean }: FaceModel,
  landmarks: ArrayLike<number>,
  { rotation: r, mean: q }: SimilarityFit,
): number {
  let wide = 0;
  let wideModel = 0;
  let high = 0;
  let highModel = 0;
  for (let i = 0; i < LANDMARK_COUNT; i++) {
    const x = landmarks[3 * i] - q[0];
    const y = landmarks[3 * i + 1] - q[1];
    const z = landmarks[3 * i + 2] - q[2];
    const across = points[3 * i] - mean[0];
    const down = points[3 * i + 1] - mean[1];
    wide += weights[i] * across * (r[0] * x + r[3] * y + r[6] * z);
    wideModel += weights[i] * across * across;
    high += weights[i] * down * (r[1] * x + r[4] * y + r[7] * z);
    highModel += weights[i] * down * down;
  }
  return wide / wideModel / (high / highModel);
}
