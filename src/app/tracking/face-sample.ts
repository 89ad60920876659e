import { leftEyeOf, rightEyeOf } from './face-landmarks';
import { eyeLineAngle } from './region';
import type { FaceSample, TrackerSettings } from './tracking-messages';

/** What the landmarks of a face say of the viewer. */
export function faceSample(
  landmarks: Float64Array,
  belief: number,
  frame: { readonly width: number; readonly height: number },
  settings: TrackerSettings,
): FaceSample {
  const rightEyePx = rightEyeOf(landmarks);
  const leftEyePx = leftEyeOf(landmarks);
  const eyePx = { x: (rightEyePx.x + leftEyePx.x) / 2, y: (rightEyePx.y + leftEyePx.y) / 2 };
  const ipdPx = Math.hypot(leftEyePx.x - rightEyePx.x, leftEyePx.y - rightEyePx.y);
  const focal = frame.width / 2 / Math.tan(settings.hfovRad / 2);
  const z = (focal * settings.ipdMm) / ipdPx / settings.scaleFactor;
  return {
    rightEyePx,
    leftEyePx,
    eyePx,
    ipdPx,
    eyeCamera: { x: ((eyePx.x - frame.width / 2) * z) / focal, y: ((eyePx.y - frame.height / 2) * z) / focal, z },
    pose: { yawRad: 0, pitchRad: 0, rollRad: eyeLineAngle(rightEyePx, leftEyePx) },
    belief,
  };
}
