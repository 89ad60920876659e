import {
  LANDMARK_COUNT,
  LANDMARK_INPUT,
  leftEyeOf,
  placeLandmarks,
  regionOfLandmarks,
  rightEyeOf,
} from './face-landmarks';

/** A made-up face in the landmark model's input: a square of 100 px with the eyes on a level line. */
function squareFace(): Float32Array {
  const points = new Float32Array(LANDMARK_COUNT * 3);
  for (let i = 0; i < LANDMARK_COUNT; i++) {
    points[3 * i] = 46 + (100 * ((i * 7) % LANDMARK_COUNT)) / (LANDMARK_COUNT - 1);
    points[3 * i + 1] = 46 + (100 * ((i * 11) % LANDMARK_COUNT)) / (LANDMARK_COUNT - 1);
  }
  const right = [33, 7, 163, 144, 145, 153, 154, 155, 133, 173, 157, 158, 159, 160, 161, 246];
  const left = [263, 249, 390, 373, 374, 380, 381, 382, 362, 398, 384, 385, 386, 387, 388, 466];
  for (const i of right) points.set([70, 80, 0], 3 * i);
  for (const i of left) points.set([120, 80, 0], 3 * i);
  points.set([46, 46, 0], 0);
  points.set([146, 146, 0], 3);
  return points;
}

describe('landmarks', () => {
  it('are carried from the input to the frame with their region', () => {
    const into = new Float64Array(LANDMARK_COUNT * 3);
    placeLandmarks(squareFace(), { cx: 300, cy: 200, size: 2 * LANDMARK_INPUT, angleRad: Math.PI / 2 }, into);
    // The right eye is at (-26, -16) from the middle of the input: doubled, and turned a quarter clockwise.
    expect(rightEyeOf(into).x).toBeCloseTo(300 + 32, 9);
    expect(rightEyeOf(into).y).toBeCloseTo(200 - 52, 9);
  });

  it('have a region that is 1.5 times their box and does not swell when the head rolls', () => {
    const upright = new Float64Array(LANDMARK_COUNT * 3);
    const rolled = new Float64Array(LANDMARK_COUNT * 3);
    placeLandmarks(squareFace(), { cx: 96, cy: 96, size: LANDMARK_INPUT, angleRad: 0 }, upright);
    placeLandmarks(squareFace(), { cx: 96, cy: 96, size: LANDMARK_INPUT, angleRad: 0.5 }, rolled);
    expect(regionOfLandmarks(upright).size).toBeCloseTo(150, 6);
    expect(regionOfLandmarks(rolled).size).toBeCloseTo(150, 6);
    expect(regionOfLandmarks(rolled).angleRad).toBeCloseTo(0.5, 9);
    expect(regionOfLandmarks(rolled).cx).toBeCloseTo(96, 6);
    expect(leftEyeOf(upright)).toEqual({ x: 120, y: 80 });
  });
});
