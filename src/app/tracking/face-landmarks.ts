import { eyeLineAngle, type Region } from './region';
import type { PixelPoint } from './tracking-messages';

/** Points of the landmark model, x, y, z each. */
export const LANDMARK_COUNT = 468;
/** Side of the landmark model's input. */
export const LANDMARK_INPUT = 192;

/**
 * The outline of each eye, corners and lids (numbering of the MediaPipe face mesh). Its mean lies in the middle of the eye's opening,
 * where the pupil of someone who looks ahead is; the corners alone lie lower. In a blink it drops by about 2.5 mm, which the viewer,
 * whose eyes are shut, cannot see.
 */
const RIGHT_EYE_OUTLINE = [33, 7, 163, 144, 145, 153, 154, 155, 133, 173, 157, 158, 159, 160, 161, 246] as const;
const LEFT_EYE_OUTLINE = [263, 249, 390, 373, 374, 380, 381, 382, 362, 398, 384, 385, 386, 387, 388, 466] as const;

/**
 * How much larger than the box of the landmarks the region is. The measured scale shifts by 1.7 % for each 0.1, so it is fixed; at
 * 1.4 it can lock onto a wrong region.
 */
const REGION_FACTOR = 1.5;

/** Carries landmarks from pixels of the model's input to frame pixels, in place of what `into` held; z keeps the scale of x and y. */
export function placeLandmarks(points: Float32Array, region: Region, into: Float64Array): void {
  const scale = region.size / LANDMARK_INPUT;
  const ca = Math.cos(region.angleRad) * scale;
  const sa = Math.sin(region.angleRad) * scale;
  for (let at = 0; at < LANDMARK_COUNT * 3; at += 3) {
    const dx = points[at] - LANDMARK_INPUT / 2;
    const dy = points[at + 1] - LANDMARK_INPUT / 2;
    into[at] = region.cx + ca * dx - sa * dy;
    into[at + 1] = region.cy + sa * dx + ca * dy;
    into[at + 2] = points[at + 2] * scale;
  }
}

function meanOf(landmarks: Float64Array, outline: readonly number[]): PixelPoint {
  let x = 0;
  let y = 0;
  for (const point of outline) {
    x += landmarks[3 * point];
    y += landmarks[3 * point + 1];
  }
  return { x: x / outline.length, y: y / outline.length };
}

/** The subject's right eye, the middle of its outline; frame pixels. */
export const rightEyeOf = (landmarks: Float64Array): PixelPoint => meanOf(landmarks, RIGHT_EYE_OUTLINE);

/** The subject's left eye, the middle of its outline; frame pixels. */
export const leftEyeOf = (landmarks: Float64Array): PixelPoint => meanOf(landmarks, LEFT_EYE_OUTLINE);

/** The middle of the inner lips, above and below (numbering of the MediaPipe face mesh). */
const [UPPER_LIP, LOWER_LIP] = [13, 14];

/** How far apart the inner lips are, in space, frame pixels. */
export const mouthOpening = (landmarks: Float64Array): number =>
  Math.hypot(...[0, 1, 2].map((axis) => landmarks[3 * LOWER_LIP + axis] - landmarks[3 * UPPER_LIP + axis]));

/**
 * The region to look at for these landmarks: their box taken along the eye line, so that it does not swell when the head rolls, made
 * square and enlarged.
 */
export function regionOfLandmarks(landmarks: Float64Array): Region {
  const angleRad = eyeLineAngle(rightEyeOf(landmarks), leftEyeOf(landmarks));
  const ca = Math.cos(angleRad);
  const sa = Math.sin(angleRad);
  let left = Infinity;
  let right = -Infinity;
  let top = Infinity;
  let bottom = -Infinity;
  for (let at = 0; at < LANDMARK_COUNT * 3; at += 3) {
    const along = ca * landmarks[at] + sa * landmarks[at + 1];
    const across = -sa * landmarks[at] + ca * landmarks[at + 1];
    if (along < left) left = along;
    if (along > right) right = along;
    if (across < top) top = across;
    if (across > bottom) bottom = across;
  }
  const along = (left + right) / 2;
  const across = (top + bottom) / 2;
  return {
    cx: ca * along - sa * across,
    cy: sa * along + ca * across,
    size: Math.max(right - left, bottom - top) * REGION_FACTOR,
    angleRad,
  };
}
