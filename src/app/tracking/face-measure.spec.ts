import { CANONICAL_FACE_CM } from '@oriel/shared/viewer/canonical-face';
import { FaceMeasure } from './face-measure';
import type { TrackerSettings } from './tracking-messages';

/** The canonical face's eye centres, midpoints of their corners, are 6.3023 cm apart, 2.6246 up and 3.46565 toward the camera (computed). */
const BETWEEN_EYES_CM = 6.3023;
const FRAME = { width: 1280, height: 720 };
const FOCAL_PX = 640 / Math.tan(Math.PI / 6);
const SETTINGS: TrackerSettings = {
  assetsUrl: '',
  camera: {
    position: { x: 0, y: 170, z: 0 },
    pitchRad: 0,
    yawRad: 0,
    rollRad: 0,
    hfovRad: Math.PI / 3,
    mirrored: false,
  },
  viewer: { eyeDistanceMm: 63, distanceFactor: 1 },
};

/** Landmarks of the canonical face, eyes 63 mm apart, squarely before the camera with the midpoint between them at this place. */
function landmarksAt(x: number, y: number, z: number): Float64Array {
  const mm = 63 / BETWEEN_EYES_CM;
  const landmarks = new Float64Array(CANONICAL_FACE_CM.length);
  for (let at = 0; at < landmarks.length; at += 3) {
    const depth = z - (CANONICAL_FACE_CM[at + 2] - 3.46565) * mm;
    landmarks[at] = FRAME.width / 2 + (FOCAL_PX * (x + CANONICAL_FACE_CM[at] * mm)) / depth;
    landmarks[at + 1] = FRAME.height / 2 + (FOCAL_PX * (y - (CANONICAL_FACE_CM[at + 1] - 2.6246) * mm)) / depth;
    landmarks[at + 2] = (FOCAL_PX * (depth - z)) / z;
  }
  return landmarks;
}

describe('FaceMeasure', () => {
  it.each([
    [0, 0, 600],
    [150, -40, 1000],
    [-300, 60, 2000],
  ])('finds the eye of a face made at (%i, %i, %i) mm: to 3 mm across and 1 % away', (x, y, z) => {
    const { eyeInCamera } = new FaceMeasure().measure(landmarksAt(x, y, z), 1, FRAME, SETTINGS, 0);
    expect(Math.abs(eyeInCamera.x - x)).toBeLessThan(3);
    expect(Math.abs(eyeInCamera.y - y)).toBeLessThan(3);
    expect(Math.abs(eyeInCamera.z / z - 1)).toBeLessThan(0.01);
  });

  it('carries it to the glass: the left of the picture is the right of the glass, and the camera is 170 mm up', () => {
    const { eye, eyeInCamera } = new FaceMeasure().measure(landmarksAt(150, -40, 1000), 1, FRAME, SETTINGS, 0);
    expect(eye.x).toBeCloseTo(-eyeInCamera.x, 9);
    expect(eye.y).toBeCloseTo(170 - eyeInCamera.y, 9);
    expect(eye.z).toBeCloseTo(eyeInCamera.z, 9);
  });

  it('gives every sample a place of its own, and heeds a change of set-up', () => {
    const measure = new FaceMeasure();
    const first = measure.measure(landmarksAt(0, 0, 600), 1, FRAME, SETTINGS, 0);
    const second = measure.measure(landmarksAt(0, 0, 600), 1, FRAME, {
      ...SETTINGS,
      viewer: { eyeDistanceMm: 126, distanceFactor: 1 },
    }, 0);
    expect(second.eye).not.toBe(first.eye);
    expect(second.eyeInCamera.z / first.eyeInCamera.z).toBeCloseTo(2, 6);
  });

  it('holds the distance where landmarks fail, for half a second: the eyes of a smeared face tell its direction alone', () => {
    const measure = new FaceMeasure();
    const { eyeInCamera, ipdPx } = measure.measure(landmarksAt(0, 0, 1500), 1, FRAME, SETTINGS, 0);
    const smeared = { rightEye: { x: 700, y: 360 }, leftEye: { x: 760, y: 360 } };
    const held = measure.measureGlimpse(smeared, 0.8, FRAME, SETTINGS, 400);
    expect(held.eyeInCamera.z).toBe(eyeInCamera.z);
    expect(held.ipdPx).toBe(ipdPx);
    expect(held.eyeInCamera.x).toBeCloseTo((90 * eyeInCamera.z) / FOCAL_PX, 9);
    const later = measure.measureGlimpse(smeared, 0.8, FRAME, SETTINGS, 501);
    expect(later.eyeInCamera.z).toBeCloseTo((FOCAL_PX * 63) / 60, 9);
  });

  it('holds the distance of a face that the edge of the frame cuts: what is seen of it crowds together', () => {
    const measure = new FaceMeasure();
    const whole = measure.measure(landmarksAt(700, 0, 1500), 1, FRAME, SETTINGS, 0).eyeInCamera;
    const crowded = landmarksAt(860, 0, 1520);
    const cut = measure.measure(crowded, 1, FRAME, SETTINGS, 33).eyeInCamera;
    expect(Math.max(...[234, 454].map((side) => crowded[3 * side]))).toBeGreaterThan(FRAME.width);
    expect(cut.z).toBe(whole.z);
    expect(new FaceMeasure().measure(crowded, 1, FRAME, SETTINGS, 33).eyeInCamera.z).not.toBe(whole.z);
  });
});
