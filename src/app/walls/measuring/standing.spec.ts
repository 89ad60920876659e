import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { EyeSample } from '../../tracking/eye-sample';
import { FaceTracking } from '../../tracking/face-tracking';
import type { TrackingState } from '../../tracking/tracking-state';
import { USUAL_VIEWER } from '@oriel/shared/viewer/eye-from-landmarks';
import { Standing } from './standing';

const setUp = { camera: { position: { x: 0, y: 0, z: 0 }, pitchRad: 0, yawRad: 0, rollRad: 0, hfovRad: 1, mirrored: false }, viewer: USUAL_VIEWER };

class FakeTracking {
  readonly state = signal<TrackingState>('off');
  readonly picture = signal(null);
  private heard: (sample: EyeSample) => void = () => undefined;
  begins: TrackingState = 'nobody';
  watch(heard: (sample: EyeSample) => void) {
    this.heard = heard;
    return () => undefined;
  }
  start() {
    this.state.set(this.begins);
    return Promise.resolve();
  }
  stop() {
    this.state.set('off');
  }
  sees(z: number | null) {
    this.state.set(z === null ? 'nobody' : 'following');
    this.heard({ found: z !== null, eye: { x: 0, y: 0, z: z ?? 0 } } as EyeSample);
  }
}

describe('standing at the marked spot', () => {
  const tracking = () => TestBed.inject(FaceTracking) as unknown as FakeTracking;
  const make = () => {
    vi.useFakeTimers();
    TestBed.configureTestingModule({ providers: [Standing, { provide: FaceTracking, useClass: FakeTracking }] });
    return TestBed.inject(Standing);
  };
  /** Camera samples, 20 a second. */
  const goesOn = async (ms: number, z: number | null) => {
    for (let t = 0; t < ms; t += 50) {
      await vi.advanceTimersByTimeAsync(50);
      if (tracking().state() !== 'off') tracking().sees(z);
    }
  };
  afterEach(() => vi.useRealTimers());

  it('counts, says whether a face is found and how many readings there are, and when it is done', async () => {
    const standing = make();
    const reading = standing.read(setUp);
    await goesOn(1000, null);
    expect(standing.words()).toContain('Nobody is seen yet');
    expect(standing.seconds()).toBe(5);
    await goesOn(5200, 1500);
    expect(standing.words()).toContain('You are seen');
    const early = standing.readings();
    await goesOn(1000, 1500);
    expect(standing.readings()! - early!).toBe(20);
    await goesOn(2500, 1500);
    const readings = (await reading)!;
    // Three seconds of twenty a second.
    expect(readings.length).toBeGreaterThanOrEqual(58);
    expect(readings.length).toBeLessThanOrEqual(62);
    expect(standing.words()).toBe(`Done, ${readings.length} readings. You may move.`);
    expect([standing.busy(), tracking().state()]).toEqual([false, 'off']);
  });

  it('waits for whoever is not there yet, then says what to do', async () => {
    const standing = make();
    const reading = standing.read(setUp);
    await goesOn(10_000, null);
    expect(standing.words()).toContain('Nobody is seen. Face the glass');
    await goesOn(12_000, null);
    expect(await reading).toBeNull();
    expect(standing.words()).toContain('No face was found. Let light fall on your face');
    expect(standing.busy()).toBe(false);
  });

  it('says why there is no camera, and can be begun again', async () => {
    const standing = make();
    tracking().begins = 'refused';
    const reading = standing.read(setUp);
    await vi.advanceTimersByTimeAsync(10);
    expect(await reading).toBeNull();
    expect(standing.words()).toContain('The camera was refused');
    expect(standing.busy()).toBe(false);
  });
});
