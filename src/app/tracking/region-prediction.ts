import { moved, type Region } from './region';

/** Share of the newest measured velocity in the one believed; the rest is what was believed before. */
const NEWEST_SHARE = 0.7;
/** A region this near the last one, as a share of its size (and the same in radians), is not moved: it cuts the noise of a face at rest. */
const DEAD_BAND = 0.03;
/** Frames farther apart than this say nothing about velocity. */
const LONGEST_GAP_MS = 250;

/** Whether two regions are one within the dead band. */
const nearlySame = (a: Region, b: Region): boolean =>
  Math.abs(a.cx - b.cx) < DEAD_BAND * b.size &&
  Math.abs(a.cy - b.cy) < DEAD_BAND * b.size &&
  Math.abs(a.size - b.size) < DEAD_BAND * b.size &&
  Math.abs(a.angleRad - b.angleRad) < DEAD_BAND;

/**
 * Where to look for the face in the next frame: the region of its last landmarks, carried on at its velocity (0.7 of the newest and 0.3
 * of the one before), but not moved at all within a dead band. Without it the region lags a face that walks past.
 */
export class RegionPrediction {
  private used: Region;
  private last: Region;
  private lastMs: number;
  private vx = 0;
  private vy = 0;

  constructor(region: Region, timestampMs: number) {
    this.used = this.last = region;
    this.lastMs = timestampMs;
  }

  /** The region last measured. */
  get latest(): Region {
    return this.last;
  }

  /** The region to look at in the frame of this time. */
  at(timestampMs: number): Region {
    const gapMs = Math.min(Math.max(timestampMs - this.lastMs, 0), LONGEST_GAP_MS);
    const next = moved(this.last, this.vx * gapMs, this.vy * gapMs);
    if (!nearlySame(next, this.used)) this.used = next;
    return this.used;
  }

  /** Takes in the region measured in the frame of this time. */
  measure(region: Region, timestampMs: number): void {
    const gapMs = timestampMs - this.lastMs;
    if (gapMs > 0 && gapMs <= LONGEST_GAP_MS) {
      this.vx = NEWEST_SHARE * ((region.cx - this.last.cx) / gapMs) + (1 - NEWEST_SHARE) * this.vx;
      this.vy = NEWEST_SHARE * ((region.cy - this.last.cy) / gapMs) + (1 - NEWEST_SHARE) * this.vy;
    } else if (gapMs > 0) {
      this.vx = this.vy = 0;
    }
    this.last = region;
    this.lastMs = timestampMs;
  }
}
