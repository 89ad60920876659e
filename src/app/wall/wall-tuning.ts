import type { WallGlass, WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import type { Following } from '../player/viewpoint';
import type { TrackingSetUp } from '../tracking/face-tracking';

/** How the picture follows on this wall: what is tuned there, as the player's follower takes it. */
export function followingOn({ tuning }: Pick<WallSetUp, 'tuning'>): Following {
  const { filter, longestHorizonMs, appearMs, holdMs, returnMs, greatestMmPerS, displayDelayMs } = tuning;
  return { settings: { filter, longestHorizonMs, appearMs, holdMs, returnMs, greatestMmPerS }, displayDelayMs };
}

/** What tracking needs to know of this wall's camera and of its viewers. */
export function trackingOn({ camera, tuning }: Pick<WallSetUp, 'camera' | 'tuning'>): TrackingSetUp {
  const { position, pitchRad, yawRad, rollRad, hfovRad, mirrored } = camera;
  return {
    camera: { position, pitchRad, yawRad, rollRad, hfovRad, mirrored },
    viewer: { eyeDistanceMm: tuning.ipdMm.value, distanceFactor: tuning.scaleFactor },
    choice: tuning.choice,
  };
}

/** The few properties of `window` that say how fine this screen is. */
export interface ScreenFacts {
  readonly devicePixelRatio: number;
  readonly screen: { readonly width: number; readonly height: number };
}

/**
 * Size of a device pixel: the glass as it was measured over the pixels this screen has. The long edge over the long edge, so that a screen
 * that starts turned is not drawn too large.
 */
export function devicePxMmOn({ widthMm, heightMm }: Pick<WallGlass, 'widthMm' | 'heightMm'>, { devicePixelRatio, screen }: ScreenFacts): number {
  return Math.max(widthMm, heightMm) / (Math.max(screen.width, screen.height) * devicePixelRatio);
}
