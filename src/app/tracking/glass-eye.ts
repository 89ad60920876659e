import type { Point3 } from '@oriel/shared/projection/types';

/** Provisional until shared/viewer lands: the camera against the glass. */
export interface Camera {
  readonly xMm: number;
  readonly yMm: number;
  readonly zMm: number;
  readonly yawRad: number;
  readonly pitchRad: number;
  readonly rollRad: number;
  readonly hfovRad: number;
  readonly mirrored: boolean;
}

export function glassEye(camera: Camera, eye: { readonly x: number; readonly y: number; readonly z: number }): Point3 {
  return { x: camera.xMm - eye.x, y: camera.yMm - eye.y, z: camera.zMm + eye.z };
}
