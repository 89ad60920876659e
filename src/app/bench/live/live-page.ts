import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  DestroyRef,
  computed,
  effect,
  inject,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { Point3 } from '@oriel/shared/projection/types';
import { FaceTracking } from '../../tracking/face-tracking';
import { RecordRun } from '../runs/record-run';
import { RunRecorder } from '../runs/run-recorder';
import { BenchSubject } from '../subject/bench-subject';
import { CameraPicture } from './camera-picture';
import { plainMm } from '../../figures/words';
import { EyeDrawing } from './eye-drawing';
import { Instrument } from './instrument';
import { readingsOf } from './instruments';
import { Measures } from './measures';
import { NOBODY, followedWords, othersWords, peopleIn, type People } from './people';
import { isOn, trackingWords } from './tracking-words';

/** The charts and the drawing are renewed this often: more is not read, and costs what is measured. */
const RENEW_MS = 250;
const EYE_MS = 100;

/** The bench, live: the camera of this screen, the eye in plan and section, and the instruments. */
@Component({
  selector: 'oriel-live-page',
  imports: [MatButton, RouterLink, CameraPicture, EyeDrawing, Instrument, RecordRun],
  providers: [FaceTracking, RunRecorder],
  templateUrl: './live-page.html',
  styleUrl: './live-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LivePage {
  private readonly tracking = inject(FaceTracking);
  private readonly recorder = inject(RunRecorder);
  private readonly window = inject(DOCUMENT).defaultView!;
  protected readonly bench = inject(BenchSubject);
  private readonly measures = new Measures(this.bench.subject().tuning);
  private readonly seen = signal<Point3 | null>(null);
  private readonly people = signal<People>(NOBODY);
  /** Since when the one followed is the same; on the page's clock, ms. */
  private readonly sinceMs = signal(0);
  private readonly renewed = signal(0);
  private eyeMs = 0;

  protected readonly words = computed(() => trackingWords[this.tracking.state()]);
  protected readonly on = computed(() => isOn(this.tracking.state()));
  protected readonly ready = computed(
    () => this.tracking.state() === 'following' || this.tracking.state() === 'nobody',
  );
  /** Whether there is no camera to be had. */
  protected readonly without = computed(() => ['refused', 'no-camera', 'camera-busy', 'unsupported'].includes(this.tracking.state()));
  /** Whether the camera was asked for on this page: before that there is nothing to show. */
  protected readonly started = signal(false);
  protected readonly pictureShown = signal(false);
  protected readonly mm = (figure: number) => plainMm(figure, 0);
  protected readonly eye = computed(() => (this.tracking.state() === 'following' ? this.seen() : null));
  protected readonly there = computed(() => (this.on() ? this.people() : NOBODY));
  protected readonly othersWords = computed(() => othersWords(this.there()));
  protected readonly followedWords = computed(() =>
    this.there().followed === null ? '–' : followedWords(Math.max(0, this.renewed() - this.sinceMs())),
  );
  protected readonly readings = computed(() => readingsOf(this.measures, this.renewed() || performance.now()));

  constructor() {
    const endWatch = this.tracking.watch((sample) => {
      this.measures.sample(sample);
      this.recorder.take(sample);
      if (sample.receivedMs < this.eyeMs + EYE_MS) return;
      this.eyeMs = sample.receivedMs;
      this.seen.set(sample.found ? { ...sample.eye } : null);
      const people = peopleIn(sample);
      if (people.followed !== this.people().followed) this.sinceMs.set(sample.receivedMs);
      this.people.set(people);
    });
    let frame = 0;
    const draw = (tMs: number) => {
      frame = this.window.requestAnimationFrame(draw);
      this.measures.frame(tMs, performance.now());
      this.recorder.frame(tMs);
    };
    frame = this.window.requestAnimationFrame(draw);
    const renewing = setInterval(() => this.renew(), RENEW_MS);
    effect(() => {
      const { tracking, tuning } = this.bench.subject();
      this.measures.tune(tuning);
      if (untracked(this.on)) this.tracking.change(tracking);
    });
    inject(DestroyRef).onDestroy(() => {
      endWatch();
      this.window.cancelAnimationFrame(frame);
      clearInterval(renewing);
    });
  }

  protected start(): void {
    this.started.set(true);
    void this.tracking.start(this.bench.subject().tracking);
  }

  protected stop(): void {
    this.pictureShown.set(false);
    this.tracking.stop();
  }

  private renew(): void {
    const now = performance.now();
    if (this.on()) {
      this.measures.judge(now);
      this.measures.stand(now, this.tracking.ladder());
    }
    this.renewed.set(now);
  }
}
