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
import { RegionPrediction } from './region-prediction';

/** The landmark model's belief from which a face is taken to be there. */
const FACE_BELIEF = 0.5;
/** A guarding look is this much wider than the landmarks' region: the zoom of a closer look over the margin of the region. */
const GUARD_WIDENING = 2.2 / 1.5;
const DETECTION_PROBABILITY = 0.5;
/** A face farther from the middle of the region, as a share of its side, is somebody else's. */
const SAME_FACE = 0.5;
/** No face grows or shrinks by more from one frame to the next: at 4 m a second toward a camera half a metre away it would be 1.3. */
const MOST_GROWN = 1.15;

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

  /** The eyes of the face followed where the last look was the detector's alone. */
  get detected(): Eyes | null {
    return this.seen;
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
    const found = this.turnToAnother(picture, timestampMs) || this.acquire(picture, timestampMs);
    this.lookedAt = found ? this.chosen.chosen : null;
    return found ? this.belief : null;
  }

  /** Forgets everybody, as at a change of camera. */
  forget(): void {
    this.following = null;
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
    if (!this.place(picture, region) || (this.jumped(region) && !this.place(picture, regionOfLandmarks(this.points))))
      return this.replace(viewer, picture, this.guardLook(picture, region), timestampMs);
    const eyes = this.eyes();
    if (viewer.guard.due(eyes, this.looking.guardEvery)) {
      this.guarded = true;
      const seen = this.guardLook(picture, regionOfLandmarks(this.points));
      const verdict = viewer.guard.judge(eyes, seen);
      if (verdict === 'lost') return false;
      if (verdict === 'clings') return this.replace(viewer, picture, seen, timestampMs);
    }
    viewer.prediction.measure(regionOfLandmarks(this.points), timestampMs);
    return true;
  }

  /** Whether the face was of another size than the region it was looked for in: its own size is then not measured rightly. */
  private jumped(region: Region): boolean {
    const ratio = regionOfLandmarks(this.points).size / region.size;
    return ratio > MOST_GROWN || ratio < 1 / MOST_GROWN;
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
    const face = seen && confirm(this.looks, picture, seen);
    if (!face || !this.place(picture, landmarkRegion(face))) return false;
    viewer.guard.replaced(this.eyes());
    viewer.prediction.measure(regionOfLandmarks(this.points), timestampMs);
    return true;
  }

  private acquire(picture: Picture, timestampMs: number): boolean {
    for (const face of this.acquisition.seek(this.looks, picture)) {
      if (this.looking.by === 'detector') {
        this.take(face);
        this.begin(landmarkRegion(face), timestampMs);
        return true;
      }
      if (!this.place(picture, landmarkRegion(face))) continue;
      // A second look in the landmarks' own region: the detector's box is of another size, and measured scale depends on it.
      const region = regionOfLandmarks(this.points);
      if (!this.place(picture, region)) continue;
      this.begin(region, timestampMs).prediction.measure(regionOfLandmarks(this.points), timestampMs);
      return true;
    }
    return false;
  }

  private begin(region: Region, timestampMs: number): Following {
    const id = ++this.ids;
    this.chosen.chosen = id;
    return (this.following = {
      id,
      sinceMs: timestampMs,
      prediction: new RegionPrediction(region, timestampMs),
      guard: new Guard(),
    });
  }

  private place(picture: Picture, region: Region): boolean {
    this.belief = this.looks.landmarks(picture, region);
    return this.belief >= FACE_BELIEF;
  }

  /** The face in the middle of the region, not the one believed in most: that may be somebody's who is seen right beside it. */
  private guardLook(picture: Picture, region: Region): Detection | undefined {
    const face = nearestTo(region, this.looks.short(picture, scaled(region, GUARD_WIDENING), DETECTION_PROBABILITY));
    return face && Math.hypot(face.cx - region.cx, face.cy - region.cy) < SAME_FACE * region.size ? face : undefined;
  }

  private eyes(): Eyes {
    return { rightEye: rightEyeOf(this.points), leftEye: leftEyeOf(this.points) };
  }
}

/** The landmarks' region against the detector's box of the same face: measured on rendered heads at 1.5 and 1.9 m. */
const BOX_TO_REGION = 1.67;

const followingOf = ({ id, sinceMs, face }: Bystander, timestampMs: number): Following => ({
  id,
  sinceMs,
  prediction: new RegionPrediction(landmarkRegion(face), timestampMs),
  guard: new Guard(),
});

/** Someone as the choice knows them; off the axis in shares of the frame's width. */
const candidate = (
  { id, sinceMs }: { readonly id: number; readonly sinceMs: number },
  cx: number,
  cy: number,
  sizePx: number,
  { width, height }: Picture,
): Candidate => ({ id, sinceMs, sizePx, offAxis: Math.hypot(cx - width / 2, cy - height / 2) / width });
