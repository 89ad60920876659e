import { describe, expect, it } from 'vitest';
import { createFaceModel } from './face-model';
import { faceWidening } from './face-widening';
import { createSimilarityFit, similarityFit } from './similarity-fit';
import { rotationOf } from './testing/posed-head';

const model = createFaceModel();

/** The model drawn `wide` times as wide, then turned: what is measured must be just that (the definition, worked out by hand). */
function wideningOf(wide: number, pose: { yaw: number; pitch: number; roll: number }): number {
  const r = rotationOf(pose);
  const landmarks = Float64Array.from({ length: model.points.length }, (_, at) => {
    const i = at - (at % 3);
    const row = 3 * (at % 3);
    return 300 + 40 * (r[row] * wide * model.points[i] + r[row + 1] * model.points[i + 1] + r[row + 2] * model.points[i + 2]);
  });
  const fit = createSimilarityFit();
  similarityFit(model, landmarks, fit);
  return faceWidening(model, landmarks, fit);
}

describe('faceWidening', () => {
  it.each([1, 1.1, 1.3])('is what the face was widened by: %d', (wide) => {
    expect(wideningOf(wide, { yaw: 0, pitch: 0, roll: 0 })).toBeCloseTo(wide, 9);
  });

  it('does not depend on how the head is turned', () => {
    for (const pose of [
      { yaw: 0.5, pitch: 0.1, roll: 0 },
      { yaw: -0.2, pitch: -0.3, roll: 0.4 },
    ])
      expect(wideningOf(1.2, pose)).toBeCloseTo(1.2, 6);
  });
});
