import {
  CALM_CHOICE,
  chooseViewer,
  createViewerChoice,
  type Candidate,
  type ChoiceRule,
} from '@oriel/shared/viewer/choose-viewer';
import { FIRST_STEP, LADDER_STEPS, type Looking } from '@oriel/shared/ladder/steps';
import { Acquisition, confirm, landmarkRegion, nearestTo } from './acquisition';
import { Bystanders, type Bystander } from './bystanders';
import type { Detection } from './detection';
import { leftEyeOf, regionOfLandmarks, rightEyeOf } from './face-landmarks';
import type { FaceModels } from './face-models';
import { Guard, type Eyes } from './guard';
import { Looks } from './looks';
import type { Picture } from './picture';
import { scaled, type Region } from './region';
import { RegionPrediction, SMEARED_RATIO } from './region-prediction';

/** The landmark model's belief from which a face is taken to be there. */
const FACE_BELIEF = 0.5;
/** A guarding look is this much wider than the landmarks' region: the zoom of a closer look over the margin of the region. */
const GUARD_WIDENING = 2.2 / 1.5;
const DETECTION_PROBABILITY = 0.5;
/** A face farther from the middle of the region, as a share of its side, is somebody else's. */
const SAME_FACE = 0.5;
/**
 * Landmarks in a region that is not of the face's own size are of a wrong scale, by a quarter of the difference (outside films of sudden
 * changes): they are placed again, at most so many times. Someone coming at 1 m a second from 0.5 m grows by 1.07 a frame.
 */
const MOST_GROWN = 1.08;
const SETTLED_RATIO = 1.02;
const MOST_SETTLING = 3;
/** Where landmarks fail, the detector's eyes will do for so many frames in a row: a walker smeared by a dim camera, not a back of a head. */
const MOST_GLIMPSES = 10;
/** And the face must be about as large as it was: the detector's box is 0.9 of the landmarks' region, and varies with blur. */
const GLIMPSED_RATIO = 1.5;
/** And no farther from where it should be than this share of the region's side. */
const GLIMPSED_WITHIN = 0.3;
/** For so many frames someone just lost, or not yet borne out by landmarks, is looked for where they should be by now. */
const EXPECTED_FRAMES = 8;
/** There, and on a face smeared by its motion, the detector may be less sure: somebody was seen a moment ago. */
const EXPECTED_PROBABILITY = 0.35;

/**
 * Frames from one look at everybody else to the next: while nobody else is known (the look is for newcomers and has two halves), and
 * while somebody is. Twice as many where there is less time, which is where fewer than every fifth frame is guarded. Never in a
 * frame that is guarded; together with those fewer than half, so that the usual frame has one look.
 */
const NEWCOMERS_EVERY = 18;
const BYSTANDERS_EVERY = 6;
const SELDOM = 2;
const SELDOM_GUARDED = 5;

/** Everything known of the viewer followed. */
interface Following {
  readonly id: number;
  readonly sinceMs: number;
  readonly prediction: RegionPrediction;
  readonly guard: Guard;
  /** Frames in a row in which only the detector saw them. */
  glimpses: number;
}

/** Someone looked for where they should be by now, and for how many more frames. */
interface Expected {
  readonly viewer: Following;
  framesLeft: number;
}

/**
 * Follows one face from frame to frame. While nobody is followed it seeks (see `Acquisition`); while someone is, landmarks are placed in
 * the predicted region and guarded, or the detector alone looks there, as `looking` says. A face lost is sought again in the same frame.
 */
export class Tracker {
  readonly looks: Looks;
  /** How to look from the next frame on. */
  looking: Looking = LADDER_STEPS[FIRST_STEP].looking;
  /** Whom to follow of several. */
  choice: ChoiceRule = CALM_CHOICE;
  private readonly acquisition = new Acquisition();
  private following: Following | null = null;
  private expected: Expected | null = null;
  private belief = 0;
  private seen: Detection | null = null;
  private lookedAt: number | null = null;
  private guarded = false;
  private sinceBystanders = 0;
  private ids = 0;
  private readonly bystanders = new Bystanders(() => ++this.ids);
  private readonly chosen = createViewerChoice();

  constructor(models: FaceModels) {
    this.looks = new Looks(models);
  }

  /** Landmarks of the face followed, in frame pixels, x, y, z each; meaningful after `look` gave a belief and `detected` is null. */
  get points(): Float64Array {
    return this.looks.points;
  }

  /** The eyes of the face followed where the last look was the detector's alone: by choice, or because landmarks failed. */
  get detected(): Eyes | null {
    return this.seen;
  }

  /** Whether landmarks failed on a face that is followed by them, which the detector saw. */
  get glimpsed(): boolean {
    return this.seen !== null && this.looking.by === 'landmarks';
  }

  /** Whom the last look was at: a number of their own for as long as they are there; null while nobody is followed. */
  get viewer(): number | null {
    return this.lookedAt;
  }

  /** Everybody else who is known to be there; the same array each time. */
  get others(): readonly Bystander[] {
    return this.bystanders.all;
  }

  /** Looks at one frame: the belief in the face followed, its landmarks in `points`; or null where nobody is. */
  look(picture: Picture, timestampMs: number): number | null {
    this.looks.reset();
    this.seen = null;
    this.guarded = false;
    const viewer = this.following;
    if (viewer && this.follow(viewer, picture, timestampMs)) {
      this.lookedAt = viewer.id;
      this.lookAround(viewer, picture, timestampMs);
      return this.belief;
    }
    this.following = null;
    if (viewer) this.acquisition.restart();
    const found =
      this.turnToAnother(picture, timestampMs) || this.lookAgain(picture, timestampMs) || this.acquire(picture, timestampMs);
    if (found) this.expected = null;
    else if (viewer) this.expected = { viewer, framesLeft: EXPECTED_FRAMES };
    this.lookedAt = found ? this.chosen.chosen : null;
    return found ? this.belief : null;
  }

  /** Forgets everybody, as at a change of camera. */
  forget(): void {
    this.following = this.expected = null;
    this.bystanders.clear();
    this.acquisition.restart();
  }

  /** Sees who else is there, now and then, and hands over to another where the rule says so: from the next frame on. */
  private lookAround(viewer: Following, picture: Picture, timestampMs: number): void {
    const often = this.looking.by === 'landmarks' && this.looking.guardEvery <= SELDOM_GUARDED;
    const every = (this.bystanders.all.length > 0 ? BYSTANDERS_EVERY : NEWCOMERS_EVERY) * (often ? 1 : SELDOM);
    this.sinceBystanders++;
    if (!this.guarded && (this.sinceBystanders >= every || this.bystanders.unfinished)) {
      this.sinceBystanders = 0;
      this.bystanders.look(this.looks, picture, viewer.prediction.latest, timestampMs);
    }
    if (this.bystanders.all.length === 0) {
      this.chosen.chosen = viewer.id;
      return;
    }
    const { cx, cy, size } = viewer.prediction.latest;
    const followed = candidate(viewer, cx, cy, size, picture);
    const id = chooseViewer(this.chosen, [followed, ...this.candidates(picture)], timestampMs, this.choice);
    const another = id === viewer.id ? null : this.bystanders.take(id ?? 0);
    if (!another) return;
    const { rightEye, leftEye } = this.seen ?? this.eyes();
    const box = size / BOX_TO_REGION;
    const face = { score: this.belief, cx, cy, width: box, height: box, rightEye, leftEye };
    this.bystanders.put({ id: viewer.id, sinceMs: viewer.sinceMs, misses: 0, face });
    this.following = followingOf(another, timestampMs);
  }

  /** Where the one followed is gone but others are known, the best of these is followed at once. */
  private turnToAnother(picture: Picture, timestampMs: number): boolean {
    while (this.bystanders.all.length > 0) {
      const id = chooseViewer(this.chosen, this.candidates(picture), timestampMs, this.choice);
      const another = this.bystanders.take(id ?? 0);
      if (!another) return false;
      this.following = followingOf(another, timestampMs);
      const seen = this.guardLook(picture, landmarkRegion(another.face));
      if (seen && this.looking.by === 'detector') {
        this.take(seen);
        return true;
      }
      if (this.replace(this.following, picture, seen, timestampMs)) return true;
      this.following = null;
    }
    return false;
  }

  private candidates(picture: Picture): Candidate[] {
    return this.bystanders.all.map((one) =>
      candidate(one, one.face.cx, one.face.cy, one.face.width * BOX_TO_REGION, picture),
    );
  }

  private follow(viewer: Following, picture: Picture, timestampMs: number): boolean {
    const region = viewer.prediction.at(timestampMs);
    if (this.looking.by === 'detector') return this.detect(viewer, picture, region, timestampMs);
    if (!this.settle(picture, region, viewer.prediction.fast ? SMEARED_RATIO : MOST_GROWN)) {
      const seen = this.guardLook(picture, region, EXPECTED_PROBABILITY);
      return this.replace(viewer, picture, seen, timestampMs) || this.glimpse(viewer, seen, timestampMs);
    }
    const eyes = this.eyes();
    const { latest } = viewer.prediction;
    if (viewer.guard.due(eyes, this.looking.guardEvery, region.cx - latest.cx, region.cy - latest.cy)) {
      this.guarded = true;
      const seen = this.guardLook(picture, regionOfLandmarks(this.points), probabilityFor(viewer));
      const verdict = viewer.guard.judge(eyes, seen);
      if (verdict === 'lost') return false;
      if (verdict === 'clings') return this.replace(viewer, picture, seen, timestampMs);
    }
    this.measured(viewer, timestampMs);
    return true;
  }

  /** Takes in where the landmarks lie. */
  private measured(viewer: Following, timestampMs: number): void {
    viewer.glimpses = 0;
    viewer.prediction.measure(regionOfLandmarks(this.points), timestampMs);
  }

  /** Goes on with what the detector saw of a face on which landmarks failed: where it is, not how large. */
  private glimpse(viewer: Following, seen: Detection | undefined, timestampMs: number): boolean {
    const { latest } = viewer.prediction;
    const due = viewer.prediction.at(timestampMs);
    if (!seen || seen.score < probabilityFor(viewer) || differInSize(landmarkRegion(seen), latest, GLIMPSED_RATIO)) return false;
    if (Math.hypot(seen.cx - due.cx, seen.cy - due.cy) > GLIMPSED_WITHIN * due.size) return false;
    if (++viewer.glimpses > MOST_GLIMPSES) return false;
    this.take(seen);
    viewer.prediction.measure({ ...latest, cx: seen.cx, cy: seen.cy }, timestampMs);
    return true;
  }

  /** Places landmarks in this region, and again in their own until it is of the face's size; whether they are believed. */
  private settle(picture: Picture, region: Region, mostGrown = MOST_GROWN): boolean {
    let looked = region;
    if (!this.place(picture, looked)) return false;
    let ratio = mostGrown;
    for (let look = 0; look < MOST_SETTLING && differInSize(regionOfLandmarks(this.points), looked, ratio); look++) {
      looked = regionOfLandmarks(this.points);
      if (!this.place(picture, looked)) return false;
      ratio = SETTLED_RATIO;
    }
    return true;
  }

  private detect(viewer: Following, picture: Picture, region: Region, timestampMs: number): boolean {
    const seen = this.guardLook(picture, region);
    if (!seen) return false;
    this.take(seen);
    viewer.prediction.measure(landmarkRegion(seen), timestampMs);
    return true;
  }

  private take(seen: Detection): void {
    this.seen = seen;
    this.belief = seen.score;
  }

  /** Places the landmarks of the viewer anew from a detection, confirmed; false where that fails. */
  private replace(viewer: Following, picture: Picture, seen: Detection | undefined, timestampMs: number): boolean {
    const face = seen && confirm(this.looks, picture, seen, EXPECTED_PROBABILITY);
    if (!face || !this.placeIn(picture, face)) return false;
    viewer.guard.replaced(this.eyes());
    this.measured(viewer, timestampMs);
    return true;
  }

  /**
   * Places landmarks on a detected face, then in their own region: the detector's box is of another size, and scale depends on it. On a
   * smeared face the first may be believed and the second not; then the first is taken.
   */
  private placeIn(picture: Picture, face: Detection): boolean {
    const box = landmarkRegion(face);
    return this.place(picture, box) && (this.settle(picture, regionOfLandmarks(this.points)) || this.place(picture, box));
  }

  /** Looks for someone lost a moment ago, or not yet borne out by landmarks, where they should be by now. */
  private lookAgain(picture: Picture, timestampMs: number): boolean {
    const { expected } = this;
    if (!expected) return false;
    if (expected.framesLeft-- === 0) {
      this.expected = null;
      return false;
    }
    const { viewer } = expected;
    const seen = this.guardLook(picture, viewer.prediction.at(timestampMs), EXPECTED_PROBABILITY);
    if (!seen) return false;
    if (this.looking.by === 'detector') this.take(seen);
    else if (!this.replace(viewer, picture, seen, timestampMs) && !this.glimpse(viewer, seen, timestampMs)) {
      viewer.prediction.measure(landmarkRegion(seen), timestampMs);
      return false;
    }
    this.chosen.chosen = viewer.id;
    this.following = viewer;
    return true;
  }

  private acquire(picture: Picture, timestampMs: number): boolean {
    for (const face of this.acquisition.seek(this.looks, picture)) {
      if (this.looking.by === 'detector') this.take(face);
      else if (!this.placeIn(picture, face)) {
        // Not to be told of before landmarks bear them out: how far away they are is not known.
        const viewer = { ...this.newcomer(landmarkRegion(face), timestampMs), glimpses: MOST_GLIMPSES };
        this.expected ??= { viewer, framesLeft: EXPECTED_FRAMES };
        continue;
      }
      const region = this.looking.by === 'detector' ? landmarkRegion(face) : regionOfLandmarks(this.points);
      this.following = this.newcomer(region, timestampMs);
      this.chosen.chosen = this.following.id;
      return true;
    }
    return false;
  }

  private newcomer(region: Region, timestampMs: number): Following {
    return {
      id: ++this.ids,
      sinceMs: timestampMs,
      prediction: new RegionPrediction(region, timestampMs),
      guard: new Guard(),
      glimpses: 0,
    };
  }

  private place(picture: Picture, region: Region): boolean {
    this.belief = this.looks.landmarks(picture, region);
    return this.belief >= FACE_BELIEF;
  }

  /** The face in the middle of the region, not the one believed in most: that may be somebody's who is seen right beside it. */
  private guardLook(picture: Picture, region: Region, probability = DETECTION_PROBABILITY): Detection | undefined {
    const face = nearestTo(region, this.looks.short(picture, scaled(region, GUARD_WIDENING), probability));
    return face && Math.hypot(face.cx - region.cx, face.cy - region.cy) < SAME_FACE * region.size ? face : undefined;
  }

  private eyes(): Eyes {
    return { rightEye: rightEyeOf(this.points), leftEye: leftEyeOf(this.points) };
  }
}

/** How sure the detector must be of someone followed. */
const probabilityFor = ({ prediction }: Following): number => (prediction.fast ? EXPECTED_PROBABILITY : DETECTION_PROBABILITY);

/** Whether one region is larger or smaller than the other by more than this ratio. */
const differInSize = (a: Region, b: Region, ratio: number): boolean => a.size > b.size * ratio || a.size * ratio < b.size;

/** The landmarks' region against the detector's box of the same face: measured on rendered heads at 1.5 and 1.9 m. */
const BOX_TO_REGION = 1.67;

const followingOf = ({ id, sinceMs, face }: Bystander, timestampMs: number): Following => ({
  id,
  sinceMs,
  prediction: new RegionPrediction(landmarkRegion(face), timestampMs),
  guard: new Guard(),
  glimpses: 0,
});

/** Someone as the choice knows them; off the axis in shares of the frame's width. */
const candidate = (
  { id, sinceMs }: { readonly id: number; readonly sinceMs: number },
  cx: number,
  cy: number,
  sizePx: number,
  { width, height }: Picture,
): Candidate => ({ id, sinceMs, sizePx, offAxis: Math.hypot(cx - width / 2, cy - height / 2) / width });
