import type { Found, Look } from './result';
import type { TrueFace, TruthFrame } from './truth';

/** A find that is right: within one eye distance of a face that is there. */
export interface Hit {
  readonly frame: TruthFrame;
  readonly truth: TrueFace;
  readonly found: Found;
  /** The measured midpoint between the eyes, pixels. */
  readonly x: number;
  readonly y: number;
  /** Its distance from the true one, in eye distances. */
  readonly error: number;
}

/** The face a look is right about, the nearest where there are several; null where nothing or something wrong was found. */
export function hitOf(frame: TruthFrame, look: Look): Hit | null {
  const { face: found } = look;
  if (!found) return null;
  const x = (found.rightEye[0] + found.leftEye[0]) / 2;
  const y = (found.rightEye[1] + found.leftEye[1]) / 2;
  const hits = frame.faces.map((truth) => {
    const dx = x - (truth.rightEye[0] + truth.leftEye[0]) / 2;
    const dy = y - (truth.rightEye[1] + truth.leftEye[1]) / 2;
    return { frame, truth, found, x, y, error: Math.hypot(dx, dy) / truth.ipdPx };
  });
  const [nearest] = hits.sort((a, b) => a.error - b.error);
  return nearest && nearest.error <= 1 ? nearest : null;
}

/** A stretch in which the truth stands still counts from this many frames on, the first few left out while regions settle. */
const STILL_FRAMES = 15;
const SETTLING_FRAMES = 5;

/** The hits of each stretch in which the truth stands still. */
export function stillStretches(hits: readonly (Hit | null)[]): Hit[][] {
  const stretches: Hit[][] = [];
  let current: Hit[] = [];
  for (const hit of hits) {
    if (!hit || (current.length > 0 && !samePlace(current[0].truth, hit.truth))) current = [];
    if (!hit) continue;
    if (current.length === 0) stretches.push(current);
    current.push(hit);
  }
  return stretches.filter((stretch) => stretch.length >= STILL_FRAMES).map((stretch) => stretch.slice(SETTLING_FRAMES));
}

const samePlace = (a: TrueFace, b: TrueFace): boolean =>
  [0, 1].every((axis) => a.rightEye[axis] === b.rightEye[axis] && a.leftEye[axis] === b.leftEye[axis]);
