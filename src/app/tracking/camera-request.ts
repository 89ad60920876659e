import type { TrackingState } from './tracking-state';

/** Why there is no camera, as a state the page can show. */
export type CameraRefusal = Extract<TrackingState, 'refused' | 'no-camera' | 'camera-busy' | 'unsupported'>;

export type CameraAnswer =
  { readonly given: true; readonly stream: MediaStream } | { readonly given: false; readonly why: CameraRefusal };

/** More than far viewers need is slower, less does not see them; a camera that cannot do this gives what it can. */
const WANTED: MediaStreamConstraints = {
  audio: false,
  video: { width: { ideal: 1280 }, height: { ideal: 720 }, frameRate: { ideal: 30 }, facingMode: 'user' },
};

/** Names of getUserMedia's errors (W3C Media Capture and Streams, 10.3) and what each comes to for the person at the screen. */
const WHY: Readonly<Record<string, CameraRefusal>> = {
  NotAllowedError: 'refused',
  SecurityError: 'refused',
  NotFoundError: 'no-camera',
  OverconstrainedError: 'no-camera',
  NotReadableError: 'camera-busy',
  AbortError: 'camera-busy',
  InvalidStateError: 'unsupported',
  TypeError: 'unsupported',
};

/** Asks the browser for the camera; never throws. `media` is missing on a page without a secure context. */
export async function requestCamera(media: MediaDevices | undefined): Promise<CameraAnswer> {
  if (!media) return { given: false, why: 'unsupported' };
  try {
    return { given: true, stream: await media.getUserMedia(WANTED) };
  } catch (cause) {
    return { given: false, why: WHY[nameOf(cause)] ?? 'camera-busy' };
  }
}

/** A DOMException is no Error in every browser, but has a name in all. */
const nameOf = (cause: unknown): string =>
  typeof cause === 'object' && cause !== null && 'name' in cause ? String(cause.name) : '';
