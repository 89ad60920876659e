import type { RunSample } from '../contracts/runs';
import type { TrackerTuning } from '../contracts/wall-set-up';
import { captureKnown, onOneClock } from './capture-time';
import { followerSettingsOf } from './follower-settings-of';
import { jitterMm } from './jitter';
import { lagInMotionMs } from './lag';
import { laterKnown } from './later-known';
import { replay } from './replay';
import { createTrack, type Track } from './sample';
import { spreadOf, type Spread } from './spread';
import { movingStretches, stillStretches } from './stretches';

/** A run in figures: times in ms, lengths in mm; NaN where the run does not show it. */
export interface RunFigures {
  readonly trackedPerS: number;
  readonly intervalMs: Spread;
  readonly cropMs: Spread;
  readonly detectMs: Spread;
  readonly landmarksMs: Spread;
  readonly totalMs: Spread;
  /** From capture to the page, of the samples whose capture is known. */
  readonly arrivalMs: Spread;
  /** How often somebody was lost. */
  readonly losses: number;
  /** Share of the looks that found somebody. */
  readonly foundShare: number;
  /** At rest, as the camera saw it, and as it would be drawn with the run's own tuning. */
  readonly seenJitterMm: number;
  readonly drawnJitterMm: number;
  readonly seenAlongJitterMm: number;
  readonly lagMs: number;
}

export function figuresOf(recorded: readonly RunSample[], tuning: TrackerTuning): RunFigures {
  const samples = onOneClock(recorded);
  const of = (figure: (sample: RunSample) => number) => spreadOf(samples.map(figure));
  const known = laterKnown(samples);
  const still = stillStretches(known);
  const drawn = replay(samples, followerSettingsOf(tuning), tuning.displayDelayMs);
  const seen = asSeen(samples);
  const found = samples.filter(({ eye }) => eye !== null).length;
  const lengthMs = samples.length ? samples[samples.length - 1].receivedMs - samples[0].receivedMs : 0;
  return {
    trackedPerS: lengthMs > 0 ? (1000 * (samples.length - 1)) / lengthMs : NaN,
    intervalMs: spreadOf(samples.slice(1).map(({ receivedMs }, i) => receivedMs - samples[i].receivedMs)),
    cropMs: of(({ cropMs }) => cropMs),
    detectMs: of(({ detectMs }) => detectMs),
    landmarksMs: of(({ landmarksMs }) => landmarksMs),
    totalMs: of(({ totalMs }) => totalMs),
    arrivalMs: spreadOf(recorded.filter(captureKnown).map(({ capturedMs, receivedMs }) => receivedMs - capturedMs)),
    losses: samples.filter(({ eye }, i) => i > 0 && eye === null && samples[i - 1].eye !== null).length,
    foundShare: samples.length ? found / samples.length : NaN,
    seenJitterMm: jitterMm(seen, still, 'across'),
    drawnJitterMm: jitterMm(drawn, still, 'across'),
    seenAlongJitterMm: jitterMm(seen, still, 'along'),
    lagMs: lagInMotionMs(drawn, known, movingStretches(known, 'across'), 'across'),
  };
}

function asSeen(samples: readonly RunSample[]): Track {
  const seen = samples.filter((sample) => sample.eye !== null);
  const track = createTrack(seen.length);
  seen.forEach(({ capturedMs, eye }, i) => {
    track.tMs[i] = capturedMs;
    [track.x[i], track.y[i], track.z[i]] = eye!;
  });
  return track;
}
