import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import type { MirrorDelay } from '@oriel/shared/mirror/mirror-delay';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { requestCamera } from '../../tracking/camera-request';
import { CAMERAS } from '../../tracking/tracking-surroundings';
import type { TrackingState } from '../../tracking/tracking-state';
import { eachFrame, playTrack } from '../../tracking/video-frames';
import { trackingWords } from '../live/tracking-words';
import { BenchSubject } from '../subject/bench-subject';
import { Blink } from './blink';
import { Brightness } from './brightness';

type Step =
  | { readonly kind: 'before' }
  | { readonly kind: 'without-camera'; readonly why: TrackingState }
  | { readonly kind: 'blinking' }
  | { readonly kind: 'measured'; readonly delay: MirrorDelay }
  | { readonly kind: 'not-seen'; readonly correlation: number };

/** With a mirror before the camera the screen measures its own delay, from drawing to capture, and prediction is set by it. */
@Component({
  selector: 'oriel-mirror-page',
  imports: [MatButton, MatProgressBar, FailureNotice],
  templateUrl: './mirror-page.html',
  styleUrl: './mirror-page.scss',
  host: { '(document:keydown.escape)': 'stop()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MirrorPage {
  private readonly cameras = inject(CAMERAS);
  private readonly document = inject(DOCUMENT);
  private readonly window = this.document.defaultView!;
  protected readonly bench = inject(BenchSubject);
  protected readonly applying = new Submission();
  protected readonly step = signal<Step>({ kind: 'before' });
  protected readonly level = signal(0);
  protected readonly share = signal(0);
  protected readonly said = signal<string | null>(null);
  protected readonly why = computed(() => {
    const step = this.step();
    return step.kind === 'without-camera' ? trackingWords[step.why] : null;
  });
  protected readonly measured = computed(() => {
    const step = this.step();
    return step.kind === 'measured' ? step.delay : null;
  });
  private end: () => void = () => undefined;
  private attempt = 0;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.release());
  }

  /** Only ever called by a press: nothing blinks unasked. */
  protected async start(): Promise<void> {
    this.release();
    this.said.set(null);
    const attempt = this.attempt;
    const answer = await requestCamera(this.cameras);
    const stale = attempt !== this.attempt;
    if (answer.given && stale) answer.stream.getTracks().forEach((track) => track.stop());
    if (stale) return;
    if (!answer.given) return this.step.set({ kind: 'without-camera', why: answer.why });
    this.blink(answer.stream);
  }

  protected stop(): void {
    if (this.step().kind !== 'blinking') return;
    this.release();
    this.step.set({ kind: 'before' });
  }

  protected apply(): Promise<void> {
    return this.applying.run(async () => {
      const wall = this.bench.wall();
      const delay = this.measured();
      if (!wall || !delay) return;
      const applied = await this.bench.apply(wall.id, (tuning) => ({
        ...tuning,
        displayDelayMs: Math.max(0, Math.round(delay.delayMs)),
      }));
      this.said.set(
        applied.kind === 'saved'
          ? `${wall.setUp.name} predicts ${Math.round(delay.delayMs)} ms ahead from now on.`
          : `${applied.by} changed ${wall.setUp.name} meanwhile. Their changes stay; press again to set only the delay.`,
      );
    });
  }

  private blink(stream: MediaStream): void {
    const blink = new Blink();
    const brightness = new Brightness(this.document);
    const video = playTrack(stream.getVideoTracks()[0]);
    const endFrames = eachFrame(video, (capturedMs) => {
      const parts = brightness.of(video);
      if (parts) blink.see(capturedMs, parts);
    });
    let frame = 0;
    const draw = () => {
      const nowMs = performance.now();
      const level = blink.levelAt(nowMs);
      if (level !== null) this.level.set(level);
      this.share.set(Math.floor(50 * blink.share(nowMs)) / 50);
      if (blink.over(nowMs)) return this.finish(blink);
      frame = this.window.requestAnimationFrame(draw);
    };
    this.end = () => {
      this.window.cancelAnimationFrame(frame);
      endFrames();
      stream.getTracks().forEach((track) => track.stop());
    };
    this.step.set({ kind: 'blinking' });
    frame = this.window.requestAnimationFrame(draw);
  }

  private finish(blink: Blink): void {
    this.release();
    const { delay, correlation } = blink.result();
    this.step.set(delay ? { kind: 'measured', delay } : { kind: 'not-seen', correlation });
  }

  private release(): void {
    this.attempt++;
    this.end();
    this.end = () => undefined;
  }
}
