import { InjectionToken } from '@angular/core';
import { feedFrames, type FrameFeed } from './frame-feed';

/** The browser's cameras; absent on a page without a secure context. */
export const CAMERAS = new InjectionToken<MediaDevices | undefined>('cameras', {
  providedIn: 'root',
  factory: () => (globalThis.isSecureContext ? (navigator.mediaDevices as MediaDevices | undefined) : undefined),
});

/** Makes the tracking worker; absent where there are no workers. */
export const TRACKING_WORKER = new InjectionToken<(() => Worker) | undefined>('tracking worker', {
  providedIn: 'root',
  factory: () =>
    typeof Worker === 'undefined'
      ? undefined
      : () => new Worker(new URL('./tracking.worker', import.meta.url), { type: 'module' }),
});

/** Starts feeding a worker with the frames of a track. */
export const FRAME_FEED = new InjectionToken<
  (track: MediaStreamTrack, worker: Worker, workerReadsTracks: boolean) => FrameFeed
>('frame feed', { providedIn: 'root', factory: () => feedFrames });
