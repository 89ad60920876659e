import { requirePositive } from '../projection/requirements';
import { focalPx, pointToGlass, requireCamera, type Camera, type MutablePoint3 } from './camera';
import { USUAL_EYE_DISTANCE_MM } from './distance-from-size';
import { createFaceModel, EYE_CORNERS, type FaceModel } from './face-model';
import { headAngles, type HeadAngles } from './head-angles';
import { perspectivePlace } from './perspective-place';
import { createSimilarityFit, similarityFit, type SimilarityFit } from './similarity-fit';
import { turnedByRay } from './viewing-ray';

/*
 * From the 468 landmarks of a face to the eye in front of the glass.
 *
 * The similarity fit gives the head's turn R and s pixels to the millimetre, so the face's middle stands at f/s along the
 * camera's axis and the midpoint between the eyes at
 *
 *     Z = (f/s - (R c)_z) / k,
 *
 * c being the model's mean; X and Y follow from the pixel of that midpoint. That holds for a face small against its distance
 * and near the axis. Nearer than about 0.8 m, or far off the axis, the place is solved in full perspective with R turned by
 * the viewing ray (perspective-place.ts); between the two the result passes smoothly from the one to the other.
 *
 * A viewer's size and distance cannot be told apart from pictures: a wrong eye distance scales X, Y and Z by one factor.
 */

/** What is known of a viewer. */
export interface ViewerMeasure {
  readonly eyeDistanceMm: number;
  /** k: by how much the landmarks draw a face too small. Measured 1.06 to 1.07 for a region of 1.5; set once at a known distance. */
  readonly distanceFactor: number;
}

export const USUAL_VIEWER: ViewerMeasure = { eyeDistanceMm: USUAL_EYE_DISTANCE_MM, distanceFactor: 1.065 };

/** The result, and the memory the fit works in: made once, then written to by every frame. */
export interface LandmarkEye {
  readonly model: FaceModel;
  readonly fit: SimilarityFit;
  /** The midpoint between the eyes, mm from the centre of the glass. */
  readonly eye: MutablePoint3;
  /** The same in the camera's coordinates. */
  readonly inCamera: MutablePoint3;
  /** The head's turn in the camera's coordinates, nine numbers by rows, and as angles. */
  readonly headPose: Float64Array;
  readonly headAngles: HeadAngles;
  readonly scratch: MutablePoint3;
}

export function createLandmarkEye(model: FaceModel = createFaceModel()): LandmarkEye {
  return {
    model,
    fit: createSimilarityFit(),
    eye: { x: 0, y: 0, z: 0 },
    inCamera: { x: 0, y: 0, z: 0 },
    headPose: new Float64Array(9),
    headAngles: { yawRad: 0, pitchRad: 0, rollRad: 0 },
    scratch: { x: 0, y: 0, z: 0 },
  };
}

/** Distances over which the full perspective gives way to the similarity, mm. */
const NEAR_MM = 800;
const FAR_ENOUGH_MM = 1000;
/** Tangents of the angle off the axis over which it takes over again: 20 to 28 degrees. */
const ASIDE_FROM = 0.364;
const ASIDE_TO = 0.532;

/**
 * Writes the eye and the head's turn into `out`; allocates nothing.
 * @param landmarks x, y, z of each landmark in pixels of the camera's picture, mirrored or not as the camera is.
 * @throws GeometryError for an impossible camera, viewer or set of landmarks.
 */
export function eyeFromLandmarks(
  camera: Camera,
  landmarks: ArrayLike<number>,
  out: LandmarkEye,
  viewer: ViewerMeasure = USUAL_VIEWER,
): void {
  requireCamera(camera);
  requirePositive('eyeDistanceMm', viewer.eyeDistanceMm);
  requirePositive('distanceFactor', viewer.distanceFactor);
  const { model, fit, inCamera, headPose, scratch } = out;
  const { eyeDistanceMm, distanceFactor } = viewer;
  similarityFit(model, landmarks, fit);
  const f = focalPx(camera);
  const centreX = camera.widthPx / 2;
  const centreY = camera.heightPx / 2;
  const asideX = (fit.mean[0] - centreX) / f;
  const asideY = (fit.mean[1] - centreY) / f;

  const forward = fit.rotation[6] * model.mean[0] + fit.rotation[7] * model.mean[1] + fit.rotation[8] * model.mean[2];
  const z = (eyeDistanceMm * (f / fit.scalePx - forward)) / distanceFactor;
  inCamera.x = ((eyeMidpoint(landmarks, 0) - centreX) / f) * z;
  inCamera.y = ((eyeMidpoint(landmarks, 1) - centreY) / f) * z;
  inCamera.z = z;

  turnedByRay(asideX, asideY, fit.rotation, headPose);
  const far = smoothly((z - NEAR_MM) / (FAR_ENOUGH_MM - NEAR_MM));
  const aside = smoothly((Math.hypot(asideX, asideY) - ASIDE_FROM) / (ASIDE_TO - ASIDE_FROM));
  const share = 1 - far * (1 - aside);
  if (share > 0 && perspectivePlace(model, headPose, eyeDistanceMm, landmarks, centreX, centreY, f, scratch)) {
    inCamera.x += share * (scratch.x / distanceFactor - inCamera.x);
    inCamera.y += share * (scratch.y / distanceFactor - inCamera.y);
    inCamera.z += share * (scratch.z / distanceFactor - inCamera.z);
  }
  headAngles(headPose, out.headAngles);
  pointToGlass(camera, inCamera, out.eye);
}

/** The mean of the four eye corners along one axis of the picture, px. */
function eyeMidpoint(landmarks: ArrayLike<number>, axis: 0 | 1): number {
  const { right, left } = EYE_CORNERS;
  return (
    (landmarks[3 * right[0] + axis] +
      landmarks[3 * right[1] + axis] +
      landmarks[3 * left[0] + axis] +
      landmarks[3 * left[1] + axis]) /
    4
  );
}

function smoothly(t: number): number {
  const u = Math.min(1, Math.max(0, t));
  return u * u * (3 - 2 * u);
}
