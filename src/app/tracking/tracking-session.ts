import { Pace } from '@oriel/shared/ladder/pace';
import { FIRST_STEP, LADDER_STEPS } from '@oriel/shared/ladder/steps';
import { CALM_CHOICE } from '@oriel/shared/viewer/choose-viewer';
import { FaceMeasure } from './face-measure';
import type { FaceModels } from './face-models';
import { FrameReader } from './frame-picture';
import type { Picture } from './picture';
import { loadFaceModels } from './tfjs-face-models';
import { framesOf, readsTracks } from './track-processor';
import { Tracker } from './tracker';
import type { FaceSample, FromTracker, OtherSample, ToTracker, TrackerSettings } from './tracking-messages';

const NO_OTHERS: readonly OtherSample[] = [];

/** What the worker does with each message; the worker itself only passes messages. Frames are closed whatever happens to them. */
export class TrackingSession {
  private readonly frames = new FrameReader();
  private readonly measure = new FaceMeasure();
  private readonly pace = new Pace();
  private models: FaceModels | null = null;
  private tracker: Tracker | null = null;
  private settings: TrackerSettings | null = null;
  private landmarksWanted = false;
  private reader: ReadableStreamDefaultReader<VideoFrame> | null = null;
  /** The last frame taken from the stream: done with, and closed, once this is settled. */
  private inHand: Promise<void> = Promise.resolve();
  private stopped = false;

  constructor(
    private readonly say: (message: FromTracker) => void,
    private readonly load = loadFaceModels,
  ) {}

  /** Acts on a message; what fails is said, not thrown. */
  async hear(message: ToTracker): Promise<void> {
    try {
      await this.act(message);
    } catch (cause) {
      this.say({ type: 'failed', reason: cause instanceof Error ? cause.message : String(cause) });
    }
  }

  private async act(message: ToTracker): Promise<void> {
    switch (message.type) {
      case 'start':
        return this.start(message.settings);
      case 'settings':
        return this.take(message.settings);
      case 'stream':
        return this.follow(message.frames);
      case 'track':
        return this.follow(framesOf(message.track));
      case 'frame':
        return this.look(message.image, message.timestampMs);
      case 'landmarks':
        this.landmarksWanted = message.wanted;
        return;
      case 'forget':
        this.tracker?.forget();
        return;
      case 'stop':
        return this.stop();
    }
  }

  private async start(settings: TrackerSettings): Promise<void> {
    this.models ??= await this.load({
      folder: settings.assetsUrl,
      read: (name) => fetchFile(settings.assetsUrl + name),
    });
    this.tracker = new Tracker(this.models);
    this.take(settings);
    this.say({ type: 'ready', readsTracks: readsTracks() });
  }

  private take(settings: TrackerSettings): void {
    this.settings = settings;
    if (!this.tracker) return;
    this.tracker.choice = settings.choice ?? CALM_CHOICE;
    this.tracker.looking = settings.looking ?? LADDER_STEPS[FIRST_STEP].looking;
    if (this.tracker.looking.by === 'nothing') this.tracker.forget();
  }

  /** Reads the camera's frames until it ends; the stream keeps only the newest, so that a slow look loses frames and not time. */
  private async follow(frames: ReadableStream<VideoFrame>): Promise<void> {
    await this.reader?.cancel();
    if (this.stopped) return frames.cancel();
    const reader = (this.reader = frames.getReader());
    for (;;) {
      const { done, value } = await reader.read();
      if (done) break;
      await (this.inHand = this.look(value, value.timestamp / 1000));
    }
    if (this.reader === reader) this.say({ type: 'ended' });
  }

  private async look(image: VideoFrame | ImageBitmap, timestampMs: number): Promise<void> {
    try {
      if (!this.tracker || !this.models || !this.settings)
        throw new Error('A frame came before the tracker was started.');
      if (!this.pace.due(timestampMs, this.tracker.looking.mostPerS)) return this.say({ type: 'skipped', timestampMs });
      const begun = performance.now();
      const picture = await this.frames.read(image);
      const readMs = performance.now() - begun;
      const belief = this.tracker.look(picture, timestampMs);
      const face = belief === null ? null : this.faceIn(this.tracker, belief, picture, this.settings, timestampMs);
      const { cropMs, detectMs, landmarksMs } = this.tracker.looks.times;
      this.say({
        type: 'sample',
        timestampMs,
        frameWidth: picture.width,
        frameHeight: picture.height,
        face,
        viewer: this.tracker.viewer,
        others: this.othersIn(this.tracker, picture, this.settings),
        ...(face && this.landmarksWanted && !this.tracker.detected ? { landmarks: acrossAndDown(this.tracker.points) } : {}),
        timings: { cropMs: cropMs + readMs, detectMs, landmarksMs, totalMs: performance.now() - begun },
        tensors: this.models.tensors(),
      });
    } finally {
      image.close();
    }
  }

  private faceIn(
    tracker: Tracker,
    belief: number,
    frame: Picture,
    settings: TrackerSettings,
    timestampMs: number,
  ): FaceSample {
    if (tracker.detected && tracker.glimpsed)
      return this.measure.measureGlimpse(tracker.detected, belief, frame, settings, timestampMs);
    return tracker.detected
      ? this.measure.measureEyes(tracker.detected, belief, frame, settings)
      : this.measure.measure(tracker.points, belief, frame, settings, timestampMs, tracker.looks.detailAlong);
  }

  private othersIn(tracker: Tracker, frame: Picture, settings: TrackerSettings): readonly OtherSample[] {
    if (tracker.others.length === 0) return NO_OTHERS;
    return tracker.others.map(({ id, face }) => {
      const { eyePx, eye } = this.measure.measureEyes(face, face.score, frame, settings);
      return { id, eyePx, eye };
    });
  }

  /** Says `stopped` once the last frame is closed: a worker ended before that would leave it to be collected unclosed. */
  private async stop(): Promise<void> {
    const { reader } = this;
    this.stopped = true;
    this.reader = null;
    await reader?.cancel();
    await this.inHand.catch(() => undefined);
    this.models?.dispose();
    this.models = this.tracker = this.settings = null;
    this.say({ type: 'stopped' });
  }
}

/** x and y of landmarks whose z is left out. */
const acrossAndDown = (points: Float64Array): Float32Array =>
  Float32Array.from({ length: (points.length / 3) * 2 }, (_, i) => points[3 * (i >> 1) + (i & 1)]);

async function fetchFile(url: string): Promise<ArrayBuffer> {
  const reply = await fetch(url);
  if (!reply.ok) throw new Error(`The tracker's file ${url} could not be loaded (${String(reply.status)}).`);
  return reply.arrayBuffer();
}
