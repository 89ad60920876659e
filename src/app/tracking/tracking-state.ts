/**
 * Where following a face stands, in plain states:
 * `off` not asked for; `asking` the browser asks for the camera; `refused`, `no-camera`, `camera-busy` why it was not given;
 * `unsupported` this page cannot have a camera (no secure context, or no workers); `starting` camera given, models loading;
 * `nobody` looking, no face there; `following` a face is followed; `failed` the tracker itself broke.
 */
export type TrackingState =
  | 'off'
  | 'asking'
  | 'refused'
  | 'no-camera'
  | 'camera-busy'
  | 'unsupported'
  | 'starting'
  | 'nobody'
  | 'following'
  | 'failed';
