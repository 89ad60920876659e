import type { TrackingState } from './tracking-state';

/** Where following stands, for the person at the screen. */
export const trackingWords: Readonly<Record<TrackingState, string>> = {
  off: 'The camera is off.',
  asking: 'The browser asks for the camera.',
  starting: 'Getting ready to follow you.',
  refused: 'The camera was refused. Allow it beside the address, then start again.',
  'no-camera': 'No camera was found. Connect one, then start again.',
  'camera-busy': 'The camera is in use elsewhere. Close what uses it, then start again.',
  unsupported: 'This page cannot have a camera: the address must begin with https, or be on this computer.',
  failed: 'Following stopped unexpectedly. Start again.',
  nobody: 'Nobody is in view of the camera.',
  following: 'Following you.',
};
