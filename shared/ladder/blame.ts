/** Whether tracking is to blame where frames are drawn slowly. */
export interface Blame {
  /** Takes in the interval between drawn frames of a second, ms; null where nothing was to be measured. */
  hear(frameMs: number | null): void;
  /** Whether frames are slow, and tracking might be what slows them. */
  lies(frameMs: number | null): frameMs is number;
  /** Asked before tracking gives way: false where it gave way before and the interval has not come down. */
  stillLies(frameMs: number): boolean;
  gaveWay(frameMs: number): void;
}

/** Drawing is relieved when its interval has come down to this share of what it was. */
const RELIEVED = 0.9;

/** Where less tracking did not help the drawing, tracking is not to blame until frames are drawn well again. */
export function createBlame(budgetMs: number): Blame {
  let gaveWayAtMs: number | null = null;
  let blameless = false;
  return {
    hear(frameMs) {
      if (frameMs === null || frameMs > budgetMs) return;
      blameless = false;
      gaveWayAtMs = null;
    },
    lies: (frameMs): frameMs is number => frameMs !== null && frameMs > budgetMs && !blameless,
    stillLies(frameMs) {
      if (gaveWayAtMs === null || frameMs <= RELIEVED * gaveWayAtMs) return true;
      blameless = true;
      gaveWayAtMs = null;
      return false;
    },
    gaveWay(frameMs) {
      gaveWayAtMs = frameMs;
    },
  };
}
