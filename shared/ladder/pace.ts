/** Frames a little early count all the same: cameras waver by a few ms, and every second frame of 30 a second is to pass for 15 a second. */
const EARLY_MS = 8;

/** Passes frames over so that no more than so many a second are looked at: of 30, two of three are 20 a second. */
export class Pace {
  private dueMs = NaN;
  private lastMs = NaN;

  /** Whether the frame of this time is to be looked at. */
  due(timestampMs: number, mostPerS: number): boolean {
    if (mostPerS <= 0) return false;
    const begun = timestampMs >= this.lastMs;
    this.lastMs = timestampMs;
    if (begun && timestampMs + EARLY_MS < this.dueMs) return false;
    const intervalMs = 1000 / mostPerS;
    // Due times keep their rhythm, but what was missed is not made up for.
    this.dueMs = begun ? Math.max(this.dueMs, timestampMs - intervalMs) + intervalMs : timestampMs + intervalMs;
    return true;
  }
}
