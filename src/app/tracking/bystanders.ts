import { closerLook, confirm, landmarkRegion, nearestTo } from './acquisition';
import type { Detection } from './detection';
import type { Looks } from './looks';
import type { Picture } from './picture';
import { wholeFrame, type Region } from './region';
import { tilesOf } from './tiles';

/** Someone in the picture who is not followed, as the detectors see them now and then. */
export interface Bystander {
  readonly id: number;
  readonly sinceMs: number;
  face: Detection;
  misses: number;
}

const FIND_PROBABILITY = 0.3;
const SEEN_PROBABILITY = 0.5;
/** Looks in a row that may not see a bystander before they are taken to have gone. */
const MOST_MISSES = 2;
const MOST_BYSTANDERS = 8;
/** While somebody is known, one look of so many is for newcomers. */
const SEEK_EVERY = 4;

/**
 * Keeps an eye on everybody else while one is followed, with one cheap look each time it is asked: the second half of a full-range look,
 * or at a find that wants confirming; else at those who are known, or the first half of a full-range look for newcomers (by turns at the
 * whole frame and at the next of its squares).
 */
export class Bystanders {
  readonly all: Bystander[] = [];
  private find: Detection | null = null;
  private halfSought = false;
  private turn = 0;
  private sought = 0;
  private nextTile = 0;
  private nextKnown = 0;

  constructor(private readonly newId: () => number) {}

  /** Whether a look is half done, or a find waits for a closer look. */
  get unfinished(): boolean {
    return this.halfSought || this.find !== null;
  }

  /** Looks once; `followed` is the region of the face that is followed and is nobody else. */
  look(looks: Looks, picture: Picture, followed: Region, timestampMs: number): void {
    const { find } = this;
    if (find) {
      this.find = null;
      const face = confirm(looks, picture, find);
      if (face && !sameFace(landmarkRegion(face), followed) && !this.known(face)) this.add(face, timestampMs);
    } else if (this.halfSought) {
      this.halfSought = false;
      this.takeIn(looks.finishFull(FIND_PROBABILITY), followed);
    } else if (this.turn++ % SEEK_EVERY === 0 || this.all.length === 0) {
      this.halfSought = true;
      looks.beginFull(picture, this.nextRegion(picture));
    } else {
      this.lookAgain(looks, picture, followed);
    }
  }

  /** Takes out the one of this id, who is followed from now on. */
  take(id: number): Bystander | null {
    const at = this.all.findIndex((one) => one.id === id);
    return at < 0 ? null : this.all.splice(at, 1)[0];
  }

  /** Puts back one who is followed no longer. */
  put(bystander: Bystander): void {
    if (this.all.length < MOST_BYSTANDERS) this.all.push(bystander);
  }

  clear(): void {
    this.all.length = 0;
    this.find = null;
    this.halfSought = false;
  }

  private add(face: Detection, timestampMs: number): void {
    this.put({ id: this.newId(), sinceMs: timestampMs, face, misses: 0 });
  }

  private known(face: Detection): Bystander | undefined {
    const region = landmarkRegion(face);
    return this.all.find((one) => sameFace(landmarkRegion(one.face), region));
  }

  /** The whole frame, where most newcomers are seen, and a square by turns. */
  private nextRegion({ width, height }: Picture): Region {
    const tiles = tilesOf(width, height);
    const whole = tiles.length === 0 || this.sought++ % 2 === 0;
    return whole ? wholeFrame(width, height) : tiles[this.nextTile++ % tiles.length];
  }

  private takeIn(faces: readonly Detection[], followed: Region): void {
    for (const face of faces) {
      if (sameFace(landmarkRegion(face), followed)) continue;
      const known = this.known(face);
      if (known) known.face = movedTo(known.face, face.cx, face.cy);
      else this.find ??= face;
    }
  }

  private lookAgain(looks: Looks, picture: Picture, followed: Region): void {
    const at = this.nextKnown++ % this.all.length;
    const one = this.all[at];
    const seen = nearestTo(one.face, looks.short(picture, closerLook(one.face), SEEN_PROBABILITY));
    const other = seen && this.known(seen);
    if (seen && !sameFace(landmarkRegion(seen), followed) && (!other || other === one)) {
      one.face = seen;
      one.misses = 0;
    } else if (++one.misses >= MOST_MISSES) {
      this.all.splice(at, 1);
    }
  }
}

/** Nearer than this share of the smaller region, two are of one face; someone near is large, and others are seen right beside them. */
const SAME_FACE = 0.55;

/** Whether two landmark regions are of one face, by where their middles lie: detectors misjudge sizes. */
const sameFace = (a: Region, b: Region): boolean =>
  Math.hypot(a.cx - b.cx, a.cy - b.cy) < SAME_FACE * Math.min(a.size, b.size);

/** The face at another place; the full-range detector's sizes are not to be trusted. */
const movedTo = (face: Detection, cx: number, cy: number): Detection => {
  const shift = ({ x, y }: { readonly x: number; readonly y: number }) => ({
    x: x + cx - face.cx,
    y: y + cy - face.cy,
  });
  return { ...face, cx, cy, rightEye: shift(face.rightEye), leftEye: shift(face.leftEye) };
};
