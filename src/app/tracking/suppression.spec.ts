import type { Detection } from './detection';
import { mergeDetections, overlap } from './suppression';

const face = (cx: number, score: number, size = 100): Detection => ({
  score,
  cx,
  cy: 0,
  width: size,
  height: size,
  rightEye: { x: cx - 20, y: 0 },
  leftEye: { x: cx + 20, y: 0 },
});

describe('overlap', () => {
  it('is the shared area over the joint one: half shifted squares share a third', () => {
    expect(overlap(face(0, 1), face(50, 1))).toBeCloseTo(1 / 3, 12);
    expect(overlap(face(0, 1), face(0, 1))).toBe(1);
    expect(overlap(face(0, 1), face(100, 1))).toBe(0);
  });
});

describe('mergeDetections', () => {
  it('averages the finds of one face by their probability and keeps the best score', () => {
    const [merged, ...rest] = mergeDetections([face(10, 0.3), face(0, 0.9)]);
    expect(rest).toHaveLength(0);
    expect(merged.score).toBe(0.9);
    expect(merged.cx).toBeCloseTo((0.3 * 10 + 0.9 * 0) / 1.2, 12);
    expect(merged.leftEye.x).toBeCloseTo(22.5, 12);
  });

  it('keeps two people apart, the surer first', () => {
    const merged = mergeDetections([face(0, 0.6), face(300, 0.8), face(5, 0.5)]);
    expect(merged.map((one) => one.score)).toEqual([0.8, 0.6]);
  });
});
