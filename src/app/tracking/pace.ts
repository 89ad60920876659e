/** Frames a little early count all the same: cameras waver by a few ms, and every second frame of 30 a second is to pass for 15 a second. */
const EARLY_MS = 8;

/** Passes frames over so that no more than so many a second are looked at. */
export class Pace {
  private lastMs = -Infinity;

  /** Whether the frame of this time is to be looked at. */
  due(timestampMs: number, mostPerS: number): boolean {
    const since = timestampMs - this.lastMs;
    if (since >= 0 && since + EARLY_MS < 1000 / mostPerS) return false;
    this.lastMs = timestampMs;
    return mostPerS > 0;
  }
}
