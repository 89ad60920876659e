import { Injectable, computed, signal } from '@angular/core';
import { type RunSample, runMaxSamples } from '@oriel/shared/contracts/runs';
import { spreadOf } from '@oriel/shared/replay/spread';
import type { EyeSample } from '../../tracking/eye-sample';

/** The longest run. */
export const LONGEST_MS = 600_000;
/** Where recording was stopped and gone on with, nothing is known for so long: the pause itself does not count. */
const PAUSE_MS = 500;
/** The count and the clock are shown this often. */
const SHOWN_EVERY_MS = 250;

/** What was recorded: eye samples and timings, never a picture. Times in ms since the first sample. */
export interface Recording {
  readonly samples: RunSample[];
  readonly frameIntervalP50Ms: number;
  readonly frameIntervalP95Ms: number;
}

const round = (figure: number) => Math.round(figure * 100) / 100;

/** Keeps the samples of one run while it is recorded; stops by itself after ten minutes. */
@Injectable()
export class RunRecorder {
  private samples: RunSample[] = [];
  private intervals: number[] = [];
  private frameMs = NaN;
  private startMs = NaN;
  private paused = false;
  private shownMs = 0;
  private readonly running = signal(false);
  private readonly shown = signal({ count: 0, elapsedMs: 0 });
  readonly recording = this.running.asReadonly();
  readonly count = computed(() => this.shown().count);
  readonly remainingMs = computed(() => Math.max(0, LONGEST_MS - this.shown().elapsedMs));
  /** Whether the ten minutes, or the samples a run may hold, are used up. */
  readonly full = computed(() => this.remainingMs() === 0 || this.count() >= runMaxSamples);

  start(): void {
    this.samples = [];
    this.intervals = [];
    this.startMs = this.frameMs = NaN;
    this.paused = false;
    this.shown.set({ count: 0, elapsedMs: 0 });
    this.running.set(true);
  }

  /** Records on where it was stopped. */
  goOn(): void {
    this.frameMs = NaN;
    this.paused = this.samples.length > 0;
    this.running.set(true);
  }

  take({ found, eye, capturedMs, receivedMs, timings }: EyeSample): void {
    if (!this.running() || this.samples.length >= runMaxSamples) return;
    if (Number.isNaN(this.startMs)) this.startMs = receivedMs;
    if (this.paused) this.startMs = receivedMs - this.samples[this.samples.length - 1].receivedMs - PAUSE_MS;
    this.paused = false;
    const elapsedMs = receivedMs - this.startMs;
    if (elapsedMs > LONGEST_MS) return this.show(LONGEST_MS);
    this.samples.push({
      capturedMs: round(capturedMs - this.startMs),
      receivedMs: round(elapsedMs),
      eye: found ? [round(eye.x), round(eye.y), round(eye.z)] : null,
      cropMs: round(timings.cropMs),
      detectMs: round(timings.detectMs),
      landmarksMs: round(timings.landmarksMs),
      totalMs: round(timings.totalMs),
    });
    if (receivedMs > this.shownMs + SHOWN_EVERY_MS || this.samples.length >= runMaxSamples) {
      this.shownMs = receivedMs;
      this.show(elapsedMs);
    }
  }

  frame(tMs: number): void {
    if (!this.running()) return;
    if (!Number.isNaN(this.frameMs)) this.intervals.push(tMs - this.frameMs);
    this.frameMs = tMs;
  }

  /** The samples of the last `lengthMs`. */
  lately(lengthMs: number): readonly RunSample[] {
    const sinceMs = (this.samples[this.samples.length - 1]?.receivedMs ?? 0) - lengthMs;
    return this.samples.slice(this.samples.findIndex(({ receivedMs }) => receivedMs >= sinceMs));
  }

  /** What there is so far. */
  soFar(): Recording {
    const { median, p95 } = spreadOf(this.intervals);
    return {
      samples: [...this.samples],
      frameIntervalP50Ms: this.intervals.length ? round(median) : 0,
      frameIntervalP95Ms: this.intervals.length ? round(p95) : 0,
    };
  }

  stop(): Recording {
    this.running.set(false);
    this.show(this.shown().elapsedMs);
    return this.soFar();
  }

  private show(elapsedMs: number): void {
    this.shown.set({ count: this.samples.length, elapsedMs });
  }
}
