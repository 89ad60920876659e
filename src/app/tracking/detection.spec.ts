import { decodeDetections } from './detection';

/** One anchor in the middle of a 128 px input; box 32 px to the right of it, 64 px wide; eyes 16 px to either side. */
function output(logit: number): Float32Array {
  const numbers = new Float32Array(17);
  numbers.set([logit, 32, 0, 64, 64, -16, 0, 16, 0]);
  return numbers;
}
const anchors = new Float32Array([0.5, 0.5]);

describe('decodeDetections', () => {
  it('carries a find from the input to the frame: here twice its size, at (100, 50)', () => {
    const region = { cx: 100, cy: 50, size: 256, angleRad: 0 };
    const [face] = decodeDetections(output(0), anchors, 128, region, 0.4);
    expect(face).toEqual({
      score: 0.5,
      cx: 164,
      cy: 50,
      width: 128,
      height: 128,
      rightEye: { x: 68, y: 50 },
      leftEye: { x: 132, y: 50 },
    });
  });

  it('turns with the region: a quarter turn clockwise takes what lay to the right downward', () => {
    const region = { cx: 100, cy: 50, size: 128, angleRad: Math.PI / 2 };
    const [face] = decodeDetections(output(2), anchors, 128, region, 0.5);
    expect(face.cx).toBeCloseTo(100, 9);
    expect(face.cy).toBeCloseTo(82, 9);
    expect(face.leftEye.y).toBeCloseTo(66, 9);
  });

  it('leaves out what is less probable than the threshold: a logit of 1 is 0.731', () => {
    const region = { cx: 0, cy: 0, size: 128, angleRad: 0 };
    expect(decodeDetections(output(1), anchors, 128, region, 0.73)).toHaveLength(1);
    expect(decodeDetections(output(1), anchors, 128, region, 0.732)).toHaveLength(0);
  });
});
