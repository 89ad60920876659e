import type { Looking } from '@oriel/shared/ladder/steps';
import type { Point3 } from '@oriel/shared/projection/types';
import type { Camera } from '@oriel/shared/viewer/camera';
import type { ViewerMeasure } from '@oriel/shared/viewer/eye-from-landmarks';
import type { ChoiceRule } from '@oriel/shared/viewer/choose-viewer';
import type { HeadAngles } from '@oriel/shared/viewer/head-angles';
import type { CameraTrack } from './track-processor';

/**
 * What the page and the tracking worker say to each other. Pixels are those of the camera's frame, origin at its upper left corner,
 * x to the right and y down, pixel centres at integer + 0.5. Camera millimetres: x right, y down, z away from the camera.
 */
export interface PixelPoint {
  readonly x: number;
  readonly y: number;
}

/** The camera as the person set it up; the size of its frame is read from the frames themselves. */
export type CameraSetUp = Omit<Camera, 'widthPx' | 'heightPx'>;

/** What the worker must know before the first frame. */
export interface TrackerSettings {
  /** Folder of the model and wasm files, as an absolute address on the page's own origin, ending in a slash. */
  readonly assetsUrl: string;
  readonly camera: CameraSetUp;
  readonly viewer: ViewerMeasure;
  /** How finely to look; as on the ladder's first step where left out. */
  readonly looking?: Looking;
  /** Whom to follow of several; the nearest, calmly, where left out. */
  readonly choice?: ChoiceRule;
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
  /** Whether samples should carry the landmarks, to be drawn at the bench; they do not unless asked. */
  | { readonly type: 'landmarks'; readonly wanted: boolean }
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
  /** The subject's own right and left eye, each the middle of its outline. */
  readonly rightEyePx: PixelPoint;
  readonly leftEyePx: PixelPoint;
  /** Midway between the two eyes. */
  readonly eyePx: PixelPoint;
  /** Distance between the eyes as it would be seen with the head facing the camera, from the fit of all landmarks; of the detector's points, as it is seen. */
  readonly ipdPx: number;
  /** The eye in millimetres from the centre of the glass: x to the viewer's right, y up, z out of the glass. */
  readonly eye: Point3;
  /** The same in the camera's coordinates. */
  readonly eyeInCamera: Point3;
  /** Where only the detector looked, yaw and pitch are not known and are 0. */
  readonly head: Readonly<HeadAngles>;
  /** The landmark model's own belief that this is a face, 0 to 1. */
  readonly belief: number;
}

/** Someone else who is there and is not followed, as the detector sees them now and then. */
export interface OtherSample {
  readonly id: number;
  readonly eyePx: PixelPoint;
  /** In millimetres from the centre of the glass, as if the head faced the camera. */
  readonly eye: Point3;
}

/** What the worker makes of one frame. */
export interface SampleMessage {
  readonly type: 'sample';
  readonly timestampMs: number;
  readonly frameWidth: number;
  readonly frameHeight: number;
  /** The face followed, or null where nobody is. */
  readonly face: FaceSample | null;
  /** Who is followed: a number that is theirs for as long as they are there. */
  readonly viewer: number | null;
  readonly others: readonly OtherSample[];
  /** x and y of each landmark in frame pixels; only where they were asked for and a face is followed. */
  readonly landmarks?: Float32Array;
  readonly timings: StageTimings;
  /** Tensors alive in the worker: constant, or something leaks. */
  readonly tensors: number;
}

export type FromTracker =
  | { readonly type: 'ready'; readonly readsTracks: boolean }
  | SampleMessage
  /** A frame passed over, as the ladder has it. */
  | { readonly type: 'skipped'; readonly timestampMs: number }
  | { readonly type: 'ended' }
  /** Every frame is closed: the worker may be ended. */
  | { readonly type: 'stopped' }
  | { readonly type: 'failed'; readonly reason: string };
