import { GeometryError } from '../projection/geometry-error';
import { requirePositive } from '../projection/requirements';
import { focalPx, pointToGlass, requireCamera, type Camera, type MutablePoint3 } from './camera';
import { USUAL_EYE_DISTANCE_MM } from './distance-from-size';
import { createFaceModel, type FaceModel } from './face-model';
import { headAngles, type HeadAngles } from './head-angles';
import { perspectivePlace } from './perspective-place';
import { createSimilarityFit, similarityFit, type SimilarityFit } from './similarity-fit';
import { turnedByRay } from './viewing-ray';

/*
 * From the 468 landmarks of a face to the eye in front of the glass.
 *
 * The similarity fit (similarity-fit.ts) gives the head's apparent turn. Turned by the viewing ray (viewing-ray.ts) it is the
 * head's turn in the room, with which the place follows in full perspective from all landmarks (perspective-place.ts); the
 * place is then divided by k, since the landmarks draw every face a little too small about its ray.
 *
 * The simpler weak perspective, Z = f/s - (R c)_z, was measured beside it on rendered heads of known pose: over 0.45 to 3 m
 * its distances strayed from proportion by up to 1.9 % against 0.9 %, and for someone walking past 20 degrees off the axis by
 * 3.8 % against 0.4 %.
 *
 * A viewer's size and distance cannot be told apart from pictures: a wrong eye distance scales X, Y and Z by one factor.
 */

/** What is known of a viewer. */
export interface ViewerMeasure {
  readonly eyeDistanceMm: number;
  /** k: by how much the landmarks draw a face too small. Measured 1.03 to 1.05 for a region of 1.5; best set once at a known distance. */
  readonly distanceFactor: number;
}

export const USUAL_VIEWER: ViewerMeasure = { eyeDistanceMm: USUAL_EYE_DISTANCE_MM, distanceFactor: 1.03 };

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
  /** How far the head looks turned from the camera, aside of which it may stand. */
  apparentYawRad: number;
}

export function createLandmarkEye(model: FaceModel = createFaceModel()): LandmarkEye {
  return {
    model,
    fit: createSimilarityFit(),
    eye: { x: 0, y: 0, z: 0 },
    inCamera: { x: 0, y: 0, z: 0 },
    headPose: new Float64Array(9),
    headAngles: { yawRad: 0, pitchRad: 0, rollRad: 0 },
    apparentYawRad: 0,
  };
}

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
  const { model, fit, inCamera, headPose } = out;
  const { eyeDistanceMm, distanceFactor } = viewer;
  const f = focalPx(camera);
  const centreX = camera.widthPx / 2;
  const centreY = camera.heightPx / 2;
  similarityFit(model, landmarks, fit);
  turnedByRay((fit.mean[0] - centreX) / f, (fit.mean[1] - centreY) / f, fit.rotation, headPose);
  if (!perspectivePlace(model, headPose, fit.rotation, eyeDistanceMm, landmarks, centreX, centreY, f, inCamera)) {
    throw new GeometryError(
      'landmarks',
      'The landmarks are those of no face in front of the camera: look for the face again.',
    );
  }
  inCamera.x /= distanceFactor;
  inCamera.y /= distanceFactor;
  inCamera.z /= distanceFactor;
  headAngles(headPose, out.headAngles);
  out.apparentYawRad = Math.asin(Math.max(-1, Math.min(1, fit.rotation[6])));
  pointToGlass(camera, inCamera, out.eye);
}
