/// <reference lib="webworker" />
import {
  createDetector,
  SupportedModels,
  type FaceLandmarksDetector,
  type Keypoint,
} from '@tensorflow-models/face-landmarks-detection';
import { setWasmPaths } from '@tensorflow/tfjs-backend-wasm';
import { env, ready, setBackend } from '@tensorflow/tfjs-core';
import type { Found } from './result';

/** The reference engine, face-landmarks-detection as published, in a worker of its own on the same wasm files and models. */
export type ToReference =
  | { readonly type: 'start'; readonly assetsUrl: string; readonly hfovRad: number; readonly ipdMm: number }
  | { readonly type: 'frame'; readonly image: ImageBitmap };
export type FromReference =
  { readonly type: 'ready' } | { readonly type: 'found'; readonly face: Found | null; readonly ms: number };

type Start = Extract<ToReference, { type: 'start' }>;

let detector: FaceLandmarksDetector | null = null;
let optics: Pick<Start, 'hfovRad' | 'ipdMm'> | null = null;

async function start({ assetsUrl, hfovRad, ipdMm }: Start): Promise<void> {
  optics = { hfovRad, ipdMm };
  env().set('WASM_HAS_MULTITHREAD_SUPPORT', false);
  setWasmPaths(assetsUrl);
  await setBackend('wasm');
  await ready();
  detector = await createDetector(SupportedModels.MediaPipeFaceMesh, {
    runtime: 'tfjs',
    maxFaces: 1,
    refineLandmarks: false,
    detectorModelUrl: `${assetsUrl}facemesh-detection-short.json`,
    landmarkModelUrl: `${assetsUrl}facemesh.json`,
  });
  await detector.estimateFaces(new ImageData(192, 192));
  detector.reset();
}

async function look(image: ImageBitmap): Promise<{ face: Found | null; ms: number }> {
  if (!detector || !optics) throw new Error('not started');
  const { width, height } = image;
  const begun = performance.now();
  const faces = await detector.estimateFaces(image as unknown as ImageData);
  const ms = performance.now() - begun;
  image.close();
  return { face: faces.length === 0 ? null : foundIn(faces[0].keypoints, width, height, optics), ms };
}

/** Eyes midway between their corners; distance by their distance from each other, the landmarks' own depth taken into account. */
function foundIn(
  points: readonly Keypoint[],
  width: number,
  height: number,
  { hfovRad, ipdMm }: Pick<Start, 'hfovRad' | 'ipdMm'>,
): Found {
  const eye = (a: number, b: number): [number, number, number] => [
    (points[a].x + points[b].x) / 2,
    (points[a].y + points[b].y) / 2,
    ((points[a].z ?? 0) + (points[b].z ?? 0)) / 2,
  ];
  const right = eye(33, 133);
  const left = eye(362, 263);
  const focalPx = width / 2 / Math.tan(hfovRad / 2);
  const z = (focalPx * ipdMm) / Math.hypot(left[0] - right[0], left[1] - right[1], left[2] - right[2]);
  const x = (right[0] + left[0] - width) / 2;
  const y = (right[1] + left[1] - height) / 2;
  return {
    rightEye: [right[0], right[1]],
    leftEye: [left[0], left[1]],
    ipdPx: Math.hypot(left[0] - right[0], left[1] - right[1]),
    eyeMm: [(x * z) / focalPx, (y * z) / focalPx, z],
  };
}

self.onmessage = async ({ data }: MessageEvent<ToReference>) => {
  if (data.type === 'start') {
    await start(data);
    self.postMessage({ type: 'ready' } satisfies FromReference);
  } else {
    self.postMessage({ type: 'found', ...(await look(data.image)) } satisfies FromReference);
  }
};
