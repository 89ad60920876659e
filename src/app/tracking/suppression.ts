import type { Detection } from './detection';

/** Boxes that overlap by more than this are one face. */
const SAME_FACE_OVERLAP = 0.3;

/** Intersection over union of two boxes taken as upright. */
export function overlap(a: Detection, b: Detection): number {
  const across = Math.min(a.cx + a.width / 2, b.cx + b.width / 2) - Math.max(a.cx - a.width / 2, b.cx - b.width / 2);
  const down = Math.min(a.cy + a.height / 2, b.cy + b.height / 2) - Math.max(a.cy - a.height / 2, b.cy - b.height / 2);
  if (across <= 0 || down <= 0) return 0;
  const shared = across * down;
  return shared / (a.width * a.height + b.width * b.height - shared);
}

/**
 * Weighted non-maximum suppression: detections of one face become their mean, weighted by probability, with the best one's score;
 * best first. The mean is steadier than the best alone.
 */
export function mergeDetections(detections: readonly Detection[]): Detection[] {
  let rest = [...detections].sort((a, b) => b.score - a.score);
  const faces: Detection[] = [];
  while (rest.length > 0) {
    const best = rest[0];
    const same = rest.filter((other) => other === best || overlap(best, other) > SAME_FACE_OVERLAP);
    rest = rest.filter((other) => !same.includes(other));
    faces.push(weightedMean(same, best.score));
  }
  return faces;
}

function weightedMean(same: readonly Detection[], score: number): Detection {
  const total = same.reduce((sum, one) => sum + one.score, 0);
  const mean = (value: (one: Detection) => number): number =>
    same.reduce((sum, one) => sum + value(one) * one.score, 0) / total;
  return {
    score,
    cx: mean((one) => one.cx),
    cy: mean((one) => one.cy),
    width: mean((one) => one.width),
    height: mean((one) => one.height),
    rightEye: { x: mean((one) => one.rightEye.x), y: mean((one) => one.rightEye.y) },
    leftEye: { x: mean((one) => one.leftEye.x), y: mean((one) => one.leftEye.y) },
  };
}
