import type { CameraTrack } from './track-processor';

/**
 * What the page and the tracking worker say to each other. Pixels are those of the camera's frame, origin at its upper left corner,
 * x to the right and y down, pixel centres at integer + 0.5. Camera millimetres: x right, y down, z away from the camera.
 */
export interface PixelPoint {
  readonly x: number;
  readonly y: number;
}

/** What the worker must know before the first frame. */
export interface TrackerSettings {
  /** Folder of the model and wasm files, as an absolute address on the page's own origin, ending in a slash. */
  readonly assetsUrl: string;
  /** Horizontal field of view of the camera, over the whole width of its frame. */
  readonly hfovRad: number;
  /** The viewer's distance between the pupils; 63 mm until measured. */
  readonly ipdMm: number;
  /** Measured distance over true distance for this viewer, set once at a known distance; 1 until then. */
  readonly scaleFactor: number;
}

/** One frame to look at; its `image` is transferred, and closed by the worker. */
export interface FrameMessage {
  readonly type: 'frame';
  readonly image: VideoFrame | ImageBitmap;
  /** When the frame was captured, on whatever clock the sender keeps; comes back unchanged in the sample. */
  readonly timestampMs: number;
}

export type ToTracker =
  | { readonly type: 'start'; readonly settings: TrackerSettings }
  | { readonly type: 'stream'; readonly frames: ReadableStream<VideoFrame> }
  | { readonly type: 'track'; readonly track: CameraTrack }
  | FrameMessage
  | { readonly type: 'settings'; readonly settings: TrackerSettings }
  | { readonly type: 'forget' }
  | { readonly type: 'stop' };

/** Milliseconds spent on one frame, by stage; `totalMs` is from the frame in hand to the sample made. */
export interface StageTimings {
  readonly cropMs: number;
  readonly detectMs: number;
  readonly landmarksMs: number;
  readonly totalMs: number;
}

/** The face found in a frame. */
export interface FaceSample {
  /** The subject's own right and left eye: midpoints of the corners of each. */
  readonly rightEyePx: PixelPoint;
  readonly leftEyePx: PixelPoint;
  /** Midway between the two eyes. */
  readonly eyePx: PixelPoint;
  /** Distance between the eyes as it would be seen facing the camera, from the fit of all landmarks. */
  readonly ipdPx: number;
  /** The eye in camera millimetres. */
  readonly eyeCamera: { readonly x: number; readonly y: number; readonly z: number };
  /** Turn of the head: yaw > 0 nose to the picture's right, pitch > 0 nose down, roll > 0 clockwise in the picture. */
  readonly pose: { readonly yawRad: number; readonly pitchRad: number; readonly rollRad: number };
  /** The landmark model's own belief that this is a face, 0 to 1. */
  readonly belief: number;
}

/** What the worker makes of one frame. */
export interface SampleMessage {
  readonly type: 'sample';
  readonly timestampMs: number;
  readonly frameWidth: number;
  readonly frameHeight: number;
  /** The face followed, or null where nobody is. */
  readonly face: FaceSample | null;
  readonly timings: StageTimings;
  /** Tensors alive in the worker: constant, or something leaks. */
  readonly tensors: number;
}

export type FromTracker =
  | { readonly type: 'ready'; readonly readsTracks: boolean }
  | SampleMessage
  | { readonly type: 'ended' }
  | { readonly type: 'failed'; readonly reason: string };
