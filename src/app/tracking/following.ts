import { landmarkRegion } from './acquisition';
import type { Bystander } from './bystanders';
import { Guard, type Eyes } from './guard';
import type { Region } from './region';
import { RegionPrediction } from './region-prediction';

/** Everything known of the viewer followed. */
export interface Following {
  readonly id: number;
  readonly sinceMs: number;
  readonly prediction: RegionPrediction;
  readonly guard: Guard;
  /** Where their eyes were last; null before landmarks bore them out. */
  eyes: Eyes | null;
  /** Frames in a row in which only the detector saw them. */
  glimpses: number;
}

/** Someone looked for where they should be by now, and for how many more frames. */
export interface Expected {
  readonly viewer: Following;
  framesLeft: number;
}

/** For so many frames someone just lost, or not yet borne out by landmarks, is looked for where they should be by now. */
export const EXPECTED_FRAMES = 8;
/** Where landmarks fail, the detector's eyes will do for so many frames in a row: a walker smeared by a dim camera, not a back of a head. */
export const MOST_GLIMPSES = 10;

export const DETECTION_PROBABILITY = 0.5;
/** The detector may be less sure of whoever was seen a moment ago, or is smeared by their motion. */
export const EXPECTED_PROBABILITY = 0.35;

/** A face farther from the middle of the region, as a share of its side, is somebody else's. */
export const SAME_FACE = 0.5;
/** So is one that differs more in size, or it is none: the detector's box is 0.9 of the landmarks' region, and varies with blur. */
const SAME_SIZE = 1.5;

/** Someone followed from now on, whose face fills this region. */
export const followingFrom = (id: number, sinceMs: number, region: Region, timestampMs: number): Following => ({
  id,
  sinceMs,
  prediction: new RegionPrediction(region, timestampMs),
  guard: new Guard(),
  eyes: null,
  glimpses: 0,
});

export const followingOf = ({ id, sinceMs, face }: Bystander, timestampMs: number): Following =>
  followingFrom(id, sinceMs, landmarkRegion(face), timestampMs);

/** How sure the detector must be of someone followed. */
export const probabilityFor = ({ prediction }: Following): number =>
  prediction.fast ? EXPECTED_PROBABILITY : DETECTION_PROBABILITY;

/** Whether one region is larger or smaller than the other by more than this ratio. */
export const differInSize = (a: Region, b: Region, ratio: number): boolean => a.size > b.size * ratio || a.size * ratio < b.size;

/** Whether two regions are of one face, of about one size and their middles within this share of it. */
export const sameFace = (a: Region, b: Region, within = SAME_FACE): boolean =>
  !differInSize(a, b, SAME_SIZE) && Math.hypot(a.cx - b.cx, a.cy - b.cy) < within * a.size;
