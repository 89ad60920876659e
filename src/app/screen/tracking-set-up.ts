import { USUAL_VIEWER } from '@oriel/shared/viewer/eye-from-landmarks';
import type { TrackingSetUp } from '../tracking/face-tracking';
import { radians } from './screen-measure';
import { type ScreenSetUp, cameraPosition } from './screen-set-up';

/** What the tracking needs to know of a screen that was set up. */
export function trackingSetUp(setUp: ScreenSetUp): TrackingSetUp {
  const { camera } = setUp;
  return {
    camera: {
      position: cameraPosition(setUp),
      yawRad: 0,
      pitchRad: radians(-camera.downDegrees),
      rollRad: 0,
      hfovRad: radians(camera.fieldDegrees),
      mirrored: camera.mirrored,
    },
    viewer: USUAL_VIEWER,
  };
}
