/** Judged over this time from the first frame, ms. */
const periodMs = 1000;
/** Slower than 40 frames a second is poor: what follows a face must not stutter beside it. Practice. */
const poorMs = 25;
const mostFrames = 240;

/** Judges a renderer by the intervals between frames in its first second. */
export class IntervalJudge {
  private readonly intervals = new Float64Array(mostFrames);
  private count = 0;
  private firstMs = NaN;
  private lastMs = NaN;

  /** Takes the time of a frame; says once whether the median interval is poor, and undefined until then and afterwards. */
  frame(tMs: number): boolean | undefined {
    if (this.count < 0) return undefined;
    if (Number.isNaN(this.firstMs)) {
      this.firstMs = this.lastMs = tMs;
      return undefined;
    }
    if (this.count < mostFrames) this.intervals[this.count++] = tMs - this.lastMs;
    this.lastMs = tMs;
    if (tMs - this.firstMs < periodMs) return undefined;
    const median = this.intervals.subarray(0, this.count).sort()[this.count >> 1];
    this.count = -1;
    return median > poorMs;
  }
}
