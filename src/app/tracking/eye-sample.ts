import type { Point3 } from '@oriel/shared/projection/types';
import type { OtherSample, StageTimings } from './tracking-messages';

/**
 * One look at the viewer. The tracking service hands out the same object every time, so that following allocates nothing:
 * copy what must be kept.
 */
export interface EyeSample {
  /** Whether a face was found; where not, `eye` still holds the last place it was seen. */
  readonly found: boolean;
  /** The eye in millimetres from the centre of the glass: x to the viewer's right, y up, z out of the glass. */
  readonly eye: Point3;
  /** When the frame was captured, on the page's `performance.now()` clock; when it arrived, until the camera's clock is known. */
  readonly capturedMs: number;
  /** When the sample reached the page, on the same clock. */
  readonly receivedMs: number;
  /** Whether `capturedMs` is the camera's own time, and not that of arrival. */
  readonly captureTimeKnown: boolean;
  readonly timings: StageTimings;
  /** Size of the frame looked at, px. */
  readonly frameWidth: number;
  readonly frameHeight: number;
  /** x and y of each landmark in frame pixels, where `showLandmarks` asked for them and a face was found. */
  readonly landmarks: Float32Array | null;
  /** Who is followed: a number that is theirs for as long as they are there; null while nobody is. */
  readonly viewer: number | null;
  /** Who else is there. */
  readonly others: readonly OtherSample[];
}
