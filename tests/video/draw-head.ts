import { posed, type HeadCamera, type HeadCorner, type HeadPose, type Place, type TurningHead } from './turning-head';
import type { Corners } from './delaunay';
import type { Texture } from './texture';

/** Samples along each side of a pixel. */
const OVER = 2;
/** What of a head and its body is drawn, mm to the side, above and below the eyes. */
const REACH = { side: 260, above: 150, below: 300 };
/** Opacity from which a sample hides what lies behind it. */
const HIDES = 0.5;
/** The chin also comes forward by this share of what it is lowered by. */
const JAW_FORWARD = 0.25;

/** A corner as the samples have it: place in samples, one over its distance, place in the texture, opacity. */
type Seen = readonly [x: number, y: number, nearness: number, u: number, v: number, opacity: number];

/** Samples of a part of the frame: red, green, blue times opacity, and opacity; nearness of what hides. */
interface Canvas {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
  readonly colour: Float32Array;
  readonly nearness: Float32Array;
}

/** Draws heads over `frame` (red, green, blue, row by row), the farthest first, in true perspective. */
export function drawHeads(
  frame: Float32Array,
  heads: readonly TurningHead[],
  poses: readonly HeadPose[],
  camera: HeadCamera,
): void {
  for (const pose of [...poses].sort((a, b) => b.z - a.z))
    drawHead(frame, heads[(pose.who ?? 0) % heads.length], pose, camera);
}

function drawHead(frame: Float32Array, head: TurningHead, pose: HeadPose, camera: HeadCamera): void {
  const canvas = canvasFor(pose, camera);
  if (!canvas) return;
  const upright = { ...pose, yaw: 0, pitch: 0, roll: (pose.roll ?? 0) / 3, z: pose.z + 60 };
  drawMesh(canvas, head.body.corners, head.body.triangles, head.levels, upright, camera, 0, Infinity);
  const isFace = (corners: Corners): boolean => corners.every((corner) => head.corners[corner].ofFace);
  const jaw = pose.jaw ?? 0;
  // Face over what surrounds it: at the seam both are seen at one distance.
  drawMesh(
    canvas,
    head.corners,
    head.triangles.filter((corners) => !isFace(corners)),
    head.levels,
    pose,
    camera,
    jaw,
    head.mouthMm,
  );
  drawMesh(canvas, head.corners, head.triangles.filter(isFace), head.levels, pose, camera, jaw, head.mouthMm);
  lay(canvas, frame, camera.width);
}

function canvasFor({ x, y, z }: HeadPose, { width, height, focalPx }: HeadCamera): Canvas | null {
  const scale = focalPx / z;
  const within = (px: number, most: number): number => Math.min(most, Math.max(0, Math.round(px)));
  const left = within(width / 2 + (x - REACH.side) * scale, width);
  const right = within(width / 2 + (x + REACH.side) * scale, width);
  const top = within(height / 2 + (y - REACH.above) * scale, height);
  const bottom = within(height / 2 + (y + REACH.below) * scale, height);
  const [w, h] = [(right - left) * OVER, (bottom - top) * OVER];
  if (w <= 0 || h <= 0) return null;
  return {
    left: left * OVER,
    top: top * OVER,
    width: w,
    height: h,
    colour: new Float32Array(w * h * 4),
    nearness: new Float32Array(w * h),
  };
}

function drawMesh(
  canvas: Canvas,
  corners: readonly HeadCorner[],
  triangles: readonly Corners[],
  levels: readonly Texture[],
  pose: HeadPose,
  { width, height, focalPx }: HeadCamera,
  jaw: number,
  mouthMm: number,
): void {
  const put = posed(pose);
  const seen = corners.map(({ place, texture, opacity, ofFace }): Seen => {
    const [x, y, z] = put(jaw && ofFace ? lowered(place, jaw, mouthMm) : place);
    return [
      OVER * (width / 2 + (focalPx * x) / z),
      OVER * (height / 2 + (focalPx * y) / z),
      1 / z,
      ...texture,
      opacity,
    ];
  });
  for (const [a, b, c] of triangles) drawTriangle(canvas, seen[a], seen[b], seen[c], levels);
}

/** Lips part over a centimetre; what lies lower moves with the chin. */
function lowered([x, y, z]: Place, jaw: number, mouthMm: number): Place {
  const share = Math.min(1, Math.max(0, (y - mouthMm + 4) / 10));
  return [x, y + jaw * share, z + JAW_FORWARD * jaw * share];
}

function drawTriangle(canvas: Canvas, a: Seen, b: Seen, c: Seen, levels: readonly Texture[]): void {
  const area = (b[0] - a[0]) * (c[1] - a[1]) - (c[0] - a[0]) * (b[1] - a[1]);
  if (Math.abs(area) < 1e-6) return;
  const textureArea = Math.abs((b[3] - a[3]) * (c[4] - a[4]) - (c[3] - a[3]) * (b[4] - a[4]));
  const level = Math.round(0.5 * Math.log2(textureArea / Math.abs(area) + 1e-9));
  const at = Math.max(0, Math.min(levels.length - 1, level));
  const texture = levels[at];
  const texels = 1 / (1 << at);
  const { left, top, width, height, colour, nearness } = canvas;
  const firstX = Math.max(0, Math.floor(Math.min(a[0], b[0], c[0]) - left));
  const lastX = Math.min(width - 1, Math.ceil(Math.max(a[0], b[0], c[0]) - left));
  const firstY = Math.max(0, Math.floor(Math.min(a[1], b[1], c[1]) - top));
  const lastY = Math.min(height - 1, Math.ceil(Math.max(a[1], b[1], c[1]) - top));
  for (let y = firstY; y <= lastY; y++) {
    const py = y + 0.5 + top;
    for (let x = firstX; x <= lastX; x++) {
      const px = x + 0.5 + left;
      const wb = ((px - a[0]) * (c[1] - a[1]) - (c[0] - a[0]) * (py - a[1])) / area;
      const wc = ((b[0] - a[0]) * (py - a[1]) - (px - a[0]) * (b[1] - a[1])) / area;
      const wa = 1 - wb - wc;
      if (wa < 0 || wb < 0 || wc < 0) continue;
      const near = wa * a[2] + wb * b[2] + wc * c[2];
      const sample = y * width + x;
      if (near < nearness[sample]) continue;
      // Shares in space, not in the picture: perspective-correct interpolation (J. F. Blinn, Hyperbolic Interpolation, 1992).
      const sa = (wa * a[2]) / near;
      const sb = (wb * b[2]) / near;
      const sc = (wc * c[2]) / near;
      const u = (sa * a[3] + sb * b[3] + sc * c[3]) * texels;
      const v = (sa * a[4] + sb * b[4] + sc * c[4]) * texels;
      const opacity = blend(texture, u, v, sa * a[5] + sb * b[5] + sc * c[5], colour, 4 * sample);
      if (opacity > HIDES) nearness[sample] = near;
    }
  }
}

/** Lays the texture at (u, v), bilinear between texel centres, over a sample; how opaque it is there. */
function blend(
  { width, height, data }: Texture,
  u: number,
  v: number,
  share: number,
  colour: Float32Array,
  at: number,
): number {
  const x = Math.min(Math.max(u - 0.5, 0), width - 1.001);
  const y = Math.min(Math.max(v - 0.5, 0), height - 1.001);
  const x0 = x | 0;
  const y0 = y | 0;
  const fx = x - x0;
  const fy = y - y0;
  const upper = (y0 * width + x0) * 4;
  const lower = upper + 4 * width;
  const w00 = (1 - fx) * (1 - fy);
  const w10 = fx * (1 - fy);
  const w01 = (1 - fx) * fy;
  const w11 = fx * fy;
  const opacity =
    share * (data[upper + 3] * w00 + data[upper + 7] * w10 + data[lower + 3] * w01 + data[lower + 7] * w11);
  if (opacity < 0.02) return 0;
  const behind = 1 - opacity;
  for (let k = 0; k < 3; k++) {
    const level = data[upper + k] * w00 + data[upper + 4 + k] * w10 + data[lower + k] * w01 + data[lower + 4 + k] * w11;
    colour[at + k] = colour[at + k] * behind + opacity * level;
  }
  colour[at + 3] = colour[at + 3] * behind + opacity;
  return opacity;
}

/** Averages the four samples of each pixel over the frame. */
function lay({ left, top, width, height, colour }: Canvas, frame: Float32Array, frameWidth: number): void {
  for (let y = 0; y < height; y += OVER) {
    for (let x = 0; x < width; x += OVER) {
      const upper = 4 * (y * width + x);
      const lower = upper + 4 * width;
      const opacity = (colour[upper + 3] + colour[upper + 7] + colour[lower + 3] + colour[lower + 7]) / 4;
      if (opacity < 0.002) continue;
      const at = (((y + top) / OVER) * frameWidth + (x + left) / OVER) * 3;
      for (let k = 0; k < 3; k++) {
        const mean = (colour[upper + k] + colour[upper + 4 + k] + colour[lower + k] + colour[lower + 4 + k]) / 4;
        frame[at + k] = frame[at + k] * (1 - opacity) + mean;
      }
    }
  }
}
