import type { TrackingSetUp } from '../tracking/face-tracking';
import { radians } from './screen-measure';
import { type ScreenSetUp, cameraPosition } from './screen-set-up';

/** Mean of adults (N. Dodgson, 2004); until the viewer is measured. */
const usualIpdMm = 63;
/** Measured over true distance of a mean face at the tracker's own region size; until the viewer is measured. */
const usualScaleFactor = 1;

/** What the tracking needs to know of a screen that was set up. */
export function trackingSetUp(setUp: ScreenSetUp): TrackingSetUp {
  const { camera } = setUp;
  const { x, y, z } = cameraPosition(setUp);
  return {
    camera: {
      xMm: x, yMm: y, zMm: z,
      yawRad: 0, pitchRad: radians(-camera.downDegrees), rollRad: 0,
      hfovRad: radians(camera.fieldDegrees),
      mirrored: camera.mirrored,
    },
    ipdMm: usualIpdMm,
    scaleFactor: usualScaleFactor,
  };
}
