import { moved, scaled, type Region } from './region';

/** Share of the newest measured velocity in the one believed; the rest is what was believed before. */
const NEWEST_SHARE = 0.7;
/**
 * A region this near the last one, as a share of its size (and the same in radians), is taken over by a share a frame: it cuts the noise of
 * a face at rest, yet comes to the same size whatever came before, on which the measured scale depends. The size slowly, for the mouth of
 * someone talking makes the box of their face taller.
 */
const CALM_BAND = 0.03;
const CALM_SHARE = 0.2;
const CALM_SIZE_SHARE = 0.05;

/** A face that moves by more of its region's size a frame is smeared by most cameras, which draws it larger than it is: its size is believed less. */
const FAST_SHARE = 0.1;
const FAST_SIZE_SHARE = 0.3;
/** A face that differs in size by more than a smear makes it differ is another, or came nearer at a bound. */
export const SMEARED_RATIO = 1.25;
/** The natural logarithm of the most a face grows a frame as it comes nearer; more is a bound, which is not carried on. */
const MOST_GROWTH = 0.1;
/** Frames farther apart than this say nothing about velocity. */
const LONGEST_GAP_MS = 250;

const believed = (newest: number, before: number): number => NEWEST_SHARE * newest + (1 - NEWEST_SHARE) * before;

/** Whether two regions are one within the calm band. */
const nearlySame = (a: Region, b: Region): boolean =>
  Math.abs(a.cx - b.cx) < CALM_BAND * b.size &&
  Math.abs(a.cy - b.cy) < CALM_BAND * b.size &&
  Math.abs(a.size - b.size) < CALM_BAND * b.size &&
  Math.abs(a.angleRad - b.angleRad) < CALM_BAND;

/** The region a little of the way to another. */
const calmlyTo = (from: Region, to: Region): Region => ({
  cx: from.cx + CALM_SHARE * (to.cx - from.cx),
  cy: from.cy + CALM_SHARE * (to.cy - from.cy),
  size: from.size + CALM_SIZE_SHARE * (to.size - from.size),
  angleRad: from.angleRad + CALM_SHARE * (to.angleRad - from.angleRad),
});

/**
 * Where to look for the face in the next frame: the region of its last landmarks, carried on at its velocity and growth (0.7 of the newest
 * and 0.3 of the one before), but calmly while it hardly moves. Without it the region lags a face that walks past.
 */
export class RegionPrediction {
  private used: Region;
  private last: Region;
  private lastMs: number;
  private vx = 0;
  private vy = 0;
  /** By what share the size grows a millisecond. */
  private growth = 0;
  private movesFast = false;

  constructor(region: Region, timestampMs: number) {
    this.used = this.last = region;
    this.lastMs = timestampMs;
  }

  /** The region last measured. */
  get latest(): Region {
    return this.last;
  }

  /** Whether the face moves so fast that its picture is smeared. */
  get fast(): boolean {
    return this.movesFast;
  }

  /** The region to look at in the frame of this time. */
  at(timestampMs: number): Region {
    const gapMs = Math.min(Math.max(timestampMs - this.lastMs, 0), LONGEST_GAP_MS);
    const next = scaled(moved(this.last, this.vx * gapMs, this.vy * gapMs), Math.exp(this.growth * gapMs));
    this.used = nearlySame(next, this.used) ? calmlyTo(this.used, next) : next;
    return this.used;
  }

  /** Takes in the region measured in the frame of this time. */
  measure(region: Region, timestampMs: number): void {
    const gapMs = timestampMs - this.lastMs;
    const grown = Math.log(region.size / this.last.size);
    const known = gapMs > 0 && gapMs <= LONGEST_GAP_MS;
    if (known) {
      this.vx = believed((region.cx - this.last.cx) / gapMs, this.vx);
      this.vy = believed((region.cy - this.last.cy) / gapMs, this.vy);
    } else if (gapMs > 0) {
      this.vx = this.vy = 0;
    }
    this.movesFast = Math.hypot(this.vx, this.vy) * gapMs > FAST_SHARE * region.size;
    const smeared = this.movesFast && Math.abs(grown) < Math.log(SMEARED_RATIO);
    this.growth = known && !this.movesFast && Math.abs(grown) < MOST_GROWTH ? believed(grown / gapMs, this.growth) : 0;
    this.last = smeared ? scaled(region, Math.exp((FAST_SIZE_SHARE - 1) * grown)) : region;
    this.lastMs = timestampMs;
  }
}
