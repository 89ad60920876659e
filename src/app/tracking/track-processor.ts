/** A MediaStreamTrack; the compiler's library for workers does not know the type, though workers are given them. */
export type CameraTrack = object;

type TrackProcessorConstructor = new (init: { readonly track: CameraTrack; readonly maxBufferSize?: number }) => {
  readonly readable: ReadableStream<VideoFrame>;
};

const constructorHere = (): TrackProcessorConstructor | undefined =>
  (globalThis as { MediaStreamTrackProcessor?: TrackProcessorConstructor }).MediaStreamTrackProcessor;

/** Whether this context, page or worker, can read a camera track as a stream of frames (MediaStreamTrack Insertable Media Processing). */
export const readsTracks = (): boolean => constructorHere() !== undefined;

/** The frames of a track; only the newest is kept for a reader that is slow. */
export function framesOf(track: CameraTrack): ReadableStream<VideoFrame> {
  const Processor = constructorHere();
  if (!Processor) throw new Error('This browser cannot read a camera as a stream of frames.');
  return new Processor({ track, maxBufferSize: 1 }).readable;
}
