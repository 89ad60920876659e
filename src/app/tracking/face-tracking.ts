import { DOCUMENT, DestroyRef, Injectable, inject, signal } from '@angular/core';
import type { ViewerMeasure } from '@oriel/shared/viewer/eye-from-landmarks';
import type { ChoiceRule } from '@oriel/shared/viewer/choose-viewer';
import { Backoff } from '../core/backoff';
import { requestCamera } from './camera-request';
import type { EyeSample } from './eye-sample';
import type { FrameFeed } from './frame-feed';
import { LadderKeeper } from './ladder-keeper';
import type { CameraSetUp, FromTracker, SampleMessage, ToTracker, TrackerSettings } from './tracking-messages';
import { askForShortExposure } from './short-exposure';
import type { TrackingState } from './tracking-state';
import { CAMERAS, FRAME_FEED, TRACKING_WORKER } from './tracking-surroundings';

/** What following needs to know of this screen and this viewer. */
export interface TrackingSetUp {
  /** Position, turn and field of view of the camera against the glass. */
  readonly camera: CameraSetUp;
  /** The distance between the viewer's eyes, and the factor found by standing at a known distance; `USUAL_VIEWER` until measured. */
  readonly viewer: ViewerMeasure;
  /** Whom to follow of several; the nearest, calmly, where left out. */
  readonly choice?: ChoiceRule;
}

/** Without a camera, or with one in use elsewhere, it is asked for again this often. */
const RETRY_MS = 5000;
/** What failed of itself is tried again after longer and longer, up to this. */
const LONGEST_RETRY_MS = 300_000;
const RATE_MS = 1000;
/** How long a worker that is dismissed has at most to close its last frame: on a laden machine one look can take a second. */
const FAREWELL_MS = 10_000;

type Mutable<T> = { -readonly [K in keyof T]: T[K] };

/**
 * Follows a face through the camera: asks for it, feeds its frames to the tracking worker and hands out where the eye is.
 * Provide it in the component that follows; everything is freed when that component goes. A camera lost is asked for again by itself.
 * No picture leaves the page or is kept.
 */
@Injectable()
export class FaceTracking {
  private readonly cameras = inject(CAMERAS);
  private readonly makeWorker = inject(TRACKING_WORKER);
  private readonly feedFrames = inject(FRAME_FEED);
  private readonly assetsUrl = new URL('/assets/tracker/', inject(DOCUMENT).baseURI).href;

  private readonly currentState = signal<TrackingState>('off');
  /** Where following stands. */
  readonly state = this.currentState.asReadonly();
  private readonly rate = signal(0);
  /** Faces followed a second, measured over the last second. */
  readonly facesPerSecond = this.rate.asReadonly();

  private readonly camera = signal<MediaStream | null>(null);
  /** The camera's own picture, for whoever set the screen up to look at on this screen; null while there is none. */
  readonly picture = this.camera.asReadonly();
  private readonly keeper = new LadderKeeper();
  private readonly ladderState = signal(this.keeper.state);
  /** How finely is looked, by what looking takes on this machine; kept over losses of the camera. */
  readonly ladder = this.ladderState.asReadonly();
  private framesPerSecond: (() => number) | null = null;

  private readonly listeners = new Set<(sample: EyeSample) => void>();
  private readonly sample: Mutable<EyeSample> = {
    found: false,
    eye: { x: 0, y: 0, z: 0 },
    capturedMs: 0,
    receivedMs: 0,
    captureTimeKnown: false,
    timings: { cropMs: 0, detectMs: 0, landmarksMs: 0, totalMs: 0 },
    frameWidth: 0,
    frameHeight: 0,
    landmarks: null,
    viewer: null,
    others: [],
  };
  private landmarksWanted = false;
  private setUp: TrackingSetUp | null = null;
  private stream: MediaStream | null = null;
  private worker: Worker | null = null;
  private feed: FrameFeed | null = null;
  private retry: ReturnType<typeof setTimeout> | undefined;
  private readonly failures = new Backoff(RETRY_MS, LONGEST_RETRY_MS);
  private counter: ReturnType<typeof setInterval> | undefined;
  private faces = 0;
  /** Takes the listener off a track that is let go: Chromium keeps a stream for seconds after, and all that listens to it. */
  private released = new AbortController();
  /** Counts starts and stops, so that an answer that comes after a stop is known for stale. */
  private attempt = 0;

  constructor() {
    this.cameras?.addEventListener('devicechange', this.camerasChanged);
    inject(DestroyRef).onDestroy(() => {
      this.stop();
      this.listeners.clear();
      this.cameras?.removeEventListener('devicechange', this.camerasChanged);
    });
  }

  /** Asks for the camera and starts following; safe to call in any state. Never throws: what went wrong is in `state`. */
  async start(setUp: TrackingSetUp): Promise<void> {
    this.stop();
    this.setUp = setUp;
    const attempt = this.attempt;
    if (!this.cameras || !this.makeWorker) {
      this.currentState.set('unsupported');
      return;
    }
    this.currentState.set('asking');
    const answer = await requestCamera(this.cameras);
    if (attempt !== this.attempt) {
      if (answer.given) endTracks(answer.stream);
      return;
    }
    if (!answer.given) return this.goWithout(answer.why);
    this.stream = answer.stream;
    this.camera.set(answer.stream);
    this.currentState.set('starting');
    answer.stream.getVideoTracks()[0].addEventListener('ended', () => this.goWithout('no-camera'), { signal: this.released.signal });
    void askForShortExposure(answer.stream.getVideoTracks()[0]);
    this.startWorker(this.makeWorker(), setUp);
    this.counter = setInterval(() => this.count(), RATE_MS);
  }

  /** Takes a changed set-up of screen or viewer into use at once, without asking for the camera again. */
  change(setUp: TrackingSetUp): void {
    this.setUp = setUp;
    this.tell({ type: 'settings', settings: this.settingsFor(setUp) });
  }

  /** Whether samples carry the landmarks, to be drawn over the picture; costs a small array a frame, so off unless asked for. */
  showLandmarks(wanted: boolean): void {
    this.landmarksWanted = wanted;
    this.tell({ type: 'landmarks', wanted });
  }

  /** Releases the camera, ends the worker and forgets the viewer. */
  stop(): void {
    this.release();
    this.setUp = null;
    this.currentState.set('off');
  }

  /**
   * Calls back with every frame looked at, face or none, until the returned function is called. The sample is the same object each time:
   * copy what must be kept. Called outside of change detection.
   */
  watch(listener: (sample: EyeSample) => void): () => void {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  }

  /** Whoever draws tells how many frames a second, so that tracking gives way where it hampers them. */
  minds(framesPerSecond: () => number): void {
    this.framesPerSecond = framesPerSecond;
  }

  private readonly camerasChanged = (): void => {
    if (this.setUp && !this.stream && this.currentState() !== 'asking') void this.start(this.setUp);
  };

  private startWorker(worker: Worker, setUp: TrackingSetUp): void {
    this.worker = worker;
    worker.onmessage = ({ data }: MessageEvent<FromTracker>) => this.hear(data);
    worker.onerror = () => this.goWithout('failed');
    this.tell({ type: 'start', settings: this.settingsFor(setUp) });
    if (this.landmarksWanted) this.tell({ type: 'landmarks', wanted: true });
  }

  private hear(message: FromTracker): void {
    switch (message.type) {
      case 'ready':
        if (this.stream && this.worker)
          this.feed = this.feedFrames(this.stream.getVideoTracks()[0], this.worker, message.readsTracks);
        return;
      case 'sample':
        return this.take(message);
      case 'skipped':
        return this.feed?.answered(message.timestampMs);
      case 'ended':
        return this.goWithout('no-camera');
      case 'failed':
        return this.goWithout('failed');
    }
  }

  private take({ timestampMs, face, viewer, others, timings, frameWidth, frameHeight, landmarks }: SampleMessage): void {
    if (!this.feed || !this.setUp) return;
    this.feed.answered(timestampMs);
    const { sample } = this;
    const capturedMs = this.feed.capturedMs(timestampMs);
    this.failures.succeeded();
    sample.receivedMs = performance.now();
    sample.capturedMs = capturedMs ?? sample.receivedMs;
    sample.captureTimeKnown = capturedMs !== null;
    sample.found = face !== null;
    sample.timings = timings;
    sample.frameWidth = frameWidth;
    sample.frameHeight = frameHeight;
    sample.landmarks = landmarks ?? null;
    sample.viewer = viewer;
    sample.others = others;
    if (face) {
      this.faces++;
      this.keeper.note(timings.totalMs);
      sample.eye = face.eye;
    }
    this.currentState.set(face ? 'following' : 'nobody');
    for (const listener of this.listeners) listener(sample);
  }

  /** Says why there is no following, frees everything, and tries again later where that can help: a tracker that fails, after longer each time. */
  private goWithout(why: TrackingState): void {
    const { setUp } = this;
    this.release();
    this.currentState.set(why);
    if (setUp && why !== 'refused' && why !== 'unsupported')
      this.retry = setTimeout(() => void this.start(setUp), why === 'failed' ? this.failures.next() : RETRY_MS);
  }

  private release(): void {
    this.attempt++;
    this.released.abort();
    this.released = new AbortController();
    clearTimeout(this.retry);
    clearInterval(this.counter);
    this.feed?.stop();
    if (this.worker) dismiss(this.worker);
    if (this.stream) endTracks(this.stream);
    this.feed = this.worker = this.stream = null;
    this.camera.set(null);
    this.faces = 0;
    this.rate.set(0);
  }

  private count(): void {
    this.rate.set(this.faces);
    this.faces = 0;
    if (!this.keeper.second(performance.now(), this.framesPerSecond?.() ?? null)) return;
    this.ladderState.set(this.keeper.state);
    performance.mark('oriel ladder', { detail: this.keeper.state.changes.at(-1) });
    if (this.setUp) this.change(this.setUp);
    if (this.keeper.step.looking.by === 'nothing' && this.feed) this.currentState.set('nobody');
  }

  private tell(message: ToTracker): void {
    this.worker?.postMessage(message);
  }

  private settingsFor(setUp: TrackingSetUp): TrackerSettings {
    const { camera, viewer, choice } = setUp;
    return { assetsUrl: this.assetsUrl, camera, viewer, looking: this.keeper.step.looking, ...(choice && { choice }) };
  }
}

/** Lets the worker close the frames it still holds, and ends it when it says so; what else it says meanwhile is not heard. */
function dismiss(worker: Worker): void {
  const end = () => {
    clearTimeout(waiting);
    worker.terminate();
  };
  const waiting = setTimeout(end, FAREWELL_MS);
  worker.onmessage = ({ data }: MessageEvent<FromTracker>) => data.type === 'stopped' && end();
  worker.onerror = end;
  const stop: ToTracker = { type: 'stop' };
  worker.postMessage(stop);
}

function endTracks(stream: MediaStream): void {
  for (const track of stream.getTracks()) track.stop();
}
