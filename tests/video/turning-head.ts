import type { Corners } from './delaunay';
import type { Point } from './flat-face';
import type { Texture } from './texture';

export type Place = readonly [number, number, number];

/** A corner of a head's mesh: where it is on the head that faces the camera (mm from the midpoint between the pupils: right, down, away), and in its picture. */
export interface HeadCorner {
  readonly place: Place;
  readonly texture: Point;
  readonly opacity: number;
  /** Whether it is of the face proper, and not of the hair, ears and neck about it. */
  readonly ofFace: boolean;
}

/** A person to be placed in front of a camera. */
export interface TurningHead {
  readonly corners: readonly HeadCorner[];
  readonly triangles: readonly Corners[];
  /** What hangs below the head, flat: it does not turn with it. */
  readonly body: { readonly corners: readonly HeadCorner[]; readonly triangles: readonly Corners[] };
  readonly levels: readonly Texture[];
  /** The subject's own pupils. */
  readonly rightEye: Place;
  readonly leftEye: Place;
  /** Height of the mouth's line; below it the jaw moves, mm. */
  readonly mouthMm: number;
}

/** Where a head is and how it is turned: mm of the camera (right, down, away); degrees, yaw > 0 nose to the picture's right, pitch > 0 nose down, roll > 0 clockwise. */
export interface HeadPose {
  /** Which person. */
  readonly who?: number;
  readonly x: number;
  readonly y: number;
  readonly z: number;
  readonly yaw?: number;
  readonly pitch?: number;
  readonly roll?: number;
  /** How far the chin is lowered, mm. */
  readonly jaw?: number;
}

/** A camera that looks along z from the middle of its picture. */
export interface HeadCamera {
  readonly width: number;
  readonly height: number;
  readonly focalPx: number;
}

export const cameraOf = (width: number, height: number, hfovDeg: number): HeadCamera => ({
  width,
  height,
  focalPx: width / 2 / Math.tan((hfovDeg * Math.PI) / 360),
});

/** From head to camera: R = Rz(roll) Ry(-yaw) Rx(pitch) about the midpoint between the pupils, then its place. */
export function posed({ x, y, z, yaw = 0, pitch = 0, roll = 0 }: HeadPose): (place: Place) => Place {
  const [a, b, c] = [-yaw, pitch, roll].map((degrees) => (degrees * Math.PI) / 180);
  const [cy, sy, cp, sp, cr, sr] = [Math.cos(a), Math.sin(a), Math.cos(b), Math.sin(b), Math.cos(c), Math.sin(c)];
  return ([px, py, pz]) => {
    const down = cp * py - sp * pz;
    const deep = sp * py + cp * pz;
    const across = cy * px + sy * deep;
    return [x + cr * across - sr * down, y + sr * across + cr * down, z - sy * px + cy * deep];
  };
}

export const seenAt = ({ width, height, focalPx }: HeadCamera, [x, y, z]: Place): Point => [
  width / 2 + (focalPx * x) / z,
  height / 2 + (focalPx * y) / z,
];

/** What is true of a head, in the form `npm run bench:tracking` reads. */
export function truthOfHead(head: TurningHead, pose: HeadPose, camera: HeadCamera): object {
  const put = posed(pose);
  return {
    re: seenAt(camera, put(head.rightEye)),
    le: seenAt(camera, put(head.leftEye)),
    mid: [pose.x, pose.y, pose.z],
    yaw: pose.yaw ?? 0,
    pitch: pose.pitch ?? 0,
    roll: pose.roll ?? 0,
    who: pose.who ?? 0,
  };
}
