/** How a head is turned against one that squarely faces the camera, radians, as the (unmirrored) picture shows it. */
export interface HeadAngles {
  /** Nose to the right of the picture is positive. */
  yawRad: number;
  /** Nose down is positive. */
  pitchRad: number;
  /** Clockwise in the picture is positive. */
  rollRad: number;
}

/** The angles of R = Rz(roll) Ry(-yaw) Rx(pitch), nine numbers by rows; written into `out`. Yaw lies within a quarter turn. */
export function headAngles(rotation: Float64Array, out: HeadAngles): void {
  out.yawRad = Math.asin(Math.max(-1, Math.min(1, rotation[6])));
  out.pitchRad = Math.atan2(rotation[7], rotation[8]);
  out.rollRad = Math.atan2(rotation[3], rotation[0]);
}
