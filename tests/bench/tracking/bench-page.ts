import { USUAL_VIEWER } from '@oriel/shared/viewer/eye-from-landmarks';
import type { FromTracker, ToTracker } from '../../../src/app/tracking/tracking-messages';
import { readFrameNumber } from './frame-number';
import { splitJpegs } from './jpeg-stream';
import type { FromReference, ToReference } from './reference.worker';
import type { Found, FrameResult, Look } from './result';

/** A camera at the middle of the glass, looking straight out: what the bench measures is in its own coordinates. */
const CAMERA = { position: { x: 0, y: 0, z: 0 }, pitchRad: 0, yawRad: 0, rollRad: 0, mirrored: false };

/** Worker and page talk in turns here: one message out, one answer back. */
function ask<Out, In>(worker: Worker, message: Out, transfer: Transferable[] = []): Promise<In> {
  return new Promise((resolve, reject) => {
    worker.onmessage = ({ data }: MessageEvent<In>) => resolve(data);
    worker.onerror = (event) => reject(new Error(event.message));
    worker.postMessage(message, transfer);
  });
}

/** Decodes a picture to what a camera gives: planes of luma and colour. */
async function cameraFrame(
  jpeg: Uint8Array<ArrayBuffer>,
  timestampMs: number,
): Promise<{ frame: VideoFrame; number: number | null }> {
  const decoder = new ImageDecoder({ data: jpeg, type: 'image/jpeg' });
  const { image } = await decoder.decode();
  decoder.close();
  const { codedWidth, codedHeight, colorSpace, format } = image;
  if (format !== 'I420')
    throw new Error(
      `The video's pictures decode to ${String(format)}; 4:2:0 JPEG is wanted (ffmpeg -pix_fmt yuvj420p).`,
    );
  const data = new Uint8Array(image.allocationSize());
  const layout = await image.copyTo(data);
  image.close();
  const frame = new VideoFrame(data, {
    format,
    codedWidth,
    codedHeight,
    timestamp: timestampMs * 1000,
    layout,
    colorSpace,
  });
  return { frame, number: readFrameNumber(data.subarray(layout[0].offset), layout[0].stride, codedHeight) };
}

async function lookWithOriel(worker: Worker, frame: VideoFrame, timestampMs: number): Promise<Look> {
  const begun = performance.now();
  const answer = await ask<ToTracker, FromTracker>(worker, { type: 'frame', image: frame, timestampMs }, [frame]);
  const roundTripMs = performance.now() - begun;
  if (answer.type !== 'sample') throw new Error(answer.type === 'failed' ? answer.reason : `unexpected ${answer.type}`);
  const { face, timings } = answer;
  const found: Found | null = face && {
    rightEye: [face.rightEyePx.x, face.rightEyePx.y],
    leftEye: [face.leftEyePx.x, face.leftEyePx.y],
    ipdPx: face.ipdPx,
    eyeMm: [face.eyeInCamera.x, face.eyeInCamera.y, face.eyeInCamera.z],
  };
  return { face: found, engineMs: timings.totalMs, roundTripMs };
}

async function lookWithReference(worker: Worker, image: ImageBitmap): Promise<Look> {
  const begun = performance.now();
  const answer = await ask<ToReference, FromReference>(worker, { type: 'frame', image }, [image]);
  if (answer.type !== 'found') throw new Error(`unexpected ${answer.type}`);
  return { face: answer.face, engineMs: answer.ms, roundTripMs: performance.now() - begun };
}

/** Replays the video served at `/video` through both engines, each frame through one and then the other. */
export async function replay(fps: number, hfovRad: number, ipdMm: number): Promise<FrameResult[]> {
  const assetsUrl = new URL('/tracker/', location.href).href;
  const oriel = new Worker('/tracking.worker.js', { type: 'module' });
  const reference = new Worker('/reference.worker.js', { type: 'module' });
  const settings = { assetsUrl, camera: { ...CAMERA, hfovRad }, viewer: { ...USUAL_VIEWER, eyeDistanceMm: ipdMm } };
  const started = await ask<ToTracker, FromTracker>(oriel, { type: 'start', settings });
  if (started.type !== 'ready') throw new Error(started.type === 'failed' ? started.reason : 'Oriel did not start.');
  await ask<ToReference, FromReference>(reference, { type: 'start', assetsUrl, hfovRad, ipdMm });
  const results: FrameResult[] = [];
  for (const [index, jpeg] of splitJpegs(new Uint8Array(await (await fetch('/video')).arrayBuffer())).entries()) {
    const timestampMs = (index * 1000) / fps;
    const { frame, number } = await cameraFrame(jpeg, timestampMs);
    const bitmap = await createImageBitmap(frame);
    results.push({
      number,
      oriel: await lookWithOriel(oriel, frame, timestampMs),
      reference: await lookWithReference(reference, bitmap),
    });
  }
  oriel.terminate();
  reference.terminate();
  return results;
}

Object.assign(globalThis, { replay });
