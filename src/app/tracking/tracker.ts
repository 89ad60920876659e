import { FIRST_STEP, LADDER_STEPS, type Looking } from '@oriel/shared/ladder/steps';
import { Acquisition, confirm, landmarkRegion } from './acquisition';
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

/** Everything known of the viewer followed. */
interface Following {
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
  private readonly acquisition = new Acquisition();
  private following: Following | null = null;
  private belief = 0;
  private seen: Detection | null = null;

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

  /** Looks at one frame: the belief in the face followed, its landmarks in `points`; or null where nobody is. */
  look(picture: Picture, timestampMs: number): number | null {
    this.looks.reset();
    this.seen = null;
    if (this.following && this.follow(this.following, picture, timestampMs)) return this.belief;
    if (this.following) this.forget();
    return this.acquire(picture, timestampMs) ? this.belief : null;
  }

  /** Forgets the viewer, as at a change of camera. */
  forget(): void {
    this.following = null;
    this.acquisition.restart();
  }

  private follow(viewer: Following, picture: Picture, timestampMs: number): boolean {
    const region = viewer.prediction.at(timestampMs);
    if (this.looking.by === 'detector') return this.detect(viewer, picture, region, timestampMs);
    if (!this.place(picture, region))
      return this.replace(viewer, picture, this.guardLook(picture, region), timestampMs);
    const eyes = this.eyes();
    if (viewer.guard.due(eyes, this.looking.guardEvery)) {
      const seen = this.guardLook(picture, regionOfLandmarks(this.points));
      const verdict = viewer.guard.judge(eyes, seen);
      if (verdict === 'lost') return false;
      if (verdict === 'clings') return this.replace(viewer, picture, seen, timestampMs);
    }
    viewer.prediction.measure(regionOfLandmarks(this.points), timestampMs);
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
        this.following = { prediction: new RegionPrediction(landmarkRegion(face), timestampMs), guard: new Guard() };
        return true;
      }
      if (!this.place(picture, landmarkRegion(face))) continue;
      // A second look in the landmarks' own region: the detector's box is of another size, and measured scale depends on it.
      const region = regionOfLandmarks(this.points);
      if (!this.place(picture, region)) continue;
      this.following = { prediction: new RegionPrediction(region, timestampMs), guard: new Guard() };
      this.following.prediction.measure(regionOfLandmarks(this.points), timestampMs);
      return true;
    }
    return false;
  }

  private place(picture: Picture, region: Region): boolean {
    this.belief = this.looks.landmarks(picture, region);
    return this.belief >= FACE_BELIEF;
  }

  private guardLook(picture: Picture, region: Region): Detection | undefined {
    return this.looks.short(picture, scaled(region, GUARD_WIDENING), DETECTION_PROBABILITY)[0];
  }

  private eyes(): Eyes {
    return { rightEye: rightEyeOf(this.points), leftEye: leftEyeOf(this.points) };
  }
}
