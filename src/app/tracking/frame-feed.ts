import { CaptureClock } from './capture-clock';
import { framesOf, readsTracks } from './track-processor';
import type { ToTracker } from './tracking-messages';
import { eachFrame, playTrack } from './video-frames';

/** How long the track is played in a video element to learn the camera's clock. */
const CLOCK_MS = 3000;
/** A machine too slow to show enough frames in that time is given so many times as long. */
const MOST_TRIES = 5;

/** A camera's frames on their way to the worker. */
export interface FrameFeed {
  /** The page's time of capture of a sample with this timestamp; null while the camera's clock is not known. */
  capturedMs(timestampMs: number): number | null;
  /** To be called with each sample: a feed that waits for answers sends its next frame. */
  answered(timestampMs: number): void;
  stop(): void;
}

/**
 * Starts feeding a worker with the frames of a track, the best way this browser has: a stream of frames handed over once (nothing more
 * for the page to do), the track itself where only the worker can read it, or pictures of a playing video, one at a time.
 */
export function feedFrames(track: MediaStreamTrack, worker: Worker, workerReadsTracks: boolean): FrameFeed {
  if (readsTracks()) {
    const frames = framesOf(track);
    tell(worker, { type: 'stream', frames }, [frames]);
    return new StreamFeed(track);
  }
  if (workerReadsTracks) {
    const copy = track.clone();
    try {
      tell(worker, { type: 'track', track: copy }, [copy as unknown as Transferable]);
      return new StreamFeed(track);
    } catch {
      copy.stop();
    }
  }
  return new VideoFeed(track, worker);
}

const tell = (worker: Worker, message: ToTracker, transfer: Transferable[]): void =>
  worker.postMessage(message, transfer);

/** The worker reads the frames itself; here only the camera's clock is learnt. */
class StreamFeed implements FrameFeed {
  private readonly clock = new CaptureClock();
  private readonly endWatch: () => void;
  private timer: ReturnType<typeof setTimeout>;
  private learning = true;
  private tries = 0;
  private offsetMs: number | null = null;

  constructor(track: MediaStreamTrack) {
    this.endWatch = eachFrame(playTrack(track), (capturedMs, known) => {
      if (known) this.clock.noteCapture(capturedMs);
    });
    this.timer = setTimeout(() => this.learnt(), CLOCK_MS);
  }

  capturedMs(timestampMs: number): number | null {
    return this.offsetMs === null ? null : timestampMs + this.offsetMs;
  }

  answered(timestampMs: number): void {
    if (this.learning) this.clock.noteFrame(timestampMs, performance.now());
  }

  stop(): void {
    clearTimeout(this.timer);
    if (this.learning) this.endWatch();
    this.learning = false;
  }

  private learnt(): void {
    this.offsetMs = this.clock.offsetMs();
    if (this.offsetMs !== null || ++this.tries >= MOST_TRIES) this.stop();
    else this.timer = setTimeout(() => this.learnt(), CLOCK_MS);
  }
}

/** Pictures of a playing video, one under way at a time: the next is taken when the one before is answered. */
class VideoFeed implements FrameFeed {
  private readonly endWatch: () => void;
  private underWay = false;
  private stopped = false;

  constructor(
    track: MediaStreamTrack,
    private readonly worker: Worker,
  ) {
    const video = playTrack(track);
    this.endWatch = eachFrame(video, (capturedMs) => void this.send(video, capturedMs));
  }

  capturedMs(timestampMs: number): number {
    return timestampMs;
  }

  answered(): void {
    this.underWay = false;
  }

  stop(): void {
    this.stopped = true;
    this.endWatch();
  }

  private async send(video: HTMLVideoElement, timestampMs: number): Promise<void> {
    if (this.underWay) return;
    this.underWay = true;
    try {
      const image = await createImageBitmap(video);
      if (this.stopped) image.close();
      else tell(this.worker, { type: 'frame', image, timestampMs }, [image]);
    } catch {
      // The video had no picture yet: the next frame will do.
      this.underWay = false;
    }
  }
}
