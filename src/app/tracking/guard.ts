import type { Detection } from './detection';
import type { PixelPoint } from './tracking-messages';

/** Frames from one guarding look to the next while nothing is suspect. */
const INTERVAL_FRAMES = 5;
/** Frames guarded one by one after someone was found, whose velocity is not known yet, and after an implausible jump. */
const ALERT_FRAMES = 3;
/** Landmarks that lie this share of the eye distance off the face the guarding look saw cling to a wrong place; the second while alert. */
const CLINGS_FROM = 0.35;
const CLINGS_FROM_ALERT = 0.2;
/** Guarding looks in a row that may see no face before the viewer is given up. */
const MOST_MISSES = 2;

/** The two eyes as one engine or the other places them; frame pixels. */
export interface Eyes {
  readonly rightEye: PixelPoint;
  readonly leftEye: PixelPoint;
}

const distanceOf = ({ rightEye, leftEye }: Eyes): number => Math.hypot(leftEye.x - rightEye.x, leftEye.y - rightEye.y);

export const shifted = ({ rightEye, leftEye }: Eyes, dx: number, dy: number): Eyes => ({
  rightEye: { x: rightEye.x + dx, y: rightEye.y + dy },
  leftEye: { x: leftEye.x + dx, y: leftEye.y + dy },
});

/** Whether two placings of the eyes differ by more than `share` of the eye distance in place, or `ratio` in size. */
export function differ(a: Eyes, b: Eyes, share: number, ratio: number): boolean {
  const size = distanceOf(b);
  const dx = (a.rightEye.x + a.leftEye.x - b.rightEye.x - b.leftEye.x) / 2;
  const dy = (a.rightEye.y + a.leftEye.y - b.rightEye.y - b.leftEye.y) / 2;
  const scale = distanceOf(a) / size;
  return Math.hypot(dx, dy) > share * size || scale > ratio || scale < 1 / ratio;
}

/** What a guarding look says of the landmarks: they hold, they cling to a wrong place, no face was seen, or it is time to give up. */
export type Verdict = 'holds' | 'clings' | 'missed' | 'lost';

/**
 * Keeps landmarks from clinging to a wrong region after a sudden change: says when a closer look by the short-range detector is due,
 * and what to make of it.
 */
export class Guard {
  private sinceLook = 0;
  private alert = ALERT_FRAMES;
  private wasAlert = false;
  private misses = 0;
  private previous: Eyes | null = null;

  /** Takes in the landmarks' eyes of this frame, who were expected to move by (dx, dy); whether a guarding look is due now. */
  due(eyes: Eyes, intervalFrames = INTERVAL_FRAMES, dx = 0, dy = 0): boolean {
    if (this.previous && differ(eyes, shifted(this.previous, dx, dy), 0.75, 1.2)) this.alert = ALERT_FRAMES;
    this.previous = eyes;
    this.sinceLook++;
    this.wasAlert = this.alert > 0;
    if (this.alert === 0 && this.misses === 0 && this.sinceLook < intervalFrames) return false;
    if (this.alert > 0) this.alert--;
    this.sinceLook = 0;
    return true;
  }

  /** Weighs the face the guarding look saw, if any, against the landmarks' eyes. */
  judge(eyes: Eyes, seen: Detection | undefined): Verdict {
    if (!seen) return ++this.misses >= MOST_MISSES ? 'lost' : 'missed';
    this.misses = 0;
    return differ(eyes, seen, this.wasAlert ? CLINGS_FROM_ALERT : CLINGS_FROM, 1.3) ? 'clings' : 'holds';
  }

  /** The landmarks were placed anew in this frame: their jump is no cause for alarm. */
  replaced(eyes: Eyes): void {
    this.previous = eyes;
  }
}
