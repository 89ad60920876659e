const frames = 240;
const samples = 120;
const second = 1000;

/** Counts frames and delays for the read-out; taking one in allocates nothing. */
export class Meter {
  private readonly frameMs = new Float64Array(frames).fill(-Infinity);
  private readonly delayMs = new Float64Array(samples);
  private framesTaken = 0;
  private delaysTaken = 0;
  private usedMs = NaN;

  /** A frame was drawn at `tMs`. */
  frame(tMs: number): void {
    this.frameMs[this.framesTaken++ % frames] = tMs;
  }

  /** What was captured at `capturedMs` went into the picture drawn at `drawnMs`; counted the first time only. */
  drawn(capturedMs: number, drawnMs: number): void {
    if (capturedMs === this.usedMs) return;
    this.usedMs = capturedMs;
    this.delayMs[this.delaysTaken++ % samples] = drawnMs - capturedMs;
  }

  /** Frames in the second up to `tMs`. */
  framesPerSecond(tMs: number): number {
    let count = 0;
    for (const ms of this.frameMs) if (ms > tMs - second && ms <= tMs) count++;
    return count;
  }

  /** Median time from capture to drawing of the last samples, ms; null before the first. */
  captureToDrawnMs(): number | null {
    const count = Math.min(this.delaysTaken, samples);
    return count ? this.delayMs.slice(0, count).sort()[count >> 1] : null;
  }
}
