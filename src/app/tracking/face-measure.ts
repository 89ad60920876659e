import { correctionForBlur, createBlurCorrection } from '@oriel/shared/viewer/blur-correction';
import { focalPx, pointToGlass, type Camera } from '@oriel/shared/viewer/camera';
import { distanceFromSize } from '@oriel/shared/viewer/distance-from-size';
import { trendOfDistance, trendOfMouth, trendOfTurn } from '@oriel/shared/viewer/distance-trend';
import { createLandmarkEye, eyeFromLandmarks } from '@oriel/shared/viewer/eye-from-landmarks';
import { faceWidening } from '@oriel/shared/viewer/face-widening';
import { leftEyeOf, mouthOpening, rightEyeOf } from './face-landmarks';
import type { Eyes } from './guard';
import { eyeLineAngle } from './region';
import type { FaceSample, TrackerSettings } from './tracking-messages';

/** A distance is held through frames that do not tell it for no longer than this. */
const LONGEST_HELD_MS = 500;

/**
 * From landmarks to the viewer's eye: distance and turn of the head from the fit of all landmarks, direction from the pixel midway between
 * the eyes, distance corrected for motion blur. The fit's own midpoint lies between the corners of the eyes, a millimetre lower than the pupils.
 */
export class FaceMeasure {
  private readonly result = createLandmarkEye();
  private readonly blur = createBlurCorrection();
  private readonly held = { ipdPx: 0, zMm: 0, tMs: -Infinity };
  private camera: Camera | null = null;
  private settings: TrackerSettings | null = null;

  /**
   * What these landmarks, in pixels of a frame of this size, say of the viewer.
   * @param detailAlong how much the face's picture holds along a direction against across it; 1 is a sharp one.
   */
  measure(
    landmarks: Float64Array,
    belief: number,
    frame: { readonly width: number; readonly height: number },
    settings: TrackerSettings,
    timestampMs: number,
    detailAlong: (directionRad: number) => number = () => 1,
  ): FaceSample {
    const camera = this.cameraFor(frame, settings);
    eyeFromLandmarks(camera, landmarks, this.result, settings.viewer);
    const { inCamera, eye, fit, headAngles, model } = this.result;
    const rightEyePx = rightEyeOf(landmarks);
    const leftEyePx = leftEyeOf(landmarks);
    const eyePx = { x: (rightEyePx.x + leftEyePx.x) / 2, y: (rightEyePx.y + leftEyePx.y) / 2 };
    inCamera.z *= trendOfDistance(inCamera.z, settings.viewer.eyeDistanceMm);
    inCamera.z *= trendOfTurn(inCamera.z, settings.viewer.eyeDistanceMm, this.result.apparentYawRad);
    inCamera.z *= trendOfMouth(mouthOpening(landmarks) / fit.scalePx, fit.rotation[8]);
    inCamera.z *= correctionForBlur(this.blur, {
      tMs: timestampMs,
      xPx: eyePx.x,
      yPx: eyePx.y,
      eyeDistancePx: fit.scalePx,
      eyeLineRad: eyeLineAngle(rightEyePx, leftEyePx),
      widening: () => faceWidening(model, landmarks, fit),
      detailAlong,
    });
    if (isCut(landmarks, frame) && this.holds(timestampMs)) inCamera.z = this.held.zMm;
    else this.hold(fit.scalePx, inCamera.z, timestampMs);
    const mmPerPx = inCamera.z / focalPx(camera);
    inCamera.x = (eyePx.x - frame.width / 2) * mmPerPx;
    inCamera.y = (eyePx.y - frame.height / 2) * mmPerPx;
    pointToGlass(camera, inCamera, eye);
    return {
      rightEyePx,
      leftEyePx,
      eyePx,
      ipdPx: fit.scalePx,
      eye: { ...eye },
      eyeInCamera: { ...inCamera },
      head: { ...headAngles },
      belief,
    };
  }

  /**
   * What the detector's two eyes alone say: the distance is taken as if the head faced the camera, so a turned head seems farther away
   * by 1/cos(yaw), 15 % at 30 degrees.
   */
  measureEyes(
    { rightEye, leftEye }: Eyes,
    belief: number,
    frame: { readonly width: number; readonly height: number },
    settings: TrackerSettings,
  ): FaceSample {
    const camera = this.cameraFor(frame, settings);
    const { eyeDistanceMm, distanceFactor } = settings.viewer;
    const ipdPx = Math.hypot(leftEye.x - rightEye.x, leftEye.y - rightEye.y);
    const z = distanceFromSize(focalPx(camera), eyeDistanceMm, ipdPx) / distanceFactor;
    return sampleOf(camera, { rightEye, leftEye }, ipdPx, z, belief);
  }

  /**
   * What the detector's two eyes say where landmarks failed, as on a face smeared by its motion: its direction, at the distance that
   * landmarks gave last; at the distance the eyes themselves tell where that is too long ago.
   */
  measureGlimpse(
    eyes: Eyes,
    belief: number,
    frame: { readonly width: number; readonly height: number },
    settings: TrackerSettings,
    timestampMs: number,
  ): FaceSample {
    if (!this.holds(timestampMs)) return this.measureEyes(eyes, belief, frame, settings);
    return sampleOf(this.cameraFor(frame, settings), eyes, this.held.ipdPx, this.held.zMm, belief);
  }

  private holds(tMs: number): boolean {
    const ageMs = tMs - this.held.tMs;
    return ageMs >= 0 && ageMs <= LONGEST_HELD_MS;
  }

  private hold(ipdPx: number, zMm: number, tMs: number): void {
    this.held.ipdPx = ipdPx;
    this.held.zMm = zMm;
    this.held.tMs = tMs;
  }

  private cameraFor(
    { width, height }: { readonly width: number; readonly height: number },
    settings: TrackerSettings,
  ): Camera {
    if (
      !this.camera ||
      this.settings !== settings ||
      this.camera.widthPx !== width ||
      this.camera.heightPx !== height
    ) {
      this.camera = { ...settings.camera, widthPx: width, heightPx: height };
      this.settings = settings;
    }
    return this.camera;
  }
}

/** The ends of the face: forehead, chin, and its sides (numbering of the MediaPipe face mesh). */
const FACE_ENDS = [10, 152, 234, 454] as const;

/** Whether the edge of the frame cuts the face: the landmarks then crowd into what is seen of it, and it reads too far away. */
const isCut = (landmarks: Float64Array, frame: { readonly width: number; readonly height: number }): boolean =>
  FACE_ENDS.some((end) => {
    const x = landmarks[3 * end];
    const y = landmarks[3 * end + 1];
    return x < 0 || y < 0 || x > frame.width || y > frame.height;
  });

/** Someone seen by the eyes alone, `z` mm away and as if they faced the camera. */
function sampleOf(camera: Camera, { rightEye, leftEye }: Eyes, ipdPx: number, z: number, belief: number): FaceSample {
  const f = focalPx(camera);
  const eyePx = { x: (rightEye.x + leftEye.x) / 2, y: (rightEye.y + leftEye.y) / 2 };
  const eyeInCamera = {
    x: ((eyePx.x - camera.widthPx / 2) * z) / f,
    y: ((eyePx.y - camera.heightPx / 2) * z) / f,
    z,
  };
  const eye = { x: 0, y: 0, z: 0 };
  pointToGlass(camera, eyeInCamera, eye);
  const head = { yawRad: 0, pitchRad: 0, rollRad: eyeLineAngle(rightEye, leftEye) };
  return { rightEyePx: rightEye, leftEyePx: leftEye, eyePx, ipdPx, eye, eyeInCamera, head, belief };
}
