import {
  CALM_CHOICE,
  chooseViewer,
  createViewerChoice,
  type Candidate,
  type ChoiceRule,
} from '@oriel/shared/viewer/choose-viewer';
import { FIRST_STEP, LADDER_STEPS, type Looking } from '@oriel/shared/ladder/steps';
import { Acquisition, confirm, CONFIRM_PROBABILITY, landmarkRegion, nearestTo } from './acquisition';
import { Bystanders, type Bystander } from './bystanders';
import type { Detection } from './detection';
import type { FaceModels } from './face-models';
import {
  DETECTION_PROBABILITY,
  EXPECTED_FRAMES,
  EXPECTED_PROBABILITY,
  followingFrom,
  followingOf,
  MOST_GLIMPSES,
  probabilityFor,
  SAME_FACE,
  sameFace,
  type Expected,
  type Following,
} from './following';
import { shifted, type Eyes } from './guard';
import { Looks } from './looks';
import type { Picture } from './picture';
import { Placing } from './placing';
import { scaled, type Region } from './region';
import { SMEARED_RATIO } from './region-prediction';

/** A guarding look is this much wider than the landmarks' region: the zoom of a closer look over the margin of the region. */
const GUARD_WIDENING = 2.2 / 1.5;
/** A face of which the detector alone sees something is no farther from where it should be than this share of its region's side. */
const GLIMPSED_WITHIN = 0.3;

/**
 * Frames from one look at everybody else to the next: while nobody else is known (the look is for newcomers and has two halves), and
 * while somebody is. Twice as many where there is less time, which is where fewer than every fifth frame is guarded. Never in a
 * frame that is guarded; together with those fewer than half, so that the usual frame has one look.
 */
const NEWCOMERS_EVERY = 18;
const BYSTANDERS_EVERY = 6;
const SELDOM = 2;
const SELDOM_GUARDED = 5;

/**
 * Follows one face from frame to frame. While nobody is followed it seeks (see `Acquisition`); while someone is, landmarks are placed in
 * the predicted region and guarded, or the detector alone looks there, as `looking` says. A face lost is sought again in the same frame.
 */
export class Tracker {
  readonly looks: Looks;
  private readonly placing: Placing;
  /** How to look from the next frame on. */
  looking: Looking = LADDER_STEPS[FIRST_STEP].looking;
  /** Whom to follow of several. */
  choice: ChoiceRule = CALM_CHOICE;
  private readonly acquisition = new Acquisition();
  private following: Following | null = null;
  private expected: Expected | null = null;
  private seen: Detection | null = null;
  private lookedAt: number | null = null;
  private guarded = false;
  private sinceBystanders = 0;
  private ids = 0;
  private readonly bystanders = new Bystanders(() => ++this.ids);
  private readonly chosen = createViewerChoice();

  constructor(models: FaceModels) {
    this.looks = new Looks(models);
    this.placing = new Placing(this.looks);
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

  private get belief(): number {
    return this.seen?.score ?? this.placing.belief;
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
      this.turnToAnother(picture, timestampMs) || this.lookAgain(picture, timestampMs) || this.acquire(picture, timestampMs, viewer);
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
    const { rightEye, leftEye } = this.seen ?? this.placing.eyes;
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
        this.seen = seen;
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
    if (!this.placing.settle(picture, region, viewer.prediction.fast ? SMEARED_RATIO : undefined)) {
      const seen = this.guardLook(picture, region, EXPECTED_PROBABILITY);
      return this.replace(viewer, picture, seen, timestampMs) || this.glimpse(viewer, seen, timestampMs);
    }
    const eyes = this.placing.eyes;
    const { latest } = viewer.prediction;
    if (viewer.guard.due(eyes, this.looking.guardEvery, region.cx - latest.cx, region.cy - latest.cy)) {
      this.guarded = true;
      const seen = this.guardLook(picture, this.placing.region, probabilityFor(viewer));
      const verdict = viewer.guard.judge(eyes, seen);
      if (verdict === 'lost') return false;
      if (verdict === 'clings')
        return this.replace(viewer, picture, seen, timestampMs) || this.glimpse(viewer, seen, timestampMs);
    }
    this.measured(viewer, timestampMs);
    return true;
  }

  /** Takes in where the landmarks lie. */
  private measured(viewer: Following, timestampMs: number): void {
    viewer.glimpses = 0;
    viewer.eyes = this.placing.eyes;
    viewer.prediction.measure(this.placing.region, timestampMs);
  }

  /**
   * Goes on with what the detector saw of a face on which landmarks failed: where it is, not how large. It places a smeared face no better
   * than its motion foretells, and single eyes badly: so the eyes move on to midway between the two.
   */
  private glimpse(viewer: Following, seen: Detection | undefined, timestampMs: number): boolean {
    const { latest } = viewer.prediction;
    const due = viewer.prediction.at(timestampMs);
    if (!viewer.eyes || !seen || seen.score < probabilityFor(viewer)) return false;
    if (!sameFace(due, landmarkRegion(seen), GLIMPSED_WITHIN) || ++viewer.glimpses > MOST_GLIMPSES) return false;
    const cx = (due.cx + seen.cx) / 2;
    const cy = (due.cy + seen.cy) / 2;
    viewer.eyes = shifted(viewer.eyes, cx - latest.cx, cy - latest.cy);
    this.seen = { ...seen, ...viewer.eyes };
    viewer.prediction.measure({ ...latest, cx, cy }, timestampMs);
    return true;
  }

  private detect(viewer: Following, picture: Picture, region: Region, timestampMs: number): boolean {
    const seen = this.guardLook(picture, region);
    if (!seen) return false;
    this.seen = seen;
    viewer.prediction.measure(landmarkRegion(seen), timestampMs);
    return true;
  }

  /** Places the landmarks of the viewer anew from a detection, confirmed; false where that fails. */
  private replace(viewer: Following, picture: Picture, seen: Detection | undefined, timestampMs: number): boolean {
    const { latest } = viewer.prediction;
    const face = seen && confirm(this.looks, picture, seen, EXPECTED_PROBABILITY);
    // Someone else, or the same at quite another distance, must be seen as surely as a newcomer.
    if (!face || (face.score < CONFIRM_PROBABILITY && !sameFace(latest, landmarkRegion(face)))) return false;
    if (!this.placing.placeOn(picture, face, latest)) return false;
    viewer.guard.replaced(this.placing.eyes);
    this.measured(viewer, timestampMs);
    return true;
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
    const region = viewer.prediction.at(timestampMs);
    const seen = this.guardLook(picture, region, EXPECTED_PROBABILITY);
    if (!seen || !sameFace(region, landmarkRegion(seen))) return false;
    if (this.looking.by === 'detector') this.seen = seen;
    else if (!this.replace(viewer, picture, seen, timestampMs) && !this.glimpse(viewer, seen, timestampMs)) {
      viewer.prediction.measure(landmarkRegion(seen), timestampMs);
      return false;
    }
    this.chosen.chosen = viewer.id;
    this.following = viewer;
    return true;
  }

  /** Seeks a face anywhere; one found where someone lost just now, or expected, should be is theirs. */
  private acquire(picture: Picture, timestampMs: number, lost: Following | null): boolean {
    const byDetector = this.looking.by === 'detector';
    for (const face of this.acquisition.seek(this.looks, picture)) {
      if (byDetector) this.seen = face;
      else if (!this.placing.placeOn(picture, face)) {
        const viewer = followingFrom(++this.ids, timestampMs, landmarkRegion(face), timestampMs);
        this.expected ??= { viewer, framesLeft: EXPECTED_FRAMES };
        continue;
      }
      const region = byDetector ? landmarkRegion(face) : this.placing.region;
      const viewer =
        [lost, this.expected?.viewer].find((one) => one && sameFace(one.prediction.at(timestampMs), region)) ??
        followingFrom(++this.ids, timestampMs, region, timestampMs);
      if (byDetector) viewer.prediction.measure(region, timestampMs);
      else {
        viewer.guard.replaced(this.placing.eyes);
        this.measured(viewer, timestampMs);
      }
      this.following = viewer;
      this.chosen.chosen = viewer.id;
      return true;
    }
    return false;
  }

  /** The face in the middle of the region, not the one believed in most: that may be somebody's who is seen right beside it. */
  private guardLook(picture: Picture, region: Region, probability = DETECTION_PROBABILITY): Detection | undefined {
    const face = nearestTo(region, this.looks.short(picture, scaled(region, GUARD_WIDENING), probability));
    return face && Math.hypot(face.cx - region.cx, face.cy - region.cy) < SAME_FACE * region.size ? face : undefined;
  }
}

/** The landmarks' region against the detector's box of the same face: measured on rendered heads at 1.5 and 1.9 m. */
const BOX_TO_REGION = 1.67;

/** Someone as the choice knows them; off the axis in shares of the frame's width. */
const candidate = (
  { id, sinceMs }: { readonly id: number; readonly sinceMs: number },
  cx: number,
  cy: number,
  sizePx: number,
  { width, height }: Picture,
): Candidate => ({ id, sinceMs, sizePx, offAxis: Math.hypot(cx - width / 2, cy - height / 2) / width });
