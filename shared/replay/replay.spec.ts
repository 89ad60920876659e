import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { usualTuning } from '../contracts/new-wall';
import { followerSettingsOf } from './follower-settings-of';
import { jitterMm } from './jitter';
import { lagInMotionMs, strayInMotion } from './lag';
import { knownAt, laterKnown } from './later-known';
import { replay } from './replay';
import { createTrack, type Track } from './sample';
import { movingStretches, stillStretches, totalMs } from './stretches';
import { lowPassOnly, madeUpRun, normalNoise, standsThenWalks, type Eye } from './testing';

const hz = 60;
const sine =
  (frequency: number, mm = 100) =>
  (tMs: number): Eye => [mm * Math.sin((2 * Math.PI * frequency * tMs) / 1000), 0, 1000];

/** Phase of the digital first-order low-pass H(z) = a/(1 - (1-a) z^-1) at a frequency, as a delay in ms (computed; any text on digital filters). */
function digitalDelayMs(cutoffHz: number, frequency: number, rateHz: number): number {
  const a = 1 / (1 + rateHz / (2 * Math.PI * cutoffHz));
  const w = (2 * Math.PI * frequency) / rateHz;
  return (1000 * Math.atan2((1 - a) * Math.sin(w), 1 - (1 - a) * Math.cos(w))) / (2 * Math.PI * frequency);
}

describe('lag in motion', () => {
  it.each([
    [1, 0.5],
    [1, 1],
    [3, 1],
  ])('of a low-pass of %f Hz at %f Hz is what theory says', (cutoff, frequency) => {
    const samples = madeUpRun(sine(frequency), { rateHz: hz, untilMs: 12_000 });
    const known = laterKnown(samples);
    const track = replay(samples, lowPassOnly(cutoff), 0, hz);
    // The low-pass also shrinks the sine, which does not move the delay of best fit.
    const lag = lagInMotionMs(track, known, [{ fromMs: 4000, toMs: 11_000 }], 'across');
    expect(Math.abs(lag - digitalDelayMs(cutoff, frequency, hz))).toBeLessThan(1);
    // And of the analogue filter, atan(f/fc)/(2 pi f), within the half sample by which the digital one is quicker.
    expect(Math.abs(lag - (1000 * Math.atan(frequency / cutoff)) / (2 * Math.PI * frequency))).toBeLessThan(1000 / hz);
  });

  it('finds a pure delay, and strays by just that time', () => {
    fc.assert(
      fc.property(fc.double({ min: -80, max: 400, noNaN: true }), (delay) => {
        const samples = madeUpRun(sine(0.3), { untilMs: 12_000 });
        const track = shifted(sine(0.3), delay);
        const known = laterKnown(samples);
        const moving = [{ fromMs: 1000, toMs: 11_000 }];
        expect(Math.abs(lagInMotionMs(track, known, moving, 'across') - delay)).toBeLessThan(0.5);
        if (Math.abs(delay) < 100 && Math.abs(delay) > 5)
          expect(strayInMotion(track, known, moving, 'across').ms / Math.abs(delay)).toBeCloseTo(1, 1);
      }),
      { numRuns: 25 },
    );
  });

  it('counts what arrives late as late', () => {
    const late = 90;
    const samples = madeUpRun(sine(0.4), { untilMs: 12_000, lateMs: late });
    const track = replay(samples, lowPassOnly(1000), 0, 240);
    const lag = lagInMotionMs(track, laterKnown(samples), [{ fromMs: 2000, toMs: 11_000 }], 'across');
    // A sample stands until the next: half an interval of 33 ms more.
    expect(Math.abs(lag - (late + 1000 / 60))).toBeLessThan(3);
  });

  it('is NaN when nobody moves', () => {
    const samples = madeUpRun(() => [0, 0, 1000]);
    expect(lagInMotionMs(replay(samples, lowPassOnly(1), 0), laterKnown(samples), [], 'across')).toBeNaN();
  });
});

describe('jitter at rest', () => {
  it.each([2, 4, 8])(
    'of white noise through a low-pass of %f Hz is sqrt(a/(2-a)) of it (variance of a first-order autoregression)',
    (cutoff) => {
      const samples = madeUpRun(() => [50, 0, 1000], { rateHz: hz, untilMs: 120_000, across: 1, along: 5 });
      const track = replay(samples, lowPassOnly(cutoff), 0, hz);
      const a = 1 / (1 + hz / (2 * Math.PI * cutoff));
      const still = [{ fromMs: 2000, toMs: 119_000 }];
      // The straight lines taken out hold a part of slow noise: up to 8 % at 2 Hz.
      expect(jitterMm(track, still, 'across') / (Math.SQRT2 * Math.sqrt(a / (2 - a)))).toBeGreaterThan(0.9);
      expect(jitterMm(track, still, 'across') / (Math.SQRT2 * Math.sqrt(a / (2 - a)))).toBeLessThan(1.04);
      expect(jitterMm(track, still, 'along') / (5 * Math.sqrt(a / (2 - a)))).toBeCloseTo(1, 0);
    },
  );

  it('does not count slow sway', () => {
    const track = shifted((tMs) => [tMs / 200, 0, 1000], 0);
    expect(jitterMm(track, [{ fromMs: 0, toMs: 8000 }], 'across')).toBeLessThan(1e-6);
  });
});

describe('the later-known eye', () => {
  it('lets a parabola through unchanged, from uneven samples too', () => {
    const noise = normalNoise();
    const samples = Array.from({ length: 200 }, (_, i) => {
      const t = i * 33 + 8 * Math.tanh(noise());
      return { capturedMs: t, receivedMs: t, eye: [3e-5 * t * t - 0.1 * t, 20, 1000] as Eye };
    });
    const known = laterKnown(samples);
    for (let t = 500; t < 6000; t += 137) {
      expect(Math.abs(knownAt(known, 'x', t) - (3e-5 * t * t - 0.1 * t))).toBeLessThan(0.01);
      expect(knownAt(known, 'z', t)).toBeCloseTo(1000, 6);
    }
  });

  it('knows nothing where nobody was', () => {
    const samples = madeUpRun(() => [0, 0, 1000]).map((s) =>
      s.capturedMs > 3000 && s.capturedMs < 5000 ? { ...s, eye: null } : s,
    );
    const known = laterKnown(samples);
    expect(knownAt(known, 'x', 4000)).toBeNaN();
    expect(knownAt(known, 'x', 2000)).toBeCloseTo(0, 9);
  });

  it('tells rest from motion', () => {
    const known = laterKnown(madeUpRun(standsThenWalks, { untilMs: 14_000, across: 0.5, along: 5 }));
    const still = stillStretches(known);
    expect(still.length).toBe(1);
    expect(still[0].toMs).toBeGreaterThan(5500);
    expect(still[0].toMs).toBeLessThan(6300);
    expect(totalMs(movingStretches(known, 'across'))).toBeGreaterThan(6000);
    expect(movingStretches(known, 'across')[0].fromMs).toBeGreaterThan(5800);
  });
});

describe('replay', () => {
  it('gives the same track for the same run, whatever it is', () => {
    const sample = fc.record({
      step: fc.double({ min: 1, max: 200, noNaN: true }),
      late: fc.double({ min: 0, max: 100, noNaN: true }),
      eye: fc.option(
        fc.tuple(
          fc.double({ min: -800, max: 800, noNaN: true }),
          fc.double({ min: -300, max: 300, noNaN: true }),
          fc.double({ min: -10, max: 4000, noNaN: true }),
        ),
      ),
    });
    fc.assert(
      fc.property(fc.array(sample, { minLength: 2, maxLength: 60 }), (made) => {
        let t = 0;
        const samples = made.map(({ step, late, eye }) => ({ capturedMs: (t += step), receivedMs: t + late, eye }));
        samples.forEach((s, i) => (s.receivedMs = Math.max(s.receivedMs, samples[i - 1]?.receivedMs ?? 0)));
        const settings = followerSettingsOf(usualTuning);
        const once = replay(samples, settings, 20);
        expect(replay(samples, settings, 20)).toEqual(once);
        for (const value of once.z) expect(value).toBeGreaterThan(0);
      }),
      { numRuns: 60 },
    );
  });

  it('of nobody is empty', () => {
    expect(replay([{ capturedMs: 0, receivedMs: 0, eye: null }], followerSettingsOf(usualTuning), 0).tMs.length).toBe(
      0,
    );
  });
});

function shifted(path: (tMs: number) => Eye, delayMs: number): Track {
  const track = createTrack(720);
  for (let i = 0; i < track.tMs.length; i++) {
    track.tMs[i] = (i * 1000) / hz;
    [track.x[i], track.y[i], track.z[i]] = path(track.tMs[i] - delayMs);
  }
  return track;
}
