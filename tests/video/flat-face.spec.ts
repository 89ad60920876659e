import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { drawFlatFace, placePoint, type FlatFace, type Point } from './flat-face';

const SIZE = 200;
const DOT: Point = [92.3, 81.7];

/** A black picture with one soft bright dot in it, whose centroid is DOT. */
function dottedFace(): FlatFace {
  const data = new Uint8Array(SIZE * SIZE * 3);
  for (let y = 0; y < SIZE; y++) {
    for (let x = 0; x < SIZE; x++) {
      const squared = (x + 0.5 - DOT[0]) ** 2 + (y + 0.5 - DOT[1]) ** 2;
      data.fill(255 * Math.exp(-squared / 18), (y * SIZE + x) * 3, (y * SIZE + x + 1) * 3);
    }
  }
  const picture = { width: SIZE, height: SIZE, data };
  return { picture, rightEye: [80, 100], leftEye: [120, 100], oval: { centre: [100, 100], radii: [70, 80] } };
}

function centroid(frame: Float32Array, width: number): Point {
  let sum = 0;
  let x = 0;
  let y = 0;
  for (let at = 0; at < frame.length; at += 3) {
    sum += frame[at];
    x += frame[at] * (((at / 3) % width) + 0.5);
    y += frame[at] * (Math.floor(at / 3 / width) + 0.5);
  }
  return [x / sum, y / sum];
}

describe('the flat face', () => {
  const face = dottedFace();

  it('is drawn where its truth says, to a twentieth of a pixel, at any place, size and roll', () => {
    const pose = fc.record({
      x: fc.double({ min: 120, max: 200, noNaN: true }),
      y: fc.double({ min: 100, max: 140, noNaN: true }),
      ipd: fc.double({ min: 22, max: 60, noNaN: true }),
      rollDeg: fc.double({ min: -25, max: 25, noNaN: true }),
    });
    fc.assert(
      fc.property(pose, (placed) => {
        const frame = new Float32Array(320 * 240 * 3);
        const whole = { ...placed, segment: '', on: true };
        drawFlatFace(face, whole, frame, 320, 240);
        const [x, y] = centroid(frame, 320);
        const [trueX, trueY] = placePoint(face, whole, DOT);
        expect(Math.hypot(x - trueX, y - trueY)).toBeLessThan(0.05);
      }),
      { numRuns: 40 },
    );
  });

  it('has its pupils as far apart as asked, along a line turned by the roll', () => {
    const pose = { x: 100, y: 50, ipd: 30, rollDeg: 30, segment: '', on: true };
    const [right, left] = [placePoint(face, pose, face.rightEye), placePoint(face, pose, face.leftEye)];
    expect(left[0] - right[0]).toBeCloseTo(30 * Math.cos(Math.PI / 6), 9);
    expect(left[1] - right[1]).toBeCloseTo(15, 9);
  });
});
