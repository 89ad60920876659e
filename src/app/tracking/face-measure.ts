import { pointToGlass, type Camera } from '@oriel/shared/viewer/camera';
import { createLandmarkEye, eyeFromLandmarks } from '@oriel/shared/viewer/eye-from-landmarks';
import { EYE_CORNERS } from '@oriel/shared/viewer/face-model';
import { leftEyeOf, rightEyeOf } from './face-landmarks';
import type { FaceSample, TrackerSettings } from './tracking-messages';

/**
 * From landmarks to the viewer's eye. The fit takes the eye to lie midway between the corners; the pupils lie a little higher, in the
 * middle of the eyes' outlines, so the result is moved across by what separates the two in the picture.
 */
export class FaceMeasure {
  private readonly result = createLandmarkEye();
  private camera: Camera | null = null;
  private settings: TrackerSettings | null = null;

  /** What these landmarks, in pixels of a frame of this size, say of the viewer. */
  measure(
    landmarks: Float64Array,
    belief: number,
    frame: { readonly width: number; readonly height: number },
    settings: TrackerSettings,
  ): FaceSample {
    const camera = this.cameraFor(frame, settings);
    eyeFromLandmarks(camera, landmarks, this.result, settings.viewer);
    const { inCamera, eye, fit, headAngles } = this.result;
    const rightEyePx = rightEyeOf(landmarks);
    const leftEyePx = leftEyeOf(landmarks);
    const eyePx = { x: (rightEyePx.x + leftEyePx.x) / 2, y: (rightEyePx.y + leftEyePx.y) / 2 };
    const mmPerPx = settings.viewer.eyeDistanceMm / fit.scalePx;
    inCamera.x += (eyePx.x - meanOfCorners(landmarks, 0)) * mmPerPx;
    inCamera.y += (eyePx.y - meanOfCorners(landmarks, 1)) * mmPerPx;
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

const CORNERS = [...EYE_CORNERS.right, ...EYE_CORNERS.left];

const meanOfCorners = (landmarks: Float64Array, axis: 0 | 1): number =>
  CORNERS.reduce((sum, corner) => sum + landmarks[3 * corner + axis], 0) / CORNERS.length;
