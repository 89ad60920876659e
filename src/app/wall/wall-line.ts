import type { TrackingState } from '../tracking/tracking-state';

/** What a wall may have to ask of a person. */
export interface WallSituation {
  readonly wallName: string;
  readonly sceneChosen: boolean;
  /** Names of layers whose picture did not come. */
  readonly missing: readonly string[];
  /** Why nobody is followed for want of a camera, and for how long; null where one is looked through. */
  readonly lack: CameraLack | null;
  readonly nowMs: number;
}

/** What keeps the camera from a wall, and since when, ms. */
export interface CameraLack {
  readonly state: TrackingState;
  readonly sinceMs: number;
}

/** A camera that is lacking is asked for again and again: while the browser is asked the lack is what it was. */
export function lackAfter(before: CameraLack | null, state: TrackingState, nowMs: number): CameraLack | null {
  if (!cameraWords[state]) return null;
  return before && (state === 'asking' || state === before.state) ? before : { state, sinceMs: nowMs };
}

/** A camera that is plugged in again is back by itself: it is spoken of only after so long, and then left to the desk, ms. */
const speaksAfterMs = 10_000;
const speaksUntilMs = 120_000;

/** The words on a wall, null most of the time: nothing is seen but the picture unless something needs a person. */
export function wallLine(now: WallSituation): string | null {
  if (!now.sceneChosen) return `Nothing is chosen to be shown on ${now.wallName}. Choose a scene for it at Walls.`;
  if (now.missing.length > 0)
    return `${now.missing.length === 1 ? 'A picture' : `${now.missing.length} pictures`} of this scene could not be loaded; they are tried again by themselves. Check this screen’s network.`;
  const lackedMs = now.lack ? now.nowMs - now.lack.sinceMs : 0;
  if (!now.lack || lackedMs < speaksAfterMs || lackedMs > speaksUntilMs) return null;
  return cameraWords[now.lack.state] ?? null;
}

const cameraWords: Partial<Record<TrackingState, string>> = {
  asking: 'The browser asks whether Oriel may use the camera. Allow it, so that the picture can follow.',
  refused: 'The camera is refused to this page. Allow it in the browser, so that the picture can follow.',
  'no-camera': 'No camera is found. Connect it, and it is used at once.',
  'camera-busy': 'The camera is in use elsewhere. Close what uses it, and it is taken up by itself.',
  unsupported: 'This page cannot have a camera: its address must begin with https.',
};
