import type { Glass, ViewingZone } from '@oriel/shared/projection/types';
import type { DepthFrame } from '../../drawing/frames';

/*
 * A scene is drawn before its wall has a camera, so the sheet shows the camera one may expect: in the middle of the upper
 * frame, 60 degrees across (a common webcam; practice) with a picture of 16 by 9, turned toward the middle of the zone.
 */
const ABOVE_GLASS_MM = 20;
const HALF_ACROSS_RAD = Math.PI / 6;
const HALF_UP_RAD = Math.atan((Math.tan(HALF_ACROSS_RAD) * 9) / 16);

export interface AssumedCamera {
  /** In the view's shared coordinate, mm. */
  readonly across: number;
  /** The two edges of its field of view, as slopes: mm across for each mm away from the glass. */
  readonly slopes: readonly [number, number];
  readonly pitchDownDeg: number;
}

export function assumedCamera(view: DepthFrame['view'], glass: Glass, zone: ViewingZone): AssumedCamera {
  const across = view === 'plan' ? 0 : glass.heightMm / 2 + ABOVE_GLASS_MM;
  const height = glass.heightMm / 2 + ABOVE_GLASS_MM;
  const down = Math.atan2(height - (zone.lowestMm + zone.highestMm) / 2, (zone.nearestMm + zone.farthestMm) / 2);
  const slopes: [number, number] =
    view === 'plan'
      ? [-Math.tan(HALF_ACROSS_RAD), Math.tan(HALF_ACROSS_RAD)]
      : [-Math.tan(down + HALF_UP_RAD), Math.tan(HALF_UP_RAD - down)];
  return { across, slopes, pitchDownDeg: (down * 180) / Math.PI };
}
