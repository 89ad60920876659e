import type { Detection } from './detection';
import type { Looks } from './looks';
import type { Picture } from './picture';
import { eyeLineAngle, wholeFrame, type Region } from './region';
import { tilesOf } from './tiles';

/** A find may be this unsure, because every find is confirmed by a closer look. */
const FIND_PROBABILITY = 0.3;
/** What the closer look must be sure of. */
const CONFIRM_PROBABILITY = 0.5;
/** A closer look shows this many times the face's box: the short-range detector was trained on faces of about that share. */
const ZOOM = 2.2;
/** The size has settled when one closer look agrees with the one before within this ratio. */
const SETTLED_RATIO = 1.2;
/** Finds not settled after this many closer looks are background. */
const MOST_LOOKS = 4;
/** Finds tried in one frame: more are left to the next frame. */
const MOST_FINDS = 2;

const boxSize = (face: Detection): number => Math.max(face.width, face.height);

/** The region for a closer look at a find, turned to its eye line. */
export const closerLook = (face: Detection, zoom = ZOOM): Region => ({
  cx: face.cx,
  cy: face.cy,
  size: boxSize(face) * zoom,
  angleRad: eyeLineAngle(face.rightEye, face.leftEye),
});

/** The region in which landmarks are sought for a detection: its box, enlarged as the landmark model was trained, along the eye line. */
export const landmarkRegion = (face: Detection): Region => closerLook(face, 1.5);

/**
 * Looks closer and closer at a find until two looks agree on its size; null where they never do. The detectors misjudge what is small
 * in their picture (the distance between the eyes up to 1.8 times too large), and landmarks placed on a wrong size cling to it.
 */
export function confirm(looks: Looks, picture: Picture, find: Detection): Detection | null {
  let face = find;
  for (let look = 0; look < MOST_LOOKS; look++) {
    const closer = looks.short(picture, closerLook(face), CONFIRM_PROBABILITY)[0];
    if (!closer) return null;
    const ratio = boxSize(closer) / boxSize(face);
    face = closer;
    if (ratio < SETTLED_RATIO && ratio > 1 / SETTLED_RATIO) return face;
  }
  return null;
}

/**
 * Seeks a face where nobody is followed: each frame one full-range look at the whole frame and one at the next of a ring of squares,
 * every find confirmed by closer looks. Small faces far away are found within one round of the ring.
 */
export class Acquisition {
  private nextTile = 0;

  /** Faces found and confirmed in this frame, best first; none most of the time. */
  seek(looks: Looks, picture: Picture): Detection[] {
    const whole = this.confirmed(
      looks,
      picture,
      looks.full(picture, wholeFrame(picture.width, picture.height), FIND_PROBABILITY),
    );
    if (whole.length > 0) return whole;
    const tiles = tilesOf(picture.width, picture.height);
    if (tiles.length === 0) return [];
    this.nextTile = (this.nextTile + 1) % tiles.length;
    return this.confirmed(looks, picture, looks.full(picture, tiles[this.nextTile], FIND_PROBABILITY));
  }

  private confirmed(looks: Looks, picture: Picture, finds: readonly Detection[]): Detection[] {
    return finds
      .slice(0, MOST_FINDS)
      .map((find) => confirm(looks, picture, find))
      .filter((face) => face !== null);
  }
}
