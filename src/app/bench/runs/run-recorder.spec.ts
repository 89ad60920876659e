import { TestBed } from '@angular/core/testing';
import type { EyeSample } from '../../tracking/eye-sample';
import { LONGEST_MS, RunRecorder } from './run-recorder';

const timings = { cropMs: 1, detectMs: 0, landmarksMs: 6, totalMs: 7.123 };
const sample = (receivedMs: number, found = true): EyeSample => ({
  found,
  eye: { x: 1.2345, y: 2, z: 900 },
  capturedMs: receivedMs - 40,
  receivedMs,
  captureTimeKnown: true,
  timings,
  frameWidth: 640,
  frameHeight: 480,
  landmarks: null,
  viewer: 1,
  others: [],
});

describe('recording a run', () => {
  let recorder: RunRecorder;
  beforeEach(() => (recorder = TestBed.configureTestingModule({ providers: [RunRecorder] }).inject(RunRecorder)));

  it('keeps nothing until it is started', () => {
    recorder.take(sample(1000));
    recorder.start();
    expect(recorder.stop().samples).toEqual([]);
  });

  it('keeps eyes, times from the first sample on and stages; where nobody is, no eye', () => {
    recorder.start();
    for (const tMs of [0, 16, 33, 50]) recorder.frame(tMs);
    recorder.take(sample(1000));
    recorder.take(sample(1033.4, false));
    expect(recorder.stop()).toEqual({
      samples: [
        { capturedMs: -40, receivedMs: 0, eye: [1.23, 2, 900], ...timings, totalMs: 7.12 },
        { capturedMs: -6.6, receivedMs: 33.4, eye: null, ...timings, totalMs: 7.12 },
      ],
      frameIntervalP50Ms: 17,
      frameIntervalP95Ms: 17,
    });
    recorder.take(sample(1066));
    expect(recorder.count()).toBe(2);
  });

  it('goes on where it was stopped, with half a second of nothing in place of the pause', () => {
    recorder.start();
    recorder.take(sample(1000));
    recorder.frame(10);
    recorder.stop();
    recorder.take(sample(5000));
    recorder.goOn();
    recorder.frame(9000);
    recorder.frame(9017);
    recorder.take(sample(9000));
    recorder.take(sample(9033));
    const { samples, frameIntervalP95Ms } = recorder.stop();
    expect(samples.map(({ capturedMs, receivedMs }) => [capturedMs, receivedMs])).toEqual([
      [-40, 0],
      [460, 500],
      [493, 533],
    ]);
    expect(frameIntervalP95Ms).toBe(17);
    expect(recorder.lately(100).map(({ receivedMs }) => receivedMs)).toEqual([500, 533]);
  });

  it('is full after ten minutes, and takes no more', () => {
    recorder.start();
    recorder.take(sample(0));
    recorder.take(sample(LONGEST_MS));
    expect(recorder.full()).toBe(true);
    recorder.take(sample(LONGEST_MS + 33));
    expect(recorder.stop().samples.length).toBe(2);
  });
});
