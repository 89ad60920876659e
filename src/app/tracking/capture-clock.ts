/** Differences within this width count as one: the clocks agree to a fifth of it. */
const BIN_MS = 1;
/** Agreements needed before the clock is believed. */
const LEAST_AGREEING = 10;
/** A frame is answered after it was captured; the quickest of them within this. */
const LONGEST_DELAY_MS = 1000;
/** Most instants kept of each kind: three seconds of a fast camera. */
const MOST_KEPT = 200;

/**
 * Finds when frames were captured. A camera frame's timestamp is on a clock of its own; the same track played in a video element tells
 * when frames were captured on the page's clock, but not which. The commonest difference between the two, over all pairs, is that
 * between the clocks: the true pairs all share it, the false ones scatter or are fewer. An even camera's false pairs can agree too, a
 * whole number of frames off; of those, none that would have a frame answered before it was captured, or long after, is believed.
 */
export class CaptureClock {
  private readonly timestamps: number[] = [];
  private readonly captures: number[] = [];
  /** The least by which an answer's time on the page's clock is beyond its frame's timestamp. */
  private mostMs = Infinity;

  /** A frame's own timestamp, and when the page had what was seen in it. */
  noteFrame(timestampMs: number, answeredMs: number): void {
    this.mostMs = Math.min(this.mostMs, answeredMs - timestampMs);
    if (this.timestamps.length < MOST_KEPT) this.timestamps.push(timestampMs);
  }

  /** When some frame was captured, on the page's clock. */
  noteCapture(captureMs: number): void {
    if (this.captures.length < MOST_KEPT) this.captures.push(captureMs);
  }

  /** What to add to a timestamp to have it on the page's clock; null while too few pairs agree. */
  offsetMs(): number | null {
    const differences = this.captures
      .flatMap((capture) => this.timestamps.map((timestamp) => capture - timestamp))
      .filter((difference) => difference <= this.mostMs && difference >= this.mostMs - LONGEST_DELAY_MS)
      .sort((a, b) => a - b);
    let first = 0;
    let best = { from: 0, count: 0 };
    differences.forEach((difference, last) => {
      while (difference - differences[first] > BIN_MS) first++;
      if (last - first + 1 > best.count) best = { from: first, count: last - first + 1 };
    });
    if (best.count < LEAST_AGREEING) return null;
    return differences[best.from + Math.floor(best.count / 2)];
  }
}
