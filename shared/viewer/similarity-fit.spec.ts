import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure } from '../projection/testing/arbitraries';
import { createFaceModel, jawWeights } from './face-model';
import { headAngles } from './head-angles';
import { createSimilarityFit, similarityFit } from './similarity-fit';
import { posedPoints, rotationOf } from './testing/posed-head';

const MODEL = createFaceModel();
const anyPose = fc.record({
  yaw: figure(-1.2, 1.2),
  pitch: figure(-0.8, 0.8),
  roll: figure(-3, 3),
  x: figure(-500, 500),
  y: figure(-500, 500),
  z: figure(-500, 500),
});

describe('the face model', () => {
  it('has its origin midway between eye centres one unit apart, in the picture’s directions', () => {
    const centre = (axis: number, a: number, b: number) =>
      (MODEL.points[3 * a + axis] + MODEL.points[3 * b + axis]) / 2;
    expect(centre(0, 33, 133)).toBeCloseTo(-0.5, 12);
    expect(centre(0, 263, 362)).toBeCloseTo(0.5, 12);
    expect(centre(1, 33, 133) + centre(1, 263, 362)).toBeCloseTo(0, 12);
    expect(MODEL.points[3 * 152 + 1]).toBeGreaterThan(1.5); // the chin is down, y grows downward
    expect(MODEL.points[3 * 4 + 2]).toBeLessThan(-0.3); // the nose is nearer, z grows away
  });

  it('trusts the jaw less than the brow', () => {
    const weights = jawWeights();
    expect([weights[10], weights[4], weights[133]]).toEqual([1, 1, 1]);
    expect(weights[152]).toBeCloseTo(0.3, 12);
    expect(weights[17]).toBeCloseTo(0.3, 12); // the lower lip
  });

  it('names weights that do not match', () => {
    expect(() => createFaceModel(new Float64Array(3))).toThrowError(expect.objectContaining({ value: 'weights' }));
  });
});

describe('similarityFit', () => {
  it('finds any turn, scale and place exactly, with nothing left over', () => {
    fc.assert(
      fc.property(anyPose, figure(10, 300), (pose, scale) => {
        const fit = createSimilarityFit();
        similarityFit(MODEL, posedPoints(MODEL, pose, scale).flat(), fit);
        rotationOf(pose).forEach((entry, i) => expect(fit.rotation[i]).toBeCloseTo(entry, 9));
        expect(fit.scalePx).toBeCloseTo(scale, 7);
        expect(fit.residualPx).toBeLessThan(1e-4);
        const angles = { yawRad: 0, pitchRad: 0, rollRad: 0 };
        headAngles(fit.rotation, angles);
        expect(angles.yawRad).toBeCloseTo(pose.yaw, 7);
        expect(angles.pitchRad).toBeCloseTo(pose.pitch, 7);
        expect(angles.rollRad).toBeCloseTo(pose.roll, 7);
      }),
    );
  });

  it('is the least-squares one: no nearby turn or scale leaves less', () => {
    const pose = { yaw: 0.3, pitch: -0.1, roll: 0.2, x: 0, y: 0, z: 0 };
    const landmarks = posedPoints(MODEL, pose, 60)
      .flat()
      .map((entry, i) => entry + 3 * Math.sin(i * i));
    const fit = createSimilarityFit();
    similarityFit(MODEL, landmarks, fit);
    const left = (rotation: ArrayLike<number>, scale: number) => {
      let squares = 0;
      let total = 0;
      for (let i = 0; i < 468; i++) {
        total += MODEL.weights[i];
        for (let j = 0; j < 3; j++) {
          const at = [0, 1, 2].reduce(
            (sum, k) => sum + rotation[3 * j + k] * (MODEL.points[3 * i + k] - MODEL.mean[k]),
            0,
          );
          squares += MODEL.weights[i] * (landmarks[3 * i + j] - fit.mean[j] - scale * at) ** 2;
        }
      }
      return Math.sqrt(squares / total);
    };
    const least = left(fit.rotation, fit.scalePx);
    expect(fit.residualPx).toBeCloseTo(least, 9);
    const angles = { yawRad: 0, pitchRad: 0, rollRad: 0 };
    headAngles(fit.rotation, angles);
    const { yawRad: yaw, pitchRad: pitch, rollRad: roll } = angles;
    for (const e of [-0.01, 0.01]) {
      expect(left(rotationOf({ yaw: yaw + e, pitch, roll }), fit.scalePx)).toBeGreaterThan(least);
      expect(left(rotationOf({ yaw, pitch: pitch + e, roll }), fit.scalePx)).toBeGreaterThan(least);
      expect(left(rotationOf({ yaw, pitch, roll: roll + e }), fit.scalePx)).toBeGreaterThan(least);
      expect(left(fit.rotation, fit.scalePx * (1 + e))).toBeGreaterThan(least);
    }
  });

  it('with the jaw weighed down is moved less by a mouth that opens', () => {
    const pose = { yaw: 0, pitch: 0, roll: 0, x: 0, y: 0, z: 0 };
    const opened = posedPoints(MODEL, pose, 60)
      .map(([x, y, z]) => [x, y > 60 ? y + 12 : y, z])
      .flat();
    const error = (chin: number) => {
      const fit = createSimilarityFit();
      similarityFit(createFaceModel(jawWeights(chin)), opened, fit);
      return Math.abs(fit.scalePx / 60 - 1);
    };
    expect(error(0.1)).toBeLessThan(error(1) / 2);
  });

  it.each([
    ['too few', [1, 2, 3]],
    ['on one point', Array(1404).fill(5)],
    ['not finite', Array(1404).fill(NaN)],
  ])('names landmarks that are %s', (_, landmarks) => {
    expect(() => similarityFit(MODEL, landmarks, createSimilarityFit())).toThrowError(
      expect.objectContaining({ name: 'GeometryError', value: 'landmarks' }),
    );
  });
});
