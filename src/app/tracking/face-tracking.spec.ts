import { TestBed } from '@angular/core/testing';
import { USUAL_VIEWER } from '@oriel/shared/viewer/eye-from-landmarks';
import type { EyeSample } from './eye-sample';
import { FaceTracking, type TrackingSetUp } from './face-tracking';
import type { FromTracker, ToTracker } from './tracking-messages';
import { CAMERAS, FRAME_FEED, TRACKING_WORKER } from './tracking-surroundings';

const SET_UP: TrackingSetUp = {
  camera: { position: { x: 0, y: 170, z: 0 }, pitchRad: 0, yawRad: 0, rollRad: 0, hfovRad: 1, mirrored: false },
  viewer: USUAL_VIEWER,
};
const TIMINGS = { cropMs: 1, detectMs: 0, landmarksMs: 4, totalMs: 5 };

/** A camera track that can be unplugged. */
class FakeTrack extends EventTarget {
  stopped = false;
  stop(): void {
    this.stopped = true;
  }
}

/** Cameras that give one track after another, or fail by name. */
class FakeCameras extends EventTarget {
  readonly tracks: FakeTrack[] = [];
  failing: string | null = null;
  getUserMedia(): Promise<MediaStream> {
    if (this.failing) return Promise.reject(new DOMException('', this.failing));
    const track = new FakeTrack();
    this.tracks.push(track);
    return Promise.resolve({ getTracks: () => [track], getVideoTracks: () => [track] } as unknown as MediaStream);
  }
}

class FakeWorker {
  onmessage: ((event: { data: FromTracker }) => void) | null = null;
  onerror: (() => void) | null = null;
  terminated = false;
  readonly told: ToTracker[] = [];
  postMessage(message: ToTracker): void {
    this.told.push(message);
  }
  terminate(): void {
    this.terminated = true;
  }
  says(data: FromTracker): void {
    this.onmessage?.({ data });
  }
  sees(x: number | null, timestampMs = 100): void {
    const eye = { x: x ?? 0, y: 0, z: 600 };
    const pixel = { x: 0, y: 0 };
    const head = { yawRad: 0, pitchRad: 0, rollRad: 0 };
    const face = {
      rightEyePx: pixel,
      leftEyePx: pixel,
      eyePx: pixel,
      ipdPx: 60,
      eye,
      eyeInCamera: eye,
      head,
      belief: 1,
    };
    const frame = { viewer: x === null ? null : 1, others: [], frameWidth: 640, frameHeight: 480, timings: TIMINGS, tensors: 472 };
    this.says({ type: 'sample', timestampMs, face: x === null ? null : face, ...frame });
  }
}

describe('FaceTracking', () => {
  let cameras: FakeCameras;
  let workers: FakeWorker[];
  let answered: number[];

  const create = (): FaceTracking => TestBed.inject(FaceTracking);
  const following = async (): Promise<{ tracking: FaceTracking; worker: FakeWorker }> => {
    const tracking = create();
    await tracking.start(SET_UP);
    workers[0].says({ type: 'ready', readsTracks: false });
    return { tracking, worker: workers[0] };
  };

  beforeEach(() => {
    vi.useFakeTimers();
    cameras = new FakeCameras();
    workers = [];
    answered = [];
    const makeWorker = (): FakeWorker => {
      workers.push(new FakeWorker());
      return workers[workers.length - 1];
    };
    const feed = {
      capturedMs: (t: number) => t + 7,
      answered: (t: number) => answered.push(t),
      stop: () => answered.push(-1),
    };
    TestBed.configureTestingModule({
      providers: [
        FaceTracking,
        { provide: CAMERAS, useValue: cameras },
        { provide: TRACKING_WORKER, useValue: makeWorker },
        { provide: FRAME_FEED, useValue: () => feed },
      ],
    });
  });

  afterEach(() => vi.useRealTimers());

  it('goes from off over starting to nobody and following', async () => {
    const tracking = create();
    expect(tracking.state()).toBe('off');
    const started = tracking.start(SET_UP);
    expect(tracking.state()).toBe('asking');
    await started;
    expect(tracking.state()).toBe('starting');
    workers[0].says({ type: 'ready', readsTracks: false });
    workers[0].sees(null);
    expect(tracking.state()).toBe('nobody');
    workers[0].sees(120);
    expect(tracking.state()).toBe('following');
  });

  it('tells the worker the set-up, and a change of it', async () => {
    const { tracking, worker } = await following();
    expect(worker.told[0]).toMatchObject({ type: 'start', settings: { camera: SET_UP.camera, viewer: USUAL_VIEWER } });
    tracking.change({ ...SET_UP, viewer: { eyeDistanceMm: 60, distanceFactor: 1 } });
    expect(worker.told[1]).toMatchObject({ type: 'settings', settings: { viewer: { eyeDistanceMm: 60 } } });
  });

  it('gives the camera’s picture while there is one, and landmarks only when they were asked for', async () => {
    const { tracking, worker } = await following();
    expect(tracking.picture()).not.toBeNull();
    expect(worker.told.some(({ type }) => type === 'landmarks')).toBe(false);
    tracking.showLandmarks(true);
    expect(worker.told[1]).toEqual({ type: 'landmarks', wanted: true });
    tracking.stop();
    expect(tracking.picture()).toBeNull();
    await tracking.start(SET_UP);
    expect(workers[1].told[1]).toEqual({ type: 'landmarks', wanted: true });
  });

  it('hands out the eye with its time of capture, keeps the last place where nobody is, and stops when told', async () => {
    const { tracking, worker } = await following();
    const seen: EyeSample[] = [];
    const end = tracking.watch((sample) => seen.push({ ...sample }));
    worker.sees(120, 500);
    worker.sees(null, 533);
    end();
    worker.sees(130, 566);
    expect(seen.map(({ found, eye, capturedMs }) => [found, eye.x, capturedMs])).toEqual([
      [true, 120, 507],
      [false, 120, 540],
    ]);
    expect(answered).toEqual([500, 533, 566]);
  });

  it.each([
    ['NotAllowedError', 'refused'],
    ['NotFoundError', 'no-camera'],
    ['NotReadableError', 'camera-busy'],
  ] as const)('shows %s as %s', async (name, state) => {
    cameras.failing = name;
    const tracking = create();
    await tracking.start(SET_UP);
    expect(tracking.state()).toBe(state);
    expect(workers).toHaveLength(0);
  });

  it('asks again by itself for a camera in use elsewhere, and never for one refused', async () => {
    const tracking = create();
    cameras.failing = 'NotReadableError';
    await tracking.start(SET_UP);
    cameras.failing = null;
    await vi.advanceTimersByTimeAsync(5000);
    expect(tracking.state()).toBe('starting');
    cameras.failing = 'NotAllowedError';
    await tracking.start(SET_UP);
    cameras.failing = null;
    await vi.advanceTimersByTimeAsync(60_000);
    expect(tracking.state()).toBe('refused');
  });

  it('comes back when an unplugged camera is plugged in again', async () => {
    const { tracking } = await following();
    cameras.failing = 'NotFoundError';
    cameras.tracks[0].dispatchEvent(new Event('ended'));
    expect(tracking.state()).toBe('no-camera');
    workers[0].says({ type: 'stopped' });
    expect(workers[0].terminated).toBe(true);
    cameras.failing = null;
    cameras.dispatchEvent(new Event('devicechange'));
    await vi.advanceTimersByTimeAsync(0);
    expect(tracking.state()).toBe('starting');
  });

  it('says so where the worker fails, and tries again', async () => {
    const { tracking, worker } = await following();
    worker.says({ type: 'failed', reason: 'no wasm' });
    expect(tracking.state()).toBe('failed');
    await vi.advanceTimersByTimeAsync(6000);
    expect(tracking.state()).toBe('starting');
  });

  it('waits longer each time a worker fails, five minutes at most, and no longer once it has seen a frame', async () => {
    vi.spyOn(Math, 'random').mockReturnValue(0.5);
    const { tracking } = await following();
    const waits: number[] = [];
    for (let failure = 0; failure < 9; failure++) {
      workers.at(-1)!.says({ type: 'failed', reason: 'no wasm' });
      let waitedMs = 0;
      for (; tracking.state() === 'failed'; waitedMs += 1000) await vi.advanceTimersByTimeAsync(1000);
      waits.push(waitedMs / 1000);
    }
    expect(waits).toEqual([5, 10, 20, 40, 80, 160, 300, 300, 300]);
    workers.at(-1)!.says({ type: 'ready', readsTracks: true });
    workers.at(-1)!.sees(null);
    workers.at(-1)!.says({ type: 'failed', reason: 'no wasm' });
    await vi.advanceTimersByTimeAsync(5000);
    expect(tracking.state()).toBe('starting');
  });

  it('frees everything at stop, and when its component goes', async () => {
    const { tracking, worker } = await following();
    tracking.stop();
    expect(worker.told.at(-1)).toEqual({ type: 'stop' });
    worker.sees(0);
    await vi.advanceTimersByTimeAsync(3000);
    expect(worker.terminated).toBe(false);
    worker.says({ type: 'stopped' });
    expect([tracking.state(), worker.terminated, cameras.tracks[0].stopped, answered.includes(-1)]).toEqual([
      'off',
      true,
      true,
      true,
    ]);
    await tracking.start(SET_UP);
    TestBed.resetTestingModule();
    await vi.advanceTimersByTimeAsync(10_000);
    expect([workers[1].terminated, cameras.tracks[1].stopped]).toEqual([true, true]);
  });

  it('gives back a camera that is granted only after a stop', async () => {
    const tracking = create();
    const started = tracking.start(SET_UP);
    tracking.stop();
    await started;
    expect(tracking.state()).toBe('off');
    expect(cameras.tracks[0].stopped).toBe(true);
  });

  it('counts the faces of the last second', async () => {
    const { tracking, worker } = await following();
    for (let frame = 0; frame < 28; frame++) worker.sees(0);
    worker.sees(null);
    await vi.advanceTimersByTimeAsync(1000);
    expect(tracking.facesPerSecond()).toBe(28);
  });
});
