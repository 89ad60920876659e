import { tap, type StillPicture } from './still-picture';
import type { FacePose } from './face-path';

export type Point = readonly [number, number];

/** A photographed face to be placed in frames: its pupils (the subject's right and left) and the oval of it that is shown, in its own pixels. */
export interface FlatFace {
  readonly picture: StillPicture;
  readonly rightEye: Point;
  readonly leftEye: Point;
  readonly oval: { readonly centre: Point; readonly radii: Point };
}

/** The outermost share of the oval in which the face fades into the background. */
const FADE = 0.15;

/** From the face's pixels to the frame's: scaled to the pose's eye distance and turned about the midpoint between the pupils. */
function placing(face: FlatFace, pose: FacePose): { scale: number; cos: number; sin: number; middle: Point } {
  const { rightEye, leftEye } = face;
  const angle = (pose.rollDeg * Math.PI) / 180;
  return {
    scale: pose.ipd / Math.hypot(leftEye[0] - rightEye[0], leftEye[1] - rightEye[1]),
    cos: Math.cos(angle),
    sin: Math.sin(angle),
    middle: [(rightEye[0] + leftEye[0]) / 2, (rightEye[1] + leftEye[1]) / 2],
  };
}

/** Where a point of the face's picture lies in the frame. */
export function placePoint(face: FlatFace, pose: FacePose, point: Point): Point {
  const { scale, cos, sin, middle } = placing(face, pose);
  const dx = (point[0] - middle[0]) * scale;
  const dy = (point[1] - middle[1]) * scale;
  return [pose.x + cos * dx - sin * dy, pose.y + sin * dx + cos * dy];
}

/** Draws the face over `frame` (red, green, blue, row by row); reduced faces are averaged over nine taps a pixel. */
export function drawFlatFace(face: FlatFace, pose: FacePose, frame: Float32Array, width: number, height: number): void {
  const { scale, cos, sin, middle } = placing(face, pose);
  const { centre, radii } = face.oval;
  const taps = scale < 1 ? 3 : 1;
  const [middleX, middleY] = placePoint(face, pose, centre);
  const reach = Math.max(...radii) * scale + 1;
  const stepU = cos / scale;
  const stepV = sin / scale;
  const lastRow = Math.min(height, Math.ceil(middleY + reach));
  const lastColumn = Math.min(width, Math.ceil(middleX + reach));
  for (let y = Math.max(0, Math.floor(middleY - reach)); y < lastRow; y++) {
    for (let x = Math.max(0, Math.floor(middleX - reach)); x < lastColumn; x++) {
      const dx = x + 0.5 - pose.x;
      const dy = y + 0.5 - pose.y;
      const u = middle[0] + stepU * dx + stepV * dy;
      const v = middle[1] - stepV * dx + stepU * dy;
      const outward = Math.hypot((u - centre[0]) / radii[0], (v - centre[1]) / radii[1]);
      if (outward >= 1 || !within(face.picture, u, v)) continue;
      const share = Math.min(1, (1 - outward) / FADE);
      for (let channel = 0; channel < 3; channel++) {
        let sum = 0;
        for (let j = 0; j < taps; j++) {
          for (let i = 0; i < taps; i++) {
            const tx = (i + 0.5) / taps - 0.5;
            const ty = (j + 0.5) / taps - 0.5;
            sum += tap(face.picture, u + stepU * tx + stepV * ty, v - stepV * tx + stepU * ty, channel);
          }
        }
        const at = (y * width + x) * 3 + channel;
        frame[at] = frame[at] * (1 - share) + (sum / (taps * taps)) * share;
      }
    }
  }
}

const within = ({ width, height }: StillPicture, u: number, v: number): boolean =>
  u > 1 && v > 1 && u < width - 1 && v < height - 1;
