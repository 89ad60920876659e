import { landmarkRegion } from './acquisition';
import type { Detection } from './detection';
import { leftEyeOf, regionOfLandmarks, rightEyeOf } from './face-landmarks';
import { differInSize, sameFace } from './following';
import type { Eyes } from './guard';
import type { Looks } from './looks';
import type { Picture } from './picture';
import type { Region } from './region';

/** The landmark model's belief from which a face is taken to be there. */
const FACE_BELIEF = 0.5;
/**
 * Landmarks in a region that is not of the face's own size are of a wrong scale, by a quarter of the difference (films of sudden changes
 * of distance, npm run bench:tracking): they are placed again, at most so many times. Someone coming at 1 m a second from 0.5 m grows by
 * 1.07 a frame.
 */
const MOST_GROWN = 1.08;
const SETTLED_RATIO = 1.02;
const MOST_SETTLING = 3;

/** Places landmarks on a face, until their region is of the face's own size. They stand in the points of `Looks`. */
export class Placing {
  /** The belief in the face on which landmarks were placed last. */
  belief = 0;

  constructor(private readonly looks: Looks) {}

  /** Where the landmarks have the eyes. */
  get eyes(): Eyes {
    return { rightEye: rightEyeOf(this.looks.points), leftEye: leftEyeOf(this.looks.points) };
  }

  /** The landmarks' own region. */
  get region(): Region {
    return regionOfLandmarks(this.looks.points);
  }

  /** Places landmarks in this region, and again in their own where that is of another size; whether they are believed. */
  settle(picture: Picture, region: Region, mostGrown = MOST_GROWN): boolean {
    let looked = region;
    let ratio = mostGrown;
    if (!this.place(picture, looked)) return false;
    for (let look = 0; look < MOST_SETTLING && differInSize(this.region, looked, ratio); look++) {
      looked = this.region;
      if (!this.place(picture, looked)) return false;
      ratio = SETTLED_RATIO;
    }
    return true;
  }

  /**
   * Places landmarks on a detected face, then in their own region: the detector's box is of another size, and scale depends on it. On a
   * smeared face the first may be believed and the second not; of a face that is about where `expected`, the first is then taken.
   */
  placeOn(picture: Picture, face: Detection, expected?: Region): boolean {
    const box = landmarkRegion(face);
    if (!this.place(picture, box)) return false;
    if (this.settle(picture, this.region)) return true;
    return expected !== undefined && sameFace(expected, box) && this.place(picture, box);
  }

  private place(picture: Picture, region: Region): boolean {
    this.belief = this.looks.landmarks(picture, region);
    return this.belief >= FACE_BELIEF;
  }
}
