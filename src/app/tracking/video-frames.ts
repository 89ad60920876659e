/** A muted video element that plays a camera track, outside the page. */
export function playTrack(track: MediaStreamTrack): HTMLVideoElement {
  const video = document.createElement('video');
  video.muted = true;
  video.playsInline = true;
  video.srcObject = new MediaStream([track]);
  // A refusal to play shows as no frames; there is nothing better to do with it.
  video.play().catch(() => undefined);
  return video;
}

/**
 * Calls back with each new frame of a video and when it was captured, on the page's clock (where the browser does not know, when it was
 * shown), until the returned function is called.
 */
export function eachFrame(video: HTMLVideoElement, use: (capturedMs: number, known: boolean) => void): () => void {
  let handle = 0;
  const next = (now: number, metadata: VideoFrameCallbackMetadata): void => {
    handle = video.requestVideoFrameCallback(next);
    use(metadata.captureTime ?? now, metadata.captureTime !== undefined);
  };
  handle = video.requestVideoFrameCallback(next);
  return () => {
    video.cancelVideoFrameCallback(handle);
    video.pause();
    video.srcObject = null;
  };
}
