/// <reference lib="webworker" />
import {
  createDetector,
  SupportedModels,
  type FaceLandmarksDetector,
} from '@tensorflow-models/face-landmarks-detection';
import { setWasmPaths } from '@tensorflow/tfjs-backend-wasm';
import { env, ready, setBackend } from '@tensorflow/tfjs-core';
import type { Found } from './result';

/** The reference engine, face-landmarks-detection as published, in a worker of its own on the same wasm files and models. */
export type ToReference =
  { readonly type: 'start'; readonly assetsUrl: string } | { readonly type: 'frame'; readonly image: ImageBitmap };
export type FromReference =
  { readonly type: 'ready' } | { readonly type: 'found'; readonly face: Found | null; readonly ms: number };

let detector: FaceLandmarksDetector | null = null;

async function start(assetsUrl: string): Promise<void> {
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
  if (!detector) throw new Error('not started');
  const begun = performance.now();
  const faces = await detector.estimateFaces(image as unknown as ImageData);
  const ms = performance.now() - begun;
  image.close();
  if (faces.length === 0) return { face: null, ms };
  const { keypoints } = faces[0];
  const midpoint = (a: number, b: number): [number, number] => [
    (keypoints[a].x + keypoints[b].x) / 2,
    (keypoints[a].y + keypoints[b].y) / 2,
  ];
  const rightEye = midpoint(33, 133);
  const leftEye = midpoint(362, 263);
  return { face: { rightEye, leftEye, ipdPx: Math.hypot(leftEye[0] - rightEye[0], leftEye[1] - rightEye[1]) }, ms };
}

self.onmessage = async ({ data }: MessageEvent<ToReference>) => {
  if (data.type === 'start') {
    await start(data.assetsUrl);
    self.postMessage({ type: 'ready' } satisfies FromReference);
  } else {
    self.postMessage({ type: 'found', ...(await look(data.image)) } satisfies FromReference);
  }
};
