import type { Glass, ViewingZone } from '@oriel/shared/projection/types';
import { upFromAcross } from '@oriel/shared/viewer/field-of-view';
import { usualCamera } from '@oriel/shared/viewer/usual-camera';
import type { DepthFrame } from '../../drawing/frames';

/*
 * A scene is drawn before its wall has a camera, so the sheet shows the camera one may expect, with a picture of 16 by 9.
 */

export interface AssumedCamera {
  /** In the view's shared coordinate, mm. */
  readonly across: number;
  /** The two edges of its field of view, as slopes: mm across for each mm away from the glass. */
  readonly slopes: readonly [number, number];
  readonly pitchDownDeg: number;
}

export function assumedCamera(view: DepthFrame['view'], glass: Glass, zone: ViewingZone): AssumedCamera {
  const { position, pitchRad, hfovRad } = usualCamera(glass, zone);
  const halfUp = upFromAcross(hfovRad, 16, 9) / 2;
  const slopes: [number, number] =
    view === 'plan' ? [-Math.tan(hfovRad / 2), Math.tan(hfovRad / 2)] : [Math.tan(pitchRad - halfUp), Math.tan(pitchRad + halfUp)];
  return { across: view === 'plan' ? position.x : position.y, slopes, pitchDownDeg: (-pitchRad * 180) / Math.PI };
}
