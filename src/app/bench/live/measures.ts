import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import { followerSettingsOf } from '@oriel/shared/replay/follower-settings-of';
import { type Follower, createFollower } from '@oriel/shared/smoothing/follower';
import type { EyeSample } from '../../tracking/eye-sample';
import type { LadderState } from '../../tracking/ladder-keeper';
import { Series } from './series';
import { StillJitter } from './still-jitter';

/** Everything the instruments show, taken from frames drawn and samples tracked. Times in ms on the page's clock, lengths in mm. */
export class Measures {
  readonly frameInterval = new Series(4000);
  readonly trackingInterval = new Series();
  readonly crop = new Series();
  readonly detect = new Series();
  readonly landmarks = new Series();
  readonly total = new Series();
  readonly latency = new Series();
  readonly seenJitter = new Series(400);
  readonly drawnJitter = new Series(400);
  /** A 1 for each time somebody was lost. */
  readonly losses = new Series(400);
  /** 1 for a look that found somebody, else 0. */
  readonly found = new Series();
  /** The step of the ladder, 1 the finest. */
  readonly ladderStep = new Series(400);
  /** Where the ladder stands; null before it was asked. */
  ladder: LadderState | null = null;
  /** The eye as it would be drawn for. */
  readonly drawnEye = { x: 0, y: 0, z: 1 };
  /** When the first sample came; NaN before. */
  firstLookMs = NaN;
  private readonly seenStill = new StillJitter();
  private readonly drawnStill = new StillJitter();
  private follower: Follower;
  private litAfterMs: number;
  private frameMs = NaN;
  private sampleMs = NaN;
  private waitingMs = NaN;
  private present = false;

  constructor(tuning: TrackerTuning) {
    this.follower = createFollower(followerSettingsOf(tuning));
    this.litAfterMs = tuning.displayDelayMs;
  }

  /** Takes other settings into use. */
  tune(tuning: TrackerTuning): void {
    this.follower = createFollower(followerSettingsOf(tuning));
    this.litAfterMs = tuning.displayDelayMs;
  }

  /** A frame of the page is being drawn at `tMs`, now `nowMs`. */
  frame(tMs: number, nowMs: number): void {
    if (!Number.isNaN(this.frameMs)) this.frameInterval.add(tMs, tMs - this.frameMs);
    this.frameMs = tMs;
    if (!Number.isNaN(this.waitingMs)) this.latency.add(nowMs, nowMs - this.waitingMs);
    this.waitingMs = NaN;
    if (!this.present) return;
    this.follower.at(tMs + this.litAfterMs, this.drawnEye);
    this.drawnStill.add(tMs, this.drawnEye);
  }

  sample({ found, eye, capturedMs, receivedMs, captureTimeKnown, timings }: EyeSample): void {
    if (Number.isNaN(this.firstLookMs)) this.firstLookMs = receivedMs;
    if (!Number.isNaN(this.sampleMs)) this.trackingInterval.add(receivedMs, receivedMs - this.sampleMs);
    this.sampleMs = receivedMs;
    this.crop.add(receivedMs, timings.cropMs);
    this.detect.add(receivedMs, timings.detectMs);
    this.landmarks.add(receivedMs, timings.landmarksMs);
    this.total.add(receivedMs, timings.totalMs);
    this.found.add(receivedMs, found ? 1 : 0);
    if (found && eye.z > 0) {
      this.follower.sample(eye, capturedMs);
      this.seenStill.add(receivedMs, eye);
      if (captureTimeKnown) this.waitingMs = capturedMs;
    } else {
      this.follower.lost(capturedMs);
      this.seenStill.clear();
      this.drawnStill.clear();
      if (this.present) this.losses.add(receivedMs, 1);
    }
    this.present = found;
  }

  /** Where the ladder stands now; to be called a few times a second. */
  stand(nowMs: number, ladder: LadderState): void {
    this.ladder = ladder;
    this.ladderStep.add(nowMs, ladder.step + 1);
  }

  /** Judges rest, NaN where there is none; to be called a few times a second. */
  judge(nowMs: number): void {
    const seen = this.seenStill.at(nowMs);
    const drawn = this.drawnStill.at(nowMs);
    this.seenJitter.add(nowMs, seen ?? NaN);
    this.drawnJitter.add(nowMs, seen === null || drawn === null ? NaN : drawn);
  }
}
