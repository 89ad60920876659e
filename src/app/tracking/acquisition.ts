import type { Detection } from './detection';
import type { Looks } from './looks';
import type { Picture } from './picture';
import { eyeLineAngle, wholeFrame, type Region } from './region';
import { tilesOf } from './tiles';

/** A find may be this unsure, because every find is confirmed by a closer look. */
const FIND_PROBABILITY = 0.3;
/** What the closer look must be sure of. */
export const CONFIRM_PROBABILITY = 0.5;
/** A closer look shows this many times the face's box: the short-range detector was trained on faces of about that share. */
const ZOOM = 2.2;
/** The size has settled when one closer look agrees with the one before within this ratio. */
const SETTLED_RATIO = 1.2;
/** Finds not settled after this many closer looks are background. */
const MOST_LOOKS = 4;
/** Finds tried in one frame: more are left to the next frame. */
const MOST_FINDS = 2;

/** Frames from one full-range look at the whole frame to the next; between them it is the squares' turn. */
const WHOLE_EVERY = 30;
/** Squares less than this many times sharper than the whole frame take turns with it. */
const LITTLE_MORE = 1.5;

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

/** Of faces seen in one look, the one whose middle is nearest to where it was looked for: not somebody's beside it. */
export const nearestTo = (
  { cx, cy }: { readonly cx: number; readonly cy: number },
  faces: readonly Detection[],
): Detection | undefined => {
  const off = (face: Detection): number => Math.hypot(face.cx - cx, face.cy - cy);
  return faces.reduce<Detection | undefined>((best, face) => (best && off(best) <= off(face) ? best : face), undefined);
};

/**
 * Looks closer and closer at a find until two looks agree on its size; null where they never do. The detectors misjudge what is small
 * in their picture (the distance between the eyes up to 1.8 times too large), and landmarks placed on a wrong size cling to it.
 */
export function confirm(
  looks: Looks,
  picture: Picture,
  find: Detection,
  probability = CONFIRM_PROBABILITY,
): Detection | null {
  let face = find;
  for (let look = 0; look < MOST_LOOKS; look++) {
    const closer = nearestTo(face, looks.short(picture, closerLook(face), probability));
    if (!closer) return null;
    const ratio = boxSize(closer) / boxSize(face);
    face = closer;
    if (ratio < SETTLED_RATIO && ratio > 1 / SETTLED_RATIO) return face;
  }
  return null;
}

/**
 * Seeks a face where nobody is followed, with at most one full-range look a frame, whose finds are confirmed by closer looks: the whole
 * frame first, then a ring of squares, and a short-range look at the whole frame beside every second square, which sees at once who is
 * near. Where the squares would show little more than the whole frame does, they take turns with it. So a small face far away is found
 * within one round of the ring.
 */
export class Acquisition {
  private frame = 0;
  private nextTile = 0;

  /** Faces found and confirmed in this frame, best first; none most of the time. */
  seek(looks: Looks, picture: Picture): Detection[] {
    const whole = wholeFrame(picture.width, picture.height);
    const tiles = tilesOf(picture.width, picture.height);
    const frame = this.frame++;
    const takeTurns = tiles.length > 0 && whole.size < LITTLE_MORE * tiles[0].size;
    if (tiles.length === 0 || frame % WHOLE_EVERY === 0 || (takeTurns && frame % 2 === 0))
      return confirmed(looks, picture, looks.full(picture, whole, FIND_PROBABILITY));
    if (!takeTurns && frame % 2 === 0) {
      const near = confirmed(looks, picture, looks.short(picture, whole, CONFIRM_PROBABILITY));
      if (near.length > 0) return near;
    }
    return confirmed(
      looks,
      picture,
      looks.full(picture, tiles[this.nextTile++ % tiles.length], FIND_PROBABILITY),
    );
  }

  /** Starts anew with a look at the whole frame, as after losing someone. */
  restart(): void {
    this.frame = 0;
  }
}

const confirmed = (looks: Looks, picture: Picture, finds: readonly Detection[]): Detection[] =>
  finds
    .slice(0, MOST_FINDS)
    .map((find) => confirm(looks, picture, find))
    .filter((face) => face !== null);
