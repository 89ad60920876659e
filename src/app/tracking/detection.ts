import type { Region } from './region';
import type { PixelPoint } from './tracking-messages';

/** A face as a detector sees it, in frame pixels; the box is upright in the region that was looked at. */
export interface Detection {
  readonly score: number;
  readonly cx: number;
  readonly cy: number;
  readonly width: number;
  readonly height: number;
  readonly rightEye: PixelPoint;
  readonly leftEye: PixelPoint;
}

/** Numbers a detector gives for each anchor: logit, box centre, box size, six points (the subject's right eye first, then the left). */
const STRIDE = 17;

const logistic = (logit: number): number => 1 / (1 + Math.exp(-logit));

/**
 * Reads a detector's output: for each anchor a logit, then centre, size and points as offsets from the anchor in pixels of the input.
 * Gives those whose probability is at least `threshold`, unordered and overlapping, carried from the region looked at to the frame.
 */
export function decodeDetections(
  output: Float32Array,
  anchors: Float32Array,
  inputSize: number,
  region: Region,
  threshold: number,
): Detection[] {
  const found: Detection[] = [];
  const leastLogit = Math.log(threshold / (1 - threshold));
  const scale = region.size / inputSize;
  const ca = Math.cos(region.angleRad);
  const sa = Math.sin(region.angleRad);
  for (let i = 0; i < anchors.length / 2; i++) {
    const at = i * STRIDE;
    if (output[at] < leastLogit) continue;
    const place = (point: number): PixelPoint => {
      const dx = (output[at + point] / inputSize + anchors[2 * i] - 0.5) * region.size;
      const dy = (output[at + point + 1] / inputSize + anchors[2 * i + 1] - 0.5) * region.size;
      return { x: region.cx + ca * dx - sa * dy, y: region.cy + sa * dx + ca * dy };
    };
    const centre = place(1);
    found.push({
      score: logistic(output[at]),
      cx: centre.x,
      cy: centre.y,
      width: output[at + 3] * scale,
      height: output[at + 4] * scale,
      rightEye: place(5),
      leftEye: place(7),
    });
  }
  return found;
}
