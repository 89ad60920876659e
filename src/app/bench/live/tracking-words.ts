import type { TrackingState } from '../../tracking/tracking-state';

/** Where following stands, and what to do about it. */
export const trackingWords: Readonly<Record<TrackingState, string>> = {
  off: 'The camera is off.',
  asking: 'The browser asks for the camera.',
  starting: 'Getting ready.',
  refused: 'The camera was refused. Allow it beside the address, then start again.',
  'no-camera': 'No camera was found. Connect one: it is looked for every few seconds.',
  'camera-busy': 'The camera is in use elsewhere. Close what uses it: it is asked for every few seconds.',
  unsupported: 'This page cannot have a camera: the address must begin with https, or be on this computer.',
  failed: 'Tracking stopped unexpectedly, and starts again by itself.',
  nobody: 'Nobody is in view of the camera.',
  following: 'Following somebody.',
};

/** Whether the camera is on, or being asked for. */
export const isOn = (state: TrackingState): boolean =>
  state !== 'off' && state !== 'refused' && state !== 'unsupported';
